import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import { Op } from 'sequelize';
import type { Context } from '#server/context.ts';
import { AppError, found } from '#server/errors.ts';
import { digestOf, PHOTO_UPLOADS_FOLDER, takePhoto } from '#server/media/photo.ts';
import { Media } from '#server/models/index.ts';

/** Reading one takes seconds at most; who died over it is not waited for longer. */
const READING_MS = 120_000;
const FINAL = new Set<AppError['code']>(['UNSUPPORTED', 'TOO_LARGE']);

/**
 * The last byte is here: the photo is read, written anew and ready to be shown; what came goes. Once, however often it is asked.
 * @throws UNSUPPORTED, TOO_LARGE when it is none that can be shown: then nothing of it is left; UNAVAILABLE while another request reads it.
 */
export async function takePhotoUpload({ clock, services }: Context, publicId: string): Promise<void> {
  const media = found(await Media.findOne({ where: { publicId, kind: 'photo' } }));
  if (media.state === 'ready') return;
  const now = clock.now();
  const [mine] = await Media.update({ state: 'probing', updatedAt: now }, {
    where: { id: media.id, [Op.or]: [{ state: 'created' }, { state: 'probing', updatedAt: { [Op.lt]: new Date(now.getTime() - READING_MS) } }] },
    silent: true,
  });
  if (mine === 0) throw new AppError('UNAVAILABLE', { says: 'This photo is being read just now.', retryAfterSeconds: 2 });
  const path = join(await services.media.temporaryFolder(PHOTO_UPLOADS_FOLDER), publicId);
  try {
    const [digest, photo] = [await digestOf(path), await takePhoto(services.media, path, `photos/${publicId}`)];
    await Media.update({ state: 'ready', digest, ...photo }, { where: { id: media.id } });
  } catch (error) {
    if (error instanceof AppError && FINAL.has(error.code)) {
      await media.destroy();
      await rm(path, { force: true });
    } else {
      await Media.update({ state: 'created' }, { where: { id: media.id } });
    }
    throw error;
  }
  await rm(path, { force: true });
}
