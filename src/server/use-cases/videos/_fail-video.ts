import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import { withTransaction } from '#server/db/transaction.ts';
import { VIDEO_UPLOADS_FOLDER } from '#server/media/video/folders.ts';
import type { MediaStore } from '#server/media/store.ts';
import { Media, VideoUpload } from '#server/models/index.ts';

/** A video that comes to nothing: the row says why, in words for its teacher, and its bytes go. */
export async function failVideo(store: MediaStore, publicId: string, says: string): Promise<void> {
  await withTransaction(async () => {
    const media = await Media.findOne({ where: { publicId, kind: 'video' }, lock: true });
    if (media === null || media.state === 'ready') return;
    await media.update({ state: 'failed', failure: says.slice(0, 200) });
    await VideoUpload.destroy({ where: { mediaId: media.id } });
  });
  await rm(join(await store.temporaryFolder(VIDEO_UPLOADS_FOLDER), publicId), { force: true });
}
