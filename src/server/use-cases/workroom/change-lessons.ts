/** The order of the parts: putting one in, moving, taking out, putting back. */
import { Op } from 'sequelize';
import type { MoveLessonInput, NewLessonInput } from '#contracts/workroom.ts';
import type { Context } from '#server/context.ts';
import { AppError } from '#server/errors.ts';
import { Enrolment, Lesson } from '#server/models/index.ts';
import { ownLesson, ownSeries, withSeriesLocked } from './own-series.ts';

const MOST_PARTS = 60;

/** Puts an empty part at the end. */
export async function addLesson(ctx: Context, input: NewLessonInput): Promise<Lesson> {
  const known = await ownSeries(ctx, input.series);
  return withSeriesLocked(known, async (series) => {
    const position = (await Lesson.count({ where: { seriesId: series.id, takenOutAt: null } })) + 1;
    if (position > MOST_PARTS) throw new AppError('CONFLICT', { says: `A series holds at most ${MOST_PARTS} parts.` });
    return Lesson.create({ seriesId: series.id, position, title: input.title, opens: { rule: 'at-once' } });
  });
}

/** Gives a part the number `to`; the others make room. */
export async function moveLesson(ctx: Context, input: MoveLessonInput): Promise<void> {
  const { lesson, series } = await ownLesson(ctx, input.lesson);
  await withSeriesLocked(series, async () => {
    const inOrder = await partsInOrder(series.id);
    const moved = inOrder.find(({ id }) => id === lesson.id);
    if (moved === undefined) throw new AppError('CONFLICT', { says: 'This part was taken out. Put it back first.' });
    const others = inOrder.filter(({ id }) => id !== lesson.id);
    others.splice(input.to - 1, 0, moved);
    await numberParts(others);
  });
}

/** Takes a part out: students no longer see it, and it can be put back for 30 days. */
export async function takeOutLesson(ctx: Context, publicId: string): Promise<void> {
  const { lesson, series } = await ownLesson(ctx, publicId);
  await withSeriesLocked(series, async (locked) => {
    const seats = await Enrolment.count({ where: { seriesId: locked.id, state: 'active' } });
    if (locked.state === 'published' && seats > 0 && lesson.publishedVersionId !== null) {
      throw new AppError('CONFLICT', { says: `${seats} people have paid for this part. Change it, or take the series back to draft first; who has a seat keeps it.` });
    }
    await lesson.update({ takenOutAt: ctx.clock.now() });
    await numberParts(await partsInOrder(locked.id));
  });
}

/** Puts a part that was taken out back at the end. */
export async function putBackLesson(ctx: Context, publicId: string): Promise<void> {
  const { lesson, series } = await ownLesson(ctx, publicId);
  await withSeriesLocked(series, async () => {
    await lesson.update({ takenOutAt: null, position: MOST_PARTS + 1 });
    await numberParts(await partsInOrder(series.id));
  });
}

function partsInOrder(seriesId: number): Promise<Lesson[]> {
  return Lesson.findAll({ where: { seriesId, takenOutAt: { [Op.is]: null } }, order: ['position', 'id'] });
}

async function numberParts(lessons: readonly Lesson[]): Promise<void> {
  for (const [index, lesson] of lessons.entries()) {
    if (lesson.position !== index + 1) await lesson.update({ position: index + 1 });
  }
}
