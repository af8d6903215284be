import type { BeginVideoInput } from '#contracts/video.ts';
import { VIDEO_LIMITS, videoFault } from '#core/video/limits.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found, signedIn } from '#server/errors.ts';
import { displayName } from '#server/media/display-name.ts';
import { Media, SeriesMedia, User, VideoUpload } from '#server/models/index.ts';
import { ownLesson } from '#server/use-cases/workroom/_own-series.ts';
import { requireVideoRoom } from './_video-room.ts';
import { freeName } from './_video-name.ts';

/**
 * Makes room for a video that is about to arrive as `publicId`, for a part of the asker's series: under a name of its
 * own, or as the draft that shall take the place of `input.name`. Its size counts from now on.
 * @throws NOT_FOUND for another teacher's part; UNSUPPORTED, TOO_LARGE by name and size; CONFLICT when the teacher's room
 * is used up; UNAVAILABLE when the disk is.
 */
export async function beginVideoUpload(ctx: Context, publicId: string, input: BeginVideoInput): Promise<void> {
  const actor = signedIn(ctx);
  const { lesson, series } = await ownLesson(ctx, input.lesson);
  const fault = videoFault({ name: input.fileName, size: input.byteCount, type: input.fileType });
  if (fault !== null) throw new AppError(input.byteCount > VIDEO_LIMITS.maxBytes ? 'TOO_LARGE' : 'UNSUPPORTED', { says: fault });
  await ctx.services.media.requireRoom(input.byteCount);
  await withTransaction(async () => {
    // The person's row is the lock of her room: many uploads begun at once are counted one after the other.
    found(await User.findByPk(actor.userId, { lock: true }));
    await requireVideoRoom(actor.userId, input.byteCount);
    const media = await Media.create({
      publicId,
      ownerId: actor.userId,
      kind: 'video',
      originalName: displayName(input.fileName),
      byteCount: input.byteCount,
      files: {},
      detail: {},
    });
    await VideoUpload.create({ mediaId: media.id, byteCount: input.byteCount });
    if (input.name === null) {
      const name = await freeName(series.id, lesson.title);
      await SeriesMedia.create({ seriesId: series.id, name, title: lesson.title, draftMediaId: media.id, lessonId: lesson.id });
    } else {
      const kept = found(await SeriesMedia.findOne({ where: { seriesId: series.id, name: input.name } }));
      await kept.update({ draftMediaId: media.id });
    }
  });
}
