/** The order of the parts: putting one in, moving, taking out, putting back. */
import { Op } from 'sequelize';
import type { MoveLessonInput, NewLessonInput } from '#contracts/workroom.ts';
import { outOfOrder } from '#core/timetable/out-of-order.ts';
import type { Context } from '#server/context.ts';
import { AppError, fieldError } from '#server/errors.ts';
import { Enrolment, Lesson, type Series } from '#server/models/index.ts';
import { placeOf, type PartPlace } from './_part-place.ts';
import { requireOpenable } from './_require-openable.ts';
import { ownLesson, ownSeries, withSeriesLocked } from './_own-series.ts';

/** A part after it was moved, with the number it had. */
export interface PartMoved extends PartPlace {
  readonly from: number;
}

const MOST_PARTS = 60;
const SERIES_IS_FULL = `A series holds at most ${MOST_PARTS} parts.`;

/** Puts an empty part at the end. */
export async function addLesson(ctx: Context, input: NewLessonInput): Promise<PartPlace> {
  const known = await ownSeries(ctx, input.series);
  return withSeriesLocked(known, async (series) => {
    const position = (await Lesson.count({ where: { seriesId: series.id, takenOutAt: null } })) + 1;
    if (position > MOST_PARTS) throw new AppError('CONFLICT', { says: SERIES_IS_FULL });
    const lesson = await Lesson.create({ seriesId: series.id, position, title: input.title, opens: { rule: 'at-once' } });
    return placeOf(series, lesson);
  });
}

/**
 * Moves a part by one place, or gives it the number `to`; the others make room. A number beyond the last puts it at
 * the end; the first stays first when moved up, the last last.
 * @throws CONFLICT for a part that was taken out, or when a part of an open series could then never open; VALIDATION at
 * `anyway` when a part would open before an earlier one and did not before, unless she wants it anyway.
 */
export async function moveLesson(ctx: Context, input: MoveLessonInput): Promise<PartMoved> {
  const { lesson: known, series } = await ownLesson(ctx, input.lesson);
  return withSeriesLocked(series, async (locked) => {
    const inOrder = await partsInOrder(series.id);
    const moved = inOrder.find(({ id }) => id === known.id);
    if (moved === undefined) throw new AppError('CONFLICT', { says: 'This part was taken out. Put it back first.' });
    const from = moved.position;
    const early = earlyParts(inOrder, ctx.clock.now());
    const to = input.to ?? moved.position + (input.by === 'up' ? -1 : 1);
    await putAt(inOrder.filter(({ id }) => id !== known.id), moved, Math.max(1, to));
    await requireOpenable(locked);
    const news = earlyParts(await partsInOrder(series.id), ctx.clock.now()).filter(({ key }) => !early.some((one) => one.key === key));
    if (news.length > 0 && input.anyway !== 'yes') throw fieldError('anyway', `Nothing was moved yet. ${news.map(({ says }) => says).join(' ')}`);
    return { ...placeOf(series, moved), from };
  });
}

/** Parts that who starts now could open before one in front of them; `key` names the pair whatever their numbers are. */
function earlyParts(lessons: readonly Lesson[], now: Date): { readonly key: string; readonly says: string }[] {
  const idOf = (number: number): string => lessons[number - 1]?.publicId ?? '';
  return outOfOrder(lessons.map(({ publicId, title, opens, isPreview, checkpoint }, index) => ({ publicId, number: index + 1, title, opens, isPreview, asksForPhoto: checkpoint !== null })), now)
    .map(({ part, earlier, says }) => ({ key: `${idOf(part)} ${idOf(earlier)}`, says }));
}

/**
 * Takes a part out: students no longer see it, and it can be put back.
 * @throws CONFLICT while people who paid for it are in the open series, or when another part waits for it.
 */
export async function takeOutLesson(ctx: Context, publicId: string): Promise<PartPlace> {
  const { lesson: known, series } = await ownLesson(ctx, publicId);
  return withSeriesLocked(series, async (locked) => {
    const lesson = await Lesson.findByPk(known.id, { rejectOnEmpty: true });
    if (lesson.takenOutAt !== null) return placeOf(series, lesson);
    if (locked.state === 'published' && lesson.publishedVersionId !== null) await requireNobodyInside(locked);
    await lesson.update({ takenOutAt: ctx.clock.now() });
    await numberParts(await partsInOrder(locked.id));
    await requireOpenable(locked);
    return placeOf(series, lesson);
  });
}

/** Puts a part that was taken out back where it stood, or as near as there is room. */
export async function putBackLesson(ctx: Context, publicId: string): Promise<PartPlace> {
  const { lesson: known, series } = await ownLesson(ctx, publicId);
  return withSeriesLocked(series, async (locked) => {
    const lesson = await Lesson.findByPk(known.id, { rejectOnEmpty: true });
    if (lesson.takenOutAt === null) return placeOf(series, lesson);
    const others = await partsInOrder(series.id);
    if (others.length >= MOST_PARTS) throw new AppError('CONFLICT', { says: SERIES_IS_FULL });
    await lesson.update({ takenOutAt: null });
    await putAt(others, lesson, lesson.position);
    await requireOpenable(locked);
    return placeOf(series, lesson);
  });
}

async function requireNobodyInside(series: Series): Promise<void> {
  const seats = await Enrolment.count({ where: { seriesId: series.id, state: 'active' } });
  if (seats === 0) return;
  const people = seats === 1 ? 'One person has' : `${seats} people have`;
  throw new AppError('CONFLICT', { says: `${people} a seat, and this part belongs to it. Change the part instead. If it really must go, take the series back to draft first.` });
}

function partsInOrder(seriesId: number): Promise<Lesson[]> {
  return Lesson.findAll({ where: { seriesId, takenOutAt: { [Op.is]: null } }, order: ['position', 'id'] });
}

/** Puts `lesson` among `others` as number `to` and numbers all anew. */
async function putAt(others: readonly Lesson[], lesson: Lesson, to: number): Promise<void> {
  await numberParts(others.toSpliced(to - 1, 0, lesson));
}

async function numberParts(lessons: readonly Lesson[]): Promise<void> {
  for (const [index, lesson] of lessons.entries()) {
    if (lesson.position !== index + 1) await lesson.update({ position: index + 1, timetableRevision: lesson.timetableRevision + 1 });
  }
}
