import type { ShowPhotosInput } from '#contracts/photos.ts';
import type { Context } from '#server/context.ts';
import { AppError, found } from '#server/errors.ts';
import { FurtherShot, Media, ProgressPhoto } from '#server/models/index.ts';
import { checkpointFor } from './_checkpoint-for.ts';
import { forgetUnshown } from './_forget-unshown.ts';
import { intoThread } from './_into-thread.ts';

/**
 * Shows photos that have come in pieces, together, at a checkpoint. Asked again, as after a lost answer, it tells the same showing.
 * @throws as `checkpointFor` and `intoThread`; NOT_FOUND for a photo that is not hers or was forgotten; CONFLICT while one is not whole.
 */
export async function showPhotos(ctx: Context, { series, lesson, words, shots }: ShowPhotosInput): Promise<ProgressPhoto> {
  const at = await checkpointFor(ctx, { series, lesson });
  const rows = await Media.findAll({ where: { publicId: [...shots], ownerId: at.actor.userId, kind: 'photo' } });
  const inOrder = [...new Set(shots)].map((shot) => rows.find(({ publicId }) => publicId === shot));
  if (inOrder.includes(undefined)) throw new AppError('NOT_FOUND', { says: 'One of these photos has not come, or waited too long to be shown. Send it again.' });
  const photos = inOrder.map(found);
  if (photos.some(({ state }) => state !== 'ready')) throw new AppError('CONFLICT', { says: 'One of these photos is not here whole yet. Let it arrive first.' });
  const before = await shownAs(photos);
  if (before !== null) return before;
  try {
    const { photo, isNew } = await intoThread(at, words, photos.map(({ digest, publicId }) => digest ?? publicId), () => Promise.resolve(photos));
    if (!isNew) await forgetUnshown(ctx.services.media, photos.map(({ id }) => id));
    return photo;
  } catch (error) {
    if (error instanceof AppError && ['GONE', 'CONFLICT'].includes(error.code)) await forgetUnshown(ctx.services.media, photos.map(({ id }) => id));
    throw error;
  }
}

/** The showing these very photos stand in already. */
async function shownAs(photos: readonly Media[]): Promise<ProgressPhoto | null> {
  const mediaId = photos.map(({ id }) => id);
  const further = await FurtherShot.findOne({ where: { mediaId } });
  return further === null ? ProgressPhoto.findOne({ where: { mediaId } }) : ProgressPhoto.findByPk(further.photoId);
}
