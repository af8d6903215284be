import { clothOf } from '#core/craft/cloth-of.ts';
import { planPiece } from '#core/craft/plan.ts';
import { drawSharePicture } from '#core/series/draw-share-picture.ts';
import { titleHalves } from '#core/series/title.ts';
import type { Context } from '#server/context.ts';
import { hashOf, writeSharePicture } from '#server/media/draw-share-picture.ts';
import { SharePicture } from '#server/models/index.ts';
import { picturesToDraw, picturesToTakeAway, type ToDraw } from '#server/queries/shop/share-pictures.ts';

/** So few in a round, since letters and verdicts wait meanwhile. */
const AT_ONCE = 3;

/**
 * Draws what is missing or of an earlier state, a few at a time, and takes away the pictures of what is not open any
 * more. A picture is a file of its own content: the row turns to the new one when it is there, then the old one goes.
 * @throws UNAVAILABLE when there is no room for files
 */
export async function drawSharePictures(ctx: Context): Promise<void> {
  for (const { seriesId, fileKey } of await picturesToTakeAway()) {
    await SharePicture.destroy({ where: { seriesId } });
    if (fileKey !== null) await ctx.services.media.remove(fileKey);
  }
  const due = await picturesToDraw(AT_ONCE);
  if (due.length > 0) await ctx.services.media.requireRoom();
  for (const series of due) await drawOne(ctx, series);
}

async function drawOne(ctx: Context, series: ToDraw): Promise<void> {
  const { seriesId, publicId, changedAt } = series;
  const svg = drawingOf(series);
  const drawingHash = hashOf(svg);
  const before = await SharePicture.findByPk(seriesId);
  if (before?.drawingHash === drawingHash) {
    await before.update({ drawnOf: changedAt });
    return;
  }
  const fileKey = `share/${publicId}/${drawingHash}.png`;
  const isMade = await writeSharePicture(ctx.services.media, fileKey, svg).then(() => true, (error: unknown) => {
    console.error(JSON.stringify({ level: 'error', requestId: ctx.requestId, message: `share picture of series ${publicId}: ${error instanceof Error ? error.message : String(error)}` }));
    return false;
  });
  await SharePicture.upsert({ seriesId, drawingHash, fileKey: isMade ? fileKey : null, drawnOf: changedAt });
  if (before !== null && before.fileKey !== null && before.fileKey !== fileKey) await ctx.services.media.remove(before.fileKey);
}

/** A piece that cannot be made as it is described leaves a picture of words. */
function drawingOf({ title, teacherName, workroomName, data }: ToDraw): string {
  const { name, rest } = titleHalves(title);
  const plan = data === null ? null : planPiece(data);
  const cloth = data === null || plan === null || !plan.ok ? null : clothOf(data, plan.value, name);
  return drawSharePicture(cloth, { name, rest, teacherName, workroomName });
}
