/** The gathering list of a part: lines put in, changed, moved, taken out. */
import type { GatheringInput, NewGatheringInput } from '#contracts/workroom.ts';
import { amountOf } from '#core/craft/amounts.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { Context } from '#server/context.ts';
import { AppError, fieldError } from '#server/errors.ts';
import { GatheringItem, PatternPiece } from '#server/models/index.ts';
import { ownGatheringItem, ownLesson, withSeriesLocked } from './own-series.ts';

const MOST_LINES = 60;

export async function addGatheringItem(ctx: Context, { lesson: publicId, ...line }: NewGatheringInput): Promise<GatheringItem> {
  const { lesson, series } = await ownLesson(ctx, publicId);
  await requireKnownAmount(series.id, line.amountKey);
  return withSeriesLocked(series, async () => {
    const position = (await GatheringItem.count({ where: { lessonId: lesson.id } })) + 1;
    if (position > MOST_LINES) throw new AppError('CONFLICT', { says: `A list holds at most ${MOST_LINES} lines.` });
    return GatheringItem.create({ lessonId: lesson.id, position, ...line });
  });
}

export async function saveGatheringItem(ctx: Context, { item: publicId, ...line }: GatheringInput): Promise<void> {
  const { item, series } = await ownGatheringItem(ctx, publicId);
  await requireKnownAmount(series.id, line.amountKey);
  await withSeriesLocked(series, () => item.update(line));
}

export async function takeOutGatheringItem(ctx: Context, publicId: string): Promise<void> {
  const { item, lesson, series } = await ownGatheringItem(ctx, publicId);
  await withSeriesLocked(series, async () => {
    await item.destroy();
    await number(await linesOf(lesson.id));
  });
}

export async function moveGatheringItem(ctx: Context, publicId: string, by: 'up' | 'down'): Promise<void> {
  const { item, lesson, series } = await ownGatheringItem(ctx, publicId);
  await withSeriesLocked(series, async () => {
    const lines = await linesOf(lesson.id);
    const from = lines.findIndex(({ id }) => id === item.id);
    const to = from + (by === 'up' ? -1 : 1);
    const [moved] = lines.splice(from, 1);
    if (moved === undefined || to < 0 || to > lines.length) return;
    lines.splice(to, 0, moved);
    await number(lines);
  });
}

function linesOf(lessonId: number): Promise<GatheringItem[]> {
  return GatheringItem.findAll({ where: { lessonId }, order: ['position', 'id'] });
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
