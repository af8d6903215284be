/** The demo series, read from the folders that ship with the program. */
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Series, User, Workroom } from '#server/models/index.ts';
import { actingAs } from '#server/demo/acting-as.ts';
import { importSeries } from '#server/use-cases/series-folder/import-series.ts';

/** Folder of the series that ship with the program. */
export const CONTENT_FOLDER = 'content/series';

/** Text of a file of a shipped series, or null. */
export async function readShipped(slug: string, name: string): Promise<string | null> {
  return readFile(join(CONTENT_FOLDER, slug, name), 'utf8').catch((error: unknown) => {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return null;
    throw error;
  });
}

export async function bringIn(teacher: User, workroom: Workroom, slug: string): Promise<Series> {
  const ctx = await actingAs(teacher);
  return importSeries(ctx, { workroomId: workroom.id, slug, read: (name) => readShipped(slug, name) });
}
