/** A band of tabby, and the shapes (wedges, slopes, circles) woven into it. */
import type { ClothShape, TabbyBand } from '#core/craft/cloth/cloth-piece.ts';
import { shade } from '#core/craft/cloth/colour.ts';
import { drawEnds, strokeEnds } from '#core/craft/cloth/ends.ts';
import { box, num } from '#core/craft/cloth/markup.ts';
import { spansByRow } from '#core/craft/cloth/spans.ts';
import { drawPicks, rowsOver, sideBySide, type PickRow } from '#core/craft/cloth/picks.ts';
import { drawSelvedge } from '#core/craft/cloth/selvedge.ts';
import { drawnRows, rowOnScreen, type Weave } from '#core/craft/cloth/weave.ts';

export function drawTabby(band: TabbyBand, height: number, weave: Weave): string {
  const count = drawnRows(band.picks, height, weave.minPick);
  const pitch = height / count;
  const met = metBy(band, weave);
  const threads = threadsDrawn(band, pitch, weave);
  const ground = drawGround(band.colour, count, height, band.cover, weave, { met, threads });
  const shapes = band.shapes.map((shape) => {
    const rows = sideBySide(shapeRows(shape, band, count, pitch, met), pitch, threads);
    return drawShape(shape, rows, pitch / threads, band.cover, weave, met);
  });
  return ground + shapes.join('');
}

/** The warp as this band's weft meets it: in basket weave two ends are one. */
function metBy(band: TabbyBand, weave: Weave): Weave {
  return band.together === 2 ? { ...weave, end: weave.end * 2, ends: Math.ceil(weave.ends / 2) } : weave;
}

/** More threads in a row than this are a bundle, and are seen as one. */
const MOST_THREADS = 3;

/** The threads of a row, where there is room to see each of them. */
function threadsDrawn({ strands = 1 }: TabbyBand, pitch: number, weave: Weave): number {
  return strands <= MOST_THREADS && pitch / strands >= weave.minPick ? strands : 1;
}

/** Plain tabby in one colour: what stands under shapes and pile alike. */
export function drawGround(colour: string, count: number, height: number, cover: number, weave: Weave, { met, threads } = { met: weave, threads: 1 }): string {
  const pitch = height / count / threads;
  const rows = sideBySide(rowsOver(count, pitch * threads, 0, met), pitch * threads, threads);
  const picks = drawPicks(rows, pitch, colour, cover, met);
  return (
    box(0, 0, weave.width, height, shade(colour, 0.6)) +
    picks.under +
    drawEnds(0, height, weave) +
    drawSelvedge(rows, pitch, colour, weave) +
    picks.over
  );
}

/** A band's slopes climb in about this many steps: hands step a wedge every few rows, and the eye reads the stair. */
const STEPS = 20;

/** The shape's rows on the screen: spans snapped to two drawn ends, rows gathered into steps. */
function shapeRows(shape: ClothShape, band: TabbyBand, count: number, pitch: number, weave: Weave): PickRow[] {
  const spans = spansByRow(shape);
  const every = Math.max(1, Math.round(count / STEPS));
  const rows: PickRow[] = [];
  for (let row = 0; row < count; row++) {
    const woven = weave.begin === 'head' ? row : count - 1 - row;
    const step = Math.floor(woven / every) * every;
    for (const span of spans.get(Math.floor(((step + every / 2) / count) * band.picks)) ?? []) {
      const a = snap(span.from, weave);
      const b = snap(span.to, weave);
      if (b - a < 2 * weave.end) continue;
      const turned = weave.begin === 'head';
      rows.push({ y: (row + 0.5) * pitch, row: rowOnScreen(row, count, weave), x0: turned ? weave.width - b : a, x1: turned ? weave.width - a : b });
    }
  }
  return rows;
}

function snap(end: number, weave: Weave): number {
  const pairs = Math.round(end / weave.grouped / 2);
  return Math.max(0, Math.min(weave.width, pairs * 2 * weave.end));
}

function drawShape(shape: ClothShape, rows: readonly PickRow[], pitch: number, cover: number, weave: Weave, met: Weave): string {
  if (rows.length === 0) return '';
  const { paths } = weave;
  const stretch = rows.map((row) => `M${num(row.x0)} ${num(row.y)}H${num(row.x1)}`).join('');
  const picks = drawPicks(rows, pitch, shape.colour, cover, met);
  return (
    paths.stroke(stretch, shade(shape.colour, 0.6), pitch + 0.4) +
    picks.under +
    strokeEnds(stretch, pitch + 0.2, weave) +
    drawSelvedge(rows, pitch, shape.colour, weave) +
    picks.over
  );
}
