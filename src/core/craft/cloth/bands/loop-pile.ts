/** Loop pile: on tabby, rows of loops that hang a little over the row below. Lower rows come first. */
import { drawGround } from '#core/craft/cloth/bands/tabby.ts';
import type { LoopPileBand } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { ROUND, moved, num } from '#core/craft/cloth/markup.ts';
import { drawnRows, type Weave } from '#core/craft/cloth/weave.ts';

const GROUND_COVER = 0.7;

const loopRows = (band: LoopPileBand, height: number, weave: Pick<Weave, 'minPick'>): number => (band.rows === 1 ? 1 : drawnRows(band.rows, height, weave.minPick * 2.4));

export function loopGroundRows(band: LoopPileBand, height: number, weave: Pick<Weave, 'minPick'>): number {
  return drawnRows(loopRows(band, height, weave) * 4, height, weave.minPick);
}

export function drawLoopPile(band: LoopPileBand, height: number, weave: Weave): string {
  const count = loopRows(band, height, weave);
  const unit = height / count;
  const { end, paths } = weave;
  const width = Math.min(end * 0.62, unit * 0.5);
  /* A quadratic curve reaches half as far as its handle. */
  const hang = Math.min(Math.max(unit * 0.75, band.loopMm * weave.pxPerMm), unit * 1.6) * 2;
  let d = '';
  for (let x = 0; x < weave.width - end * 0.5; x += end) d += `M${num(x + end * 0.2)} 0q${num(end * 0.3)} ${num(hang)} ${num(end * 0.6)} 0`;
  let drawn = drawGround(band.groundColour, loopGroundRows(band, height, weave), height, GROUND_COVER, weave);
  for (let row = count - 1; row >= 0; row--) {
    const at = (off: number): string => ROUND + moved(0, row * unit + unit * 0.16 + off);
    drawn += paths.stroke(d, shade(band.colour, 0.55), width * 1.15, at(width * 0.3));
    drawn += paths.stroke(d, band.colour, width * 0.9, at(0));
    drawn += paths.stroke(d, light(band.colour, 0.3), width * 0.26, at(-width * 0.16));
  }
  return drawn;
}
