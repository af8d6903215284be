import { withTransaction } from '#server/db/transaction.ts';
import { Media, SeriesMedia } from '#server/models/index.ts';

/** Takes out a video that never became whole: its row, and its name when nothing else stands behind it. Gives its room back. */
export async function forgetUpload(publicId: string): Promise<void> {
  await withTransaction(async () => {
    const media = await Media.findOne({ where: { publicId, kind: 'video' }, lock: true });
    if (media?.state !== 'created') return;
    await SeriesMedia.destroy({ where: { draftMediaId: media.id, mediaId: null } });
    await SeriesMedia.update({ draftMediaId: null }, { where: { draftMediaId: media.id } });
    await media.destroy();
  });
}
