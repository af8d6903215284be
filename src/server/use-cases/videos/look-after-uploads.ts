import { readdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { Op } from 'sequelize';
import { VIDEO_LIMITS } from '#core/video/limits.ts';
import type { Context } from '#server/context.ts';
import { VIDEO_UPLOADS_FOLDER } from '#server/media/video/folders.ts';
import { Media, VideoUpload } from '#server/models/index.ts';
import { forgetUpload } from './_forget-upload.ts';
import { sendToWorker } from './_send-to-worker.ts';

const HOUR_MS = 3_600_000;
/** Bytes without a row, and rows without bytes, are left alone this long: one may be on the way to the other. */
const ORPHAN_MS = 48 * HOUR_MS;

/**
 * Sends on what came whole while its server died, forgets what was not finished in time, and sweeps away files of
 * uploads that no row speaks of.
 */
export async function lookAfterUploads({ clock, services }: Context): Promise<void> {
  const now = clock.now().getTime();
  const folder = await services.media.temporaryFolder(VIDEO_UPLOADS_FOLDER);
  const open = await Media.findAll({ where: { kind: 'video', state: 'created' }, attributes: ['id', 'publicId'] });
  const uploads = await VideoUpload.findAll({ where: { mediaId: open.map(({ id }) => id) } });
  for (const { mediaId, byteCount, createdAt } of uploads) {
    const publicId = open.find(({ id }) => id === mediaId)?.publicId ?? '';
    const path = join(folder, publicId);
    if ((await stat(path).catch(() => null))?.size === byteCount) {
      await sendToWorker(publicId);
    } else if (createdAt.getTime() < now - VIDEO_LIMITS.uploadHours * HOUR_MS) {
      await rm(path, { force: true });
      await forgetUpload(publicId);
    }
  }
  await sweep(folder, now);
}

async function sweep(folder: string, now: number): Promise<void> {
  const names = await readdir(folder);
  const known = await Media.findAll({ where: { publicId: names, state: { [Op.notIn]: ['ready', 'failed'] } }, attributes: ['publicId'] });
  const wanted = new Set(known.map(({ publicId }) => publicId));
  for (const name of names.filter((one) => !wanted.has(one))) {
    const path = join(folder, name);
    const old = await stat(path).then(({ mtimeMs }) => mtimeMs < now - ORPHAN_MS, () => false);
    if (old) await rm(path, { recursive: true, force: true });
  }
}
