import type { MediaStore } from '#server/media/store.ts';
import { Media } from '#server/models/index.ts';

/** Takes a photo away for good, after nothing names it any more. The row last: a file without a row would never be found again. */
export async function forgetPhoto(store: MediaStore, mediaId: number | null): Promise<void> {
  const media = mediaId === null ? null : await Media.findByPk(mediaId);
  if (media === null) return;
  await Promise.all(Object.values(media.files).map(({ key }) => store.remove(key)));
  await media.destroy();
}
