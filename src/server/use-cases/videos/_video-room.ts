import { Op } from 'sequelize';
import { VIDEO_LIMITS } from '#core/video/limits.ts';
import { AppError } from '#server/errors.ts';
import { Media } from '#server/models/index.ts';

/** Refuses what would go over a teacher's room for videos. Her row must be locked, so that uploads are counted one after the other. */
export async function requireVideoRoom(ownerId: number, byteCount: number): Promise<void> {
  const videos = await Media.findAll({ where: { ownerId, kind: 'video', state: { [Op.ne]: 'failed' } }, attributes: ['state', 'byteCount'] });
  if (videos.filter(({ state }) => state === 'created').length >= VIDEO_LIMITS.maxUnfinished) {
    throw new AppError('CONFLICT', { says: `${VIDEO_LIMITS.maxUnfinished} videos of yours are on their way already. Let one arrive, or stop one, first.` });
  }
  const used = videos.reduce((sum, video) => sum + video.byteCount, 0);
  if (used + byteCount > VIDEO_LIMITS.maxBytesOfTeacher) {
    throw new AppError('CONFLICT', { says: 'Your videos together may be 60 GB, and this one would not go in. Take out one you do not need, or write to us.' });
  }
}
