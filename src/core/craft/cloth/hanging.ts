/** What a piece hangs from, and the one flat shadow it casts. */
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { lashingWraps } from '#core/craft/hanging.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';
import { ROUND, box, dashes, num } from '#core/craft/cloth/markup.ts';

/** Dowel and cord. `top` is where the cloth's warp begins below the dowel. */
export function drawDowel(width: number, inset: number, top: number): string {
  const { y, r } = dowelAt(width, top);
  const from = inset + r;
  const to = width - inset - r;
  const rod = (dy: number, colour: string, thick: number): string =>
    `<path d="M${num(from)} ${num(y + dy)}H${num(to)}" stroke="${colour}" stroke-width="${num(thick)}" stroke-linecap="round"/>`;
  const peak = Math.max(1.5, y - top * 0.66);
  const cord = `M${num(width * 0.14)} ${num(y)}L${num(width / 2)} ${num(peak)}L${num(width * 0.86)} ${num(y)}`;
  return (
    `<path class="cord" d="${cord}" stroke="#646f77" stroke-width="${num(Math.max(1, r * 0.32))}" stroke-linejoin="round"/>` +
    rod(0, '#6f6250', r * 2) + rod(-r * 0.15, '#a4957c', r * 1.35) + rod(-r * 0.5, '#c5b89f', r * 0.45)
  );
}

/** The dowel's middle and half its thickness. */
function dowelAt(width: number, top: number): { readonly y: number; readonly r: number } {
  return { y: top * 0.72, r: Math.max(2.5, width * 0.014) };
}

/** Over the dowel: a knot at each loop that is tied to it, or the wraps of yarn that lash the edge to it. Slipped loops need nothing. */
export function drawFixing(piece: WovenPiece, width: number, top: number, weave: Weave): string {
  const { y, r } = dowelAt(width, top);
  const { fixing = 'slipped' } = piece;
  if (fixing === 'slipped') return '';
  return fixing === 'tied' ? drawTies(y, r, weave) : drawLashing(piece, y, r, top, weave);
}

function drawTies(y: number, r: number, weave: Weave): string {
  const { end, width, warpColour, paths } = weave;
  const over = `M0 ${num(y)}H${num(width)}`;
  const knots = `M0 ${num(y + r * 1.25)}H${num(width)}`;
  const each = (wide: number): string => dashes(wide, 2 * end - wide, end - wide / 2);
  const dot = dashes(0.01, 2 * end - 0.01, end) + ROUND;
  const thick = Math.max(1.4, Math.min(end * 0.9, r * 0.9));
  return (
    paths.stroke(over, shade(warpColour, 0.45), 2 * r, each(weave.warpWidth)) + paths.stroke(over, warpColour, 2 * r, each(weave.warpWidth * 0.66)) +
    paths.stroke(knots, shade(warpColour, 0.5), thick * 1.25, dot) + paths.stroke(knots, light(warpColour, 0.15), thick * 0.85, dot)
  );
}

/** In the yarn of the band at the dowel: as many wraps as its yarn is reckoned for, or as there is room to see. */
function drawLashing(piece: WovenPiece, y: number, r: number, top: number, weave: Weave): string {
  const { width, paths } = weave;
  const solid = piece.bands.filter((band) => band.heightMm > 0);
  const colour = (weave.begin === 'head' ? solid[0] : solid.at(-1))?.colour ?? piece.warpColour;
  const wraps = Math.max(2, Math.min(lashingWraps(piece.widthMm), Math.floor(width / 5)));
  const step = width / wraps;
  const low = top + 6;
  let d = '';
  for (let wrap = 0; wrap < wraps; wrap++) d += `M${num((wrap + 0.32) * step)} ${num(y - r)}L${num((wrap + 0.68) * step)} ${num(low)}`;
  const thick = Math.max(1, Math.min(r * 0.7, step * 0.4));
  return paths.stroke(d, shade(colour, 0.5), thick, ROUND) + paths.stroke(d, light(colour, 0.1), thick * 0.66, ROUND);
}

export function drawCastShadow(x: number, y: number, width: number, height: number): string {
  return `<g class="cast" fill-opacity=".13">${box(x + 5, y + 6, width, height, '#101c2d')}</g>`;
}
