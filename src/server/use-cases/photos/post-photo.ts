import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import type { Context } from '#server/context.ts';
import { displayName } from '#server/media/display-name.ts';
import { keepingFilesOnlyWithRows } from '#server/media/only-with-rows.ts';
import { takePhoto } from '#server/media/photo.ts';
import { Enrolment, Lesson, Media, ProgressPhoto } from '#server/models/index.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';

export interface PostPhotoInput {
  readonly series: string;
  /** Public id of the lesson with the checkpoint. */
  readonly lesson: string;
  /** What the student says to it; may be empty. */
  readonly words: string;
  /** A finished upload on disk; the caller removes it. */
  readonly path: string;
  readonly originalName: string;
}

/** Photos of one thread that may wait at the same time. */
const MOST_WAITING = 6;

/**
 * Puts a photo into the thread of a checkpoint, where it waits for the teacher. The picture is read and written anew
 * before any row is made, outside the transaction.
 * @throws NOT_FOUND when the part is not hers to follow; VALIDATION when it asks for no photo; GONE when seat or part ended while the photo was on its way; UNSUPPORTED, TOO_LARGE.
 */
export async function postPhoto(ctx: Context, input: PostPhotoInput): Promise<ProgressPhoto> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const { actor } = ctx;
  const series = found(await seriesFor(actor, input.series, ctx.clock.now()));
  const part = found(series.parts.find(({ publicId }) => publicId === input.lesson));
  const { seat } = series;
  authorize(seat !== null && part.access.may === 'follow');
  if (part.checkpoint === null) throw new AppError('VALIDATION', { says: 'This part asks for no photo.' });
  await countUse(RATE_RULES.photo, actor.publicId);
  await ctx.services.media.requireRoom();
  const publicId = newPublicId();
  const photo = await takePhoto(ctx.services.media, input.path, `photos/${publicId}`);
  return keepingFilesOnlyWithRows(ctx.services.media, photo, () => withTransaction(async () => {
    await requireStillThere(seat.enrolmentId, part.id);
    const waiting = await ProgressPhoto.count({ where: { enrolmentId: seat.enrolmentId, lessonId: part.id, verdict: 'waits' } });
    if (waiting >= MOST_WAITING) throw new AppError('CONFLICT', { says: `${waiting} photos of yours wait already. Your teacher looks at them first.` });
    const media = await Media.create({
      publicId,
      ownerId: actor.userId,
      kind: 'photo',
      state: 'ready',
      originalName: displayName(input.originalName),
      byteCount: photo.byteCount,
      width: photo.width,
      height: photo.height,
      files: photo.files,
      detail: {},
    });
    return ProgressPhoto.create({ enrolmentId: seat.enrolmentId, lessonId: part.id, mediaId: media.id, words: input.words.slice(0, 1_000) });
  }));
}

/** Holds the seat. A photo takes a while to come: what it belongs to may have gone meanwhile. */
async function requireStillThere(enrolmentId: number, lessonId: number): Promise<void> {
  const seat = await Enrolment.findByPk(enrolmentId, { lock: true });
  const lesson = await Lesson.findByPk(lessonId);
  if (seat?.state !== 'active') throw new AppError('GONE', { says: 'Your seat ended while the photo was on its way. It was not kept.' });
  if (lesson === null || lesson.takenOutAt !== null || lesson.checkpoint === null) throw new AppError('GONE', { says: 'Your teacher took this part out while the photo was on its way. It was not kept; open the series to see its parts now.' });
}
