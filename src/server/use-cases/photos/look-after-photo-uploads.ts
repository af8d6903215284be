import { readdir } from 'node:fs/promises';
import { Op } from 'sequelize';
import { PHOTO_LIMITS } from '#core/photo/limits.ts';
import type { Context } from '#server/context.ts';
import { PHOTO_UPLOADS_FOLDER } from '#server/media/photo.ts';
import { sweep } from '#server/media/sweep.ts';
import { Media, PhotoUpload } from '#server/models/index.ts';
import { forgetUnshown } from './_forget-unshown.ts';

/** Forgets photos that never became whole, or came and were not shown in time, and sweeps away bytes no row speaks of. */
export async function lookAfterPhotoUploads({ clock, services }: Context): Promise<void> {
  const now = clock.now().getTime();
  const old = await PhotoUpload.findAll({ where: { createdAt: { [Op.lt]: new Date(now - PHOTO_LIMITS.uploadHours * 3_600_000) } } });
  await forgetUnshown(services.media, old.map(({ mediaId }) => mediaId));
  const folder = await services.media.temporaryFolder(PHOTO_UPLOADS_FOLDER);
  const known = await Media.findAll({ where: { publicId: await readdir(folder), kind: 'photo' }, attributes: ['publicId'] });
  await sweep(folder, new Set(known.map(({ publicId }) => publicId)), now);
}
