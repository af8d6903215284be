/** Heading: a few spaced picks in warp yarn. Stands for parts of the work that are not yet cloth. */
import type { HeadingBand } from '#core/craft/cloth/cloth-piece.ts';
import { drawEnds } from '#core/craft/cloth/ends.ts';
import { drawPicks, rowsOver } from '#core/craft/cloth/picks.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';

export const headingRows = (height: number, weave: Pick<Weave, 'minPick'>): number => Math.max(1, Math.floor(height / (weave.minPick * 2.2)));

export function drawHeading(band: HeadingBand, height: number, weave: Weave): string {
  const count = headingRows(height, weave);
  const picks = drawPicks(rowsOver(count, height / count, 0, weave), weave.minPick * 0.8, band.colour, 0.5, weave);
  return picks.under + drawEnds(0, height, weave) + picks.over;
}
