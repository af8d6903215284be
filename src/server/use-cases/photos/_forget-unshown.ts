import type { MediaStore } from '#server/media/store.ts';
import { FurtherShot, Media, ProgressPhoto } from '#server/models/index.ts';

/** Takes away photos that came and are shown nowhere. Those that are shown stay. */
export async function forgetUnshown(store: MediaStore, mediaIds: readonly number[]): Promise<void> {
  for (const media of await Media.findAll({ where: { id: mediaIds, kind: 'photo' } })) {
    if ((await ProgressPhoto.count({ where: { mediaId: media.id } })) + (await FurtherShot.count({ where: { mediaId: media.id } })) > 0) continue;
    // The row last: a file without a row would never be found again.
    await Promise.all(Object.values(media.files).map(({ key }) => store.remove(key)));
    await media.destroy();
  }
}
