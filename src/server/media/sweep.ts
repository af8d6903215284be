import { readdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';

/** Bytes without a row are left alone this long: the row may be on its way. */
const ORPHAN_MS = 48 * 3_600_000;

/** Removes what lies in `folder` and is not `wanted`, unless it was written to lately. `now` in milliseconds since 1970. */
export async function sweep(folder: string, wanted: ReadonlySet<string>, now: number): Promise<void> {
  for (const name of (await readdir(folder)).filter((one) => !wanted.has(one))) {
    const path = join(folder, name);
    const old = await stat(path).then(({ mtimeMs }) => mtimeMs < now - ORPHAN_MS, () => false);
    if (old) await rm(path, { recursive: true, force: true });
  }
}
