/** The gathering list of a part: lines put in, changed, moved, taken out. */
import type { GatheringInput, NewGatheringInput } from '#contracts/workroom.ts';
import { amountOf } from '#core/craft/amounts.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { Context } from '#server/context.ts';
import { AppError, fieldError } from '#server/errors.ts';
import { GatheringItem, PatternPiece, type Lesson, type Series } from '#server/models/index.ts';
import { placeOf, type PartPlace } from './_part-place.ts';
import { keepThing, wordsOf } from './_keep-thing.ts';
import { ownGatheringItem, ownLesson, withSeriesLocked } from './_own-series.ts';

const MOST_LINES = 60;
const listIsFull = (): AppError => new AppError('CONFLICT', { says: `A list holds at most ${MOST_LINES} lines.` });

/** Where a line stands after a change. */
export interface LinePlace {
  readonly part: PartPlace;
  readonly publicId: string;
  readonly name: string;
  /** 1 for the first line. */
  readonly number: number;
}

const lineAt = (series: Series, lesson: Lesson, { publicId, name }: GatheringItem, number: number): LinePlace => ({ part: placeOf(series, lesson), publicId, name, number });

/** Puts a line at the end of a part's list. */
export async function addGatheringItem(ctx: Context, { lesson: publicId, keep, ...line }: NewGatheringInput): Promise<LinePlace> {
  const { lesson, series } = await ownLesson(ctx, publicId);
  await requireKnownAmount(series.id, line.amountKey);
  return withSeriesLocked(series, async () => {
    const position = (await linesOf(lesson.id)).length + 1;
    if (position > MOST_LINES) throw listIsFull();
    if (keep) await keepThing(series.workroomId, wordsOf(line));
    return lineAt(series, lesson, await GatheringItem.create({ lessonId: lesson.id, position, ...line }), position);
  });
}

export async function saveGatheringItem(ctx: Context, { item: publicId, keep, ...line }: GatheringInput): Promise<LinePlace> {
  const { item, lesson, series } = await ownGatheringItem(ctx, publicId);
  await requireKnownAmount(series.id, line.amountKey);
  return withSeriesLocked(series, async () => {
    await item.update(line);
    if (keep) await keepThing(series.workroomId, wordsOf(line));
    return lineAt(series, lesson, item, item.position);
  });
}

/** The line leaves everybody's list; put back, it has the ticks it had. */
export async function takeOutGatheringItem(ctx: Context, publicId: string): Promise<LinePlace> {
  const { item, lesson, series } = await ownGatheringItem(ctx, publicId);
  return withSeriesLocked(series, async () => {
    await item.update({ takenOutAt: ctx.clock.now() });
    await number(await linesOf(lesson.id));
    return lineAt(series, lesson, item, item.position);
  });
}

/** Puts a line that was taken out back where it stood, or as near as there is room. */
export async function putBackGatheringItem(ctx: Context, publicId: string): Promise<LinePlace> {
  const { item, lesson, series } = await ownGatheringItem(ctx, publicId);
  return withSeriesLocked(series, async () => {
    const others = (await linesOf(lesson.id)).filter(({ id }) => id !== item.id);
    if (others.length >= MOST_LINES) throw listIsFull();
    await item.update({ takenOutAt: null });
    await number(others.toSpliced(item.position - 1, 0, item));
    return lineAt(series, lesson, item, item.position);
  });
}

/** Changes places with the line before or after; the first stays first, the last last. */
export async function moveGatheringItem(ctx: Context, publicId: string, by: 'up' | 'down'): Promise<LinePlace> {
  const { item, lesson, series } = await ownGatheringItem(ctx, publicId);
  return withSeriesLocked(series, async () => {
    const lines = await linesOf(lesson.id);
    const from = lines.findIndex(({ id }) => id === item.id);
    if (from < 0) throw new AppError('CONFLICT', { says: 'This line was taken out. Put it back first.' });
    const to = Math.min(Math.max(0, from + (by === 'up' ? -1 : 1)), lines.length - 1);
    await number(lines.filter(({ id }) => id !== item.id).toSpliced(to, 0, ...lines.slice(from, from + 1)));
    return lineAt(series, lesson, item, to + 1);
  });
}

function linesOf(lessonId: number): Promise<GatheringItem[]> {
  return GatheringItem.findAll({ where: { lessonId, takenOutAt: null }, order: ['position', 'id'] });
}

async function number(lines: readonly GatheringItem[]): Promise<void> {
  for (const [index, line] of lines.entries()) if (line.position !== index + 1) await line.update({ position: index + 1 });
}

/** An amount must be one the piece's plan gives; while there is no piece yet, any name may stand. */
async function requireKnownAmount(seriesId: number, key: string | null): Promise<void> {
  if (key === null) return;
  const piece = await PatternPiece.findByPk(seriesId);
  const plan = piece === null ? null : planPiece(piece.data);
  if (piece === null || plan?.ok !== true) return;
  if (!amountOf(key, piece.data, plan.value).ok) throw fieldError('amountKey', 'The plan of this piece has no such amount. Choose one from the list.');
}
