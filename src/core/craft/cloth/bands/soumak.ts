/**
 * Soumak: a stitch goes over some ends and back under fewer, so it lies slanted. Rows lean in turn; two that follow each
 * other without tabby between them make a chain.
 */
import type { SoumakBand } from '#core/craft/cloth/cloth-piece.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { drawEnds } from '#core/craft/cloth/ends.ts';
import { ROUND, box, moved, num } from '#core/craft/cloth/markup.ts';
import { drawPicks, plyPaint, rowsOver } from '#core/craft/cloth/picks.ts';
import { onFace, soumakRow } from '#core/craft/interlacement/lay.ts';
import { realEnds, type Weave } from '#core/craft/cloth/weave.ts';

/** Rows thinner than this, in pixels, are gathered: there must be room for shadow, body and light. */
const THINNEST_ROW = 4.4;

export function drawSoumak(band: SoumakBand, height: number, weave: Weave): string {
  const most = Math.max(1, Math.floor(height / Math.max(THINNEST_ROW, weave.minPick * 1.3)));
  const rows = band.rows <= most ? Math.max(1, band.rows) : Math.max(1, most - (most % 2));
  const gaps = band.tabbyBetween > 0 ? rows - 1 : 0;
  const thick = gaps > 0 ? (height * band.soumakShare) / rows : height / rows;
  const gap = gaps > 0 ? (height - thick * rows) / gaps : 0;
  const stitches = stitchRows(band, thick, weave);
  let drawn = castBelow(height, thick, weave) + box(0, 0, weave.width, height, shade(band.colour, 0.6));
  for (let row = 0; row < rows; row++) {
    const top = row * (thick + gap);
    if (row < gaps) drawn += drawBetween(band, top + thick, gap, weave);
    const leansUp = row % 2 === 0;
    drawn += drawRow(leansUp ? stitches.up : stitches.down, top + thick / 2, thick, stitches.stroke, band.colour, weave);
  }
  return drawn;
}

/** A ridge stands out of the cloth, so it lays a little shadow on the rows below it. */
function castBelow(height: number, thick: number, weave: Weave): string {
  return `<g fill-opacity=".22">${box(0, height, weave.width, Math.max(1, thick * 0.26), '#101c2d')}</g>`;
}

interface StitchRows {
  /** One row of each lean as strokes about y = 0; every row of the band re-uses one of them. */
  readonly up: string;
  readonly down: string;
  readonly stroke: number;
}

function stitchRows(band: SoumakBand, thick: number, weave: Weave): StitchRows {
  const row = soumakRow({ first: 0, last: realEnds(weave) - 1 }, band.over, band.back);
  const count = Math.max(1, Math.min(onFace(row, 'front').length, Math.round(weave.width / (thick * 0.6))));
  const step = weave.width / count;
  const rise = thick * 0.2;
  let up = '';
  let down = '';
  for (let i = 0; i < count; i++) {
    const x = num((i + 0.5) * step - step * 0.36);
    up += `M${x} ${num(rise)}q${num(step * 0.16)} ${num(-rise * 1.4)} ${num(step * 0.72)} ${num(-rise * 2)}`;
    down += `M${x} ${num(-rise)}q${num(step * 0.16)} ${num(rise * 1.4)} ${num(step * 0.72)} ${num(rise * 2)}`;
  }
  return { up, down, stroke: Math.min(thick * 0.94, step) };
}

function drawRow(d: string, y: number, thick: number, stroke: number, colour: string, weave: Weave): string {
  const { paths } = weave;
  const tone = weave.chance() < 0.4 ? light(colour, 0.05) : colour;
  const at = (off: number): string => ROUND + moved(0, y + off);
  let drawn = paths.stroke(d, shade(colour, 0.58), stroke * 1.08, at(thick * 0.08)) + paths.stroke(d, tone, stroke * 0.86, at(0));
  if (weave.plied && thick > 12) drawn += paths.stroke(d, plyPaint(weave.id, colour), stroke * 0.84, at(0));
  if (thick > 3) drawn += paths.stroke(d, light(tone, 0.24), stroke * 0.22, at(-stroke * 0.2));
  return drawn;
}

/** The plain picks that hold one row of soumak apart from the next. */
function drawBetween(band: SoumakBand, top: number, height: number, weave: Weave): string {
  if (height < 1.2) return '';
  const count = Math.max(1, Math.min(band.tabbyBetween, Math.floor(height / (weave.minPick * 0.85))));
  const pitch = height / count;
  const picks = drawPicks(rowsOver(count, pitch, top, weave), pitch, band.tabbyColour, 0.7, weave);
  return box(0, top, weave.width, height, shade(band.tabbyColour, 0.6)) + picks.under + drawEnds(top, top + height, weave) + picks.over;
}
