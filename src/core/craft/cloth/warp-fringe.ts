/** The foot of a piece without pile: the warp's own ends in fours, a knot close to the cloth, loose tails. */
import { light, shade } from '#core/craft/cloth/colour.ts';
import { ROUND, num } from '#core/craft/cloth/markup.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';

const ENDS_IN_KNOT = 4;
const FRINGE_MM = 45;

export function warpFringeHeight(weave: Pick<Weave, 'pxPerMm' | 'end'>): number {
  return Math.max(FRINGE_MM * weave.pxPerMm, weave.end * 3);
}

/** Drawn downwards from the edge of the cloth at y = 0. */
export function drawWarpFringe(weave: Weave): string {
  const height = warpFringeHeight(weave);
  const knotY = Math.min(height * 0.3, weave.end * 2.2);
  let strands = '';
  let knots = '';
  for (let first = 0; first < weave.ends; first += ENDS_IN_KNOT) {
    const count = Math.min(ENDS_IN_KNOT, weave.ends - first);
    const middle = (first + count / 2) * weave.end;
    for (let i = 0; i < count; i++) strands += strandPath((first + i + 0.5) * weave.end, middle, i - (count - 1) / 2, knotY, height, weave);
    knots += `M${num(middle - weave.end * 0.3)} ${num(knotY)}h${num(weave.end * 0.6)}`;
  }
  const { paths, warpColour, warpWidth: w } = weave;
  return (
    paths.stroke(strands, shade(warpColour, 0.45), w, ROUND) +
    paths.stroke(strands, warpColour, w * 0.66, ROUND) +
    paths.stroke(knots, shade(warpColour, 0.5), Math.max(2, weave.end * 0.9), ROUND) +
    paths.stroke(knots, light(warpColour, 0.15), Math.max(1.4, weave.end * 0.64), ROUND)
  );
}

/** One end: drawn together to the knot, then hanging a little apart. */
function strandPath(x: number, middle: number, place: number, knotY: number, height: number, weave: Weave): string {
  const at = middle + place * weave.end * 0.16;
  const fall = height * (0.9 + weave.chance() * 0.1) - knotY;
  const sway = (weave.chance() - 0.5) * weave.end * 0.6;
  return `M${num(x)} 0Q${num(x)} ${num(knotY * 0.6)} ${num(at)} ${num(knotY)}q${num(sway)} ${num(fall * 0.5)} ${num(place * weave.end * 0.5)} ${num(fall)}`;
}
