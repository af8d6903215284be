import { readdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { Op } from 'sequelize';
import { VIDEO_LIMITS } from '#core/video/limits.ts';
import type { Context } from '#server/context.ts';
import { VIDEO_UPLOADS_FOLDER, VIDEO_WORK_FOLDER } from '#server/media/video/folders.ts';
import type { MediaStore } from '#server/media/store.ts';
import { sweep } from '#server/media/sweep.ts';
import { ARRIVED_FOLDERS, SERIES_FOLDERS } from '#server/series-folder/folders.ts';
import { Media, SeriesImport, SeriesMedia, VideoUpload } from '#server/models/index.ts';
import { forgetUpload } from './_forget-upload.ts';
import { sendToWorker } from './_send-to-worker.ts';

const HOUR_MS = 3_600_000;
/** A film that nothing shows any more can be brought back this long. */
const UNUSED_MS = 30 * 24 * HOUR_MS;

/**
 * Sends on what came whole while its server died, forgets what was not finished in time, and sweeps away what no row
 * speaks of, what workers that died left behind, zips of series, what was told of folders, and films that were replaced long ago.
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
  const known = await Media.findAll({ where: { publicId: await readdir(folder), state: { [Op.notIn]: ['ready', 'failed'] } }, attributes: ['publicId'] });
  await sweep(folder, new Set(known.map(({ publicId }) => publicId)), now);
  await sweep(await services.media.temporaryFolder(VIDEO_WORK_FOLDER), new Set(), now);
  await sweep(await services.media.temporaryFolder(SERIES_FOLDERS), new Set(), now);
  const arrived = await SeriesImport.findAll({ where: { state: 'waiting' }, attributes: ['publicId'] });
  await sweep(await services.media.temporaryFolder(ARRIVED_FOLDERS), new Set(arrived.map(({ publicId }) => publicId)), now);
  await SeriesImport.destroy({ where: { state: ['done', 'refused'], updatedAt: { [Op.lt]: new Date(now - UNUSED_MS) } } });
  await removeUnused(services.media, new Date(now - UNUSED_MS));
}

async function removeUnused(store: MediaStore, before: Date): Promise<void> {
  const named = await SeriesMedia.findAll({ attributes: ['mediaId', 'draftMediaId'] });
  const used = named.flatMap(({ mediaId, draftMediaId }) => [mediaId, draftMediaId]).filter((id) => id !== null);
  for (const media of await Media.findAll({ where: { kind: 'video', id: { [Op.notIn]: used }, state: ['ready', 'failed'], updatedAt: { [Op.lt]: before } } })) {
    // The row last: a file without a row would never be found again.
    await Promise.all(Object.values(media.files).map(({ key }) => store.remove(key)));
    await media.destroy();
  }
}
