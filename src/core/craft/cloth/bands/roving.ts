/** Roving: a very thick weft that goes over and under several ends at a time. */
import type { RovingBand } from '#core/craft/cloth/cloth-piece.ts';
import { shade } from '#core/craft/cloth/colour.ts';
import { drawEnds } from '#core/craft/cloth/ends.ts';
import { box } from '#core/craft/cloth/markup.ts';
import { drawPicks, rowsOver } from '#core/craft/cloth/picks.ts';
import { rovingRow } from '#core/craft/interlacement/lay.ts';
import { realEnds, type Weave } from '#core/craft/cloth/weave.ts';

const ROVING_COVER = 0.85;

/** A pass is seen as two rows: so thick a weft lies in two layers. */
export const rovingRows = (band: RovingBand): number => Math.max(2, 2 * band.passes);

export function drawRoving(band: RovingBand, height: number, weave: Weave): string {
  const count = rovingRows(band);
  const pitch = height / count;
  const real = rovingRow({ first: 0, last: realEnds(weave) - 1 }, band.over).length;
  const floats = Math.max(2, 2 * Math.round(Math.min(real, weave.width / (pitch * 0.9)) / 2));
  const wide: Weave = { ...weave, ends: floats, end: weave.width / floats };
  const picks = drawPicks(rowsOver(count, pitch, 0, wide), pitch, band.colour, ROVING_COVER, wide);
  return box(0, 0, weave.width, height, shade(band.colour, 0.5)) + picks.under + drawEnds(0, height, weave) + picks.over;
}
