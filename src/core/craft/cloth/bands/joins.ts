/** Where two colours of a band meet in the gap between two ends: open as a slit, or closed by wefts that hook into each other. */
import { light, shade } from '#core/craft/cloth/colour.ts';
import { dashes, moved, num } from '#core/craft/cloth/markup.ts';
import { LIT_FROM, type PickRow } from '#core/craft/cloth/picks.ts';
import type { Weave } from '#core/craft/cloth/weave.ts';
import type { Meeting } from '#core/craft/interlacement/lay.ts';

/** A gap that stays between the same two ends, over rows that follow one another. */
interface Seam {
  readonly x: number;
  readonly top: number;
  bottom: number;
  /** Colour of the area on the far side of the gap. */
  readonly beside: string;
}

/** The colour that lies at a place of a row, before the area is laid. */
export type ColourAt = (row: PickRow, x: number) => string;

/**
 * Drawn over the area and what lies beside it. Dovetailed colours have no gap between them: their rows alone show it.
 * @param rows of the area, from above
 */
export function drawJoins(rows: readonly PickRow[], join: Meeting, pitch: number, colour: string, colourAt: ColourAt, weave: Weave): string {
  if (join === 'dovetail') return '';
  const seams = seamsOf(rows, pitch, colourAt, weave);
  return join === 'slit' ? drawSlits(seams, pitch, weave) : drawHooks(seams, pitch, colour, weave);
}

function seamsOf(rows: readonly PickRow[], pitch: number, colourAt: ColourAt, weave: Weave): Seam[] {
  const seams: Seam[] = [];
  for (const row of rows) {
    for (const [x, out] of [[row.x0, -1], [row.x1, 1]] as const) {
      if (x < 0.5 || weave.width - x < 0.5) continue;
      const beside = colourAt(row, x + (out * weave.end) / 2);
      const top = row.y - pitch / 2;
      const above = seams.findLast((seam) => seam.x === x && seam.beside === beside && Math.abs(seam.bottom - top) < 0.1);
      if (above === undefined) seams.push({ x, top, bottom: top + pitch, beside });
      else above.bottom += pitch;
    }
  }
  return seams;
}

const lineOf = ({ x, top, bottom }: Seam): string => `M${num(x)} ${num(top)}V${num(bottom)}`;

/** The lines of all seams beside each colour. A gap of a single row closes again at the next one, and is not seen. */
function linesBeside(seams: readonly Seam[], least: number): ReadonlyMap<string, string> {
  const lines = new Map<string, string>();
  for (const seam of seams) {
    if (seam.bottom - seam.top >= least) lines.set(seam.beside, (lines.get(seam.beside) ?? '') + lineOf(seam));
  }
  return lines;
}

function drawSlits(seams: readonly Seam[], pitch: number, weave: Weave): string {
  const wide = Math.max(0.8, Math.min(weave.end * 0.18, 3));
  return [...linesBeside(seams, pitch * 1.5)].map(([beside, d]) => weave.paths.stroke(d, shade(beside, 0.72), wide)).join('');
}

/** In every gap the two wefts reach over to each other's side in turns, row by row: one row is one dash across the gap. */
function drawHooks(seams: readonly Seam[], pitch: number, colour: string, weave: Weave): string {
  const reach = weave.end * 0.8;
  const thick = pitch * 0.74;
  const hook = (d: string, own: string, row: 0 | 1): string => {
    const dash = (high: number): string => dashes(high, 2 * pitch - high, (row + 0.5) * pitch - thick / 2);
    const lit = pitch < LIT_FROM ? '' : weave.paths.stroke(d, light(own, 0.22), reach * 0.8, dash(thick * 0.3) + moved(0, thick * 0.1));
    return weave.paths.stroke(d, shade(own, 0.5), reach * 1.15, dash(thick) + moved(0, pitch * 0.18)) + weave.paths.stroke(d, own, reach, dash(thick)) + lit;
  };
  const others = [...linesBeside(seams, 0)].map(([beside, d]) => hook(d, beside, 1));
  return others.join('') + hook(seams.map(lineOf).join(''), colour, 0);
}
