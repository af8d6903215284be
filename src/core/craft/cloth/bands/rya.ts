/**
 * Rya: knots in a row, each with pile that falls over whatever lies below it, always towards the foot of the screen.
 *
 * Pile is most of what one sees, so each strand is drawn. Two rows of pile are made by chance and used in turn: the eye
 * does not find the repeat and the markup stays small.
 */
import { drawGround } from '#core/craft/cloth/bands/tabby.ts';
import type { RyaBand } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { ROUND, moved, num } from '#core/craft/cloth/markup.ts';
import { drawnRows, groupsShown, realEnds, stretchOf, type Weave } from '#core/craft/cloth/weave.ts';
import { ryaKnotEnds } from '#core/craft/techniques/rya.ts';

/** Tabby that shows between knots is packed this close. */
const GROUND_COVER = 0.7;

/** Strands a picture shows for one knot: more would be finer than the eye sees at that size. */
function drawnStrands(step: number, strands: number): number {
  const room = step > 14 ? 6 : step > 9 ? 4 : 3;
  return Math.max(2, Math.min(room, strands));
}

/** How far pile falls below its knot, in pixels. */
export function ryaFall(band: RyaBand, unit: number, weave: Pick<Weave, 'pxPerMm' | 'longestPile'>): number {
  return Math.min(Math.max(unit * 1.9, band.pileMm * weave.pxPerMm), weave.longestPile(unit * band.rows));
}

export const ryaGroundRows = (height: number, weave: Pick<Weave, 'minPick'>): number => drawnRows(Number.POSITIVE_INFINITY, height, weave.minPick);

export function drawRya(band: RyaBand, height: number, weave: Weave): string {
  const rows = Math.max(1, Math.min(band.rows, Math.floor(height / (weave.minPick * 3)) || 1));
  const unit = height / rows;
  const fall = ryaFall(band, height / band.rows, weave);
  const groundRows = ryaGroundRows(height, weave);
  const knots = knotsOf(band, weave);
  const kinds = [pileRow(band, knots, fall, weave), pileRow(band, knots, fall, weave)];
  let drawn = drawGround(band.groundColour, groundRows, height, GROUND_COVER, weave);
  for (let row = rows - 1; row >= 0; row--) {
    drawn += drawPile(kinds[row % 2] ?? [], (row + 0.4) * unit, strandWidth(knots.step), band.colour, weave);
    drawn += drawKnots(knots, (row + 0.4) * unit, band.colour, weave);
  }
  return drawn;
}

/** The knots of a row, where the plan has them; ends at the edges that are left plain have none. */
function knotsOf(band: RyaBand, weave: Weave): Knots {
  const places = groupsShown(ryaKnotEnds(realEnds(weave), band.edgeEnds ?? 0, band.knotEnds / 2), weave).map((ends) => stretchOf(ends, weave));
  return { middles: places.map(({ x0, x1 }) => (x0 + x1) / 2), step: Math.max(1, ...places.map(({ x0, x1 }) => x1 - x0)) };
}

interface Knots {
  /** Pixels from the left. */
  readonly middles: readonly number[];
  /** From knot to knot. */
  readonly step: number;
}

function strandWidth(step: number): number {
  return Math.max(0.9, Math.min(step * 0.3, 7));
}

/** The strands of one row of knots, sorted by chance into three tones. */
function pileRow(band: RyaBand, { middles, step }: Knots, fall: number, weave: Weave): string[] {
  const strands = drawnStrands(step, band.strands);
  const tones = ['', '', ''];
  for (const x of middles) {
    for (let strand = 0; strand < strands; strand++) {
      const end = Math.round(fall * (0.86 + weave.chance() * 0.18));
      const sway = (weave.chance() - 0.5) * step * 0.9;
      const from = x + ((strand + 0.5) / strands - 0.5) * step * 0.8;
      const tone = Math.floor(weave.chance() * 3);
      tones[tone] = `${tones[tone] ?? ''}M${num(from)} 0q${num(-sway)} ${Math.round(end * 0.55)} ${num(sway * 0.6)} ${end}`;
    }
  }
  return tones;
}

function drawPile(tones: readonly string[], y: number, width: number, colour: string, weave: Weave): string {
  const { paths } = weave;
  const at = (x: number, off: number): string => ROUND + moved(x, y + off);
  const paints = [shade(colour, 0.17), shade(colour, 0.07), colour];
  let drawn = '';
  for (const d of tones) drawn += paths.stroke(d, shade(colour, 0.5), width * 1.5, ` stroke-opacity=".5"${at(width * 0.4, width * 0.35)}`);
  tones.forEach((d, tone) => (drawn += paths.stroke(d, paints[tone] ?? colour, width, at(0, 0))));
  if (width > 1.4) drawn += paths.stroke(tones[2] ?? '', light(colour, 0.5), width * 0.3, at(-width * 0.18, 0));
  return drawn;
}

function drawKnots({ middles, step }: Knots, y: number, colour: string, weave: Weave): string {
  const { paths } = weave;
  const width = strandWidth(step);
  let d = '';
  for (const x of middles) d += `M${num(x - step * 0.27)} 0h${num(step * 0.54)}`;
  const at = (off: number): string => ROUND + moved(0, y + off);
  let drawn = paths.stroke(d, shade(colour, 0.5), Math.max(2, width * 2), at(width * 0.3));
  drawn += paths.stroke(d, colour, Math.max(1.6, width * 1.6), at(0));
  if (width > 1.4) drawn += paths.stroke(d, light(colour, 0.4), width * 0.5, at(-width * 0.4));
  return drawn;
}
