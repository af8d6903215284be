/** Roving: a very thick weft that goes over and under several ends at a time. */
import type { RovingBand } from '#core/craft/cloth/cloth-piece.ts';
import { shade } from '#core/craft/cloth/colour.ts';
import { drawEnds } from '#core/craft/cloth/ends.ts';
import { box } from '#core/craft/cloth/markup.ts';
import { drawPicks, rowsOver } from '#core/craft/cloth/picks.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';

const ROVING_COVER = 0.85;

export function drawRoving(band: RovingBand, height: number, weave: Weave): string {
  const count = Math.max(2, 2 * band.passes);
  const pitch = height / count;
  const asked = Math.max((weave.end / weave.grouped) * band.over, pitch * 0.9);
  const floats = Math.max(2, 2 * Math.round(weave.width / asked / 2));
  const wide: Weave = { ...weave, end: weave.width / floats };
  const picks = drawPicks(rowsOver(count, pitch, 0, weave.width), pitch, band.colour, ROVING_COVER, wide);
  return box(0, 0, weave.width, height, shade(band.colour, 0.5)) + picks.under + drawEnds(0, height, weave) + picks.over;
}
