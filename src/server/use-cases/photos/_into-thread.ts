import { withTransaction } from '#server/db/transaction.ts';
import { AppError } from '#server/errors.ts';
import { Enrolment, FurtherShot, Lesson, PhotoUpload, ProgressPhoto, type Media } from '#server/models/index.ts';
import { shownWith } from '#server/queries/photos/shown-with.ts';
import type { CheckpointFor } from './_checkpoint-for.ts';

/** Showings of one thread that may wait at the same time. */
const MOST_WAITING = 6;

export interface IntoThread {
  readonly photo: ProgressPhoto;
  /** False when the same files were shown before and still wait: that showing is told, and nothing was made. */
  readonly isNew: boolean;
}

/**
 * Puts one showing into the thread of a checkpoint, where it waits for the teacher. The same files sent twice, as by a
 * button pressed twice or a line that dropped behind the last byte, are one showing.
 * @param shots makes or finds the rows of the photos, in their order, in the transaction.
 * @throws GONE when seat or part ended while the photos were on their way; CONFLICT when too many wait, or when the same was shown and answered.
 */
export async function intoThread({ enrolmentId, lessonId }: CheckpointFor, words: string, digests: readonly string[], shots: () => Promise<readonly Media[]>): Promise<IntoThread> {
  return withTransaction(async () => {
    await requireStillThere(enrolmentId, lessonId);
    const before = await shownWith(enrolmentId, lessonId, digests);
    if (before !== null && before.verdict !== 'waits') throw new AppError('CONFLICT', { says: 'You have shown this photo already, and it was answered: what was said stands above. Take a new one when you have mended.' });
    if (before !== null) return { photo: before, isNew: false };
    const waiting = await ProgressPhoto.count({ where: { enrolmentId, lessonId, verdict: 'waits' } });
    if (waiting >= MOST_WAITING) throw new AppError('CONFLICT', { says: `${waiting} photos of yours wait already. Your teacher looks at them first.` });
    const [first, ...further] = await shots();
    if (first === undefined) throw new RangeError('A showing has at least one photo');
    const photo = await ProgressPhoto.create({ enrolmentId, lessonId, mediaId: first.id, words: words.slice(0, 1_000) });
    await FurtherShot.bulkCreate(further.map((media, index) => ({ photoId: photo.id, shot: index + 2, mediaId: media.id })));
    await PhotoUpload.destroy({ where: { mediaId: [first, ...further].map(({ id }) => id) } });
    return { photo, isNew: true };
  });
}

/** Holds the seat. A photo takes a while to come: what it belongs to may have gone meanwhile. */
async function requireStillThere(enrolmentId: number, lessonId: number): Promise<void> {
  const seat = await Enrolment.findByPk(enrolmentId, { lock: true });
  const lesson = await Lesson.findByPk(lessonId);
  if (seat?.state !== 'active') throw new AppError('GONE', { says: 'Your seat ended while the photo was on its way. It was not kept.' });
  if (lesson === null || lesson.takenOutAt !== null || lesson.checkpoint === null) throw new AppError('GONE', { says: 'Your teacher took this part out while the photo was on its way. It was not kept; open the series to see its parts now.' });
}
