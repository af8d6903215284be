import { Op } from 'sequelize';
import type { BeginPhotoInput } from '#contracts/photos.ts';
import { PHOTO_EMPTY, PHOTO_LIMITS, PHOTO_TOO_LARGE } from '#core/photo/limits.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found } from '#server/errors.ts';
import { displayName } from '#server/media/display-name.ts';
import { Media, PhotoUpload, User } from '#server/models/index.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { checkpointFor } from './_checkpoint-for.ts';

/**
 * Makes room for a photo that is about to arrive as `publicId`, for a checkpoint of the one who asks.
 * @throws as `checkpointFor`; UNSUPPORTED, TOO_LARGE by its size; CONFLICT when too many have come and were not shown; RATE_LIMITED; UNAVAILABLE.
 */
export async function beginPhotoUpload(ctx: Context, publicId: string, { byteCount, fileName, ...at }: BeginPhotoInput): Promise<void> {
  const { actor } = await checkpointFor(ctx, at);
  if (byteCount === 0) throw new AppError('UNSUPPORTED', { says: PHOTO_EMPTY });
  if (byteCount > PHOTO_LIMITS.maxBytes) throw new AppError('TOO_LARGE', { says: PHOTO_TOO_LARGE });
  await countUse(RATE_RULES.photo, actor.publicId);
  await ctx.services.media.requireRoom(byteCount);
  await withTransaction(async () => {
    // The person's row is the lock of her room: many uploads begun at once are counted one after the other.
    found(await User.findByPk(actor.userId, { lock: true }));
    const own = await Media.findAll({ where: { ownerId: actor.userId, kind: 'photo', state: { [Op.ne]: 'failed' } }, attributes: ['id'] });
    if ((await PhotoUpload.count({ where: { mediaId: own.map(({ id }) => id) } })) >= PHOTO_LIMITS.maxUnshown) {
      throw new AppError('CONFLICT', { says: `${PHOTO_LIMITS.maxUnshown} photos of yours are on their way already. Let them arrive first.` });
    }
    const media = await Media.create({ publicId, ownerId: actor.userId, kind: 'photo', originalName: displayName(fileName), byteCount, files: {}, detail: {} });
    await PhotoUpload.create({ mediaId: media.id, byteCount });
  });
}
