/** A band of tabby, and the shapes (wedges, slopes, circles) woven into it. */
import { drawJoins, type ColourAt } from '#core/craft/cloth/bands/joins.ts';
import type { ClothShape, TabbyBand } from '#core/craft/cloth/cloth-piece.ts';
import { shade } from '#core/craft/cloth/colour.ts';
import { drawEnds, strokeEnds } from '#core/craft/cloth/ends.ts';
import { box, num } from '#core/craft/cloth/markup.ts';
import { spansByRow } from '#core/craft/cloth/spans.ts';
import { drawPicks, rowsOver, sideBySide, type PickRow } from '#core/craft/cloth/picks.ts';
import { drawSelvedge } from '#core/craft/cloth/selvedge.ts';
import { drawnRows, rowOnScreen, type Weave } from '#core/craft/cloth/weave.ts';
import { endsShown, type Ends, type Meeting } from '#core/craft/interlacement/lay.ts';

export function drawTabby(band: TabbyBand, height: number, weave: Weave): string {
  const count = drawnRows(band.picks, height, weave.minPick);
  const pitch = height / count;
  const met = metBy(band, weave);
  const threads = threadsDrawn(band, pitch, weave);
  const ground = drawGround(band.colour, count, height, band.cover, weave, { met, threads });
  const areas = band.shapes.map((shape) => ({ shape, rows: shapeRows(shape, band, count, pitch, met) }));
  const shapes = areas.map(({ shape, rows }, index) => {
    const area = drawShape(shape, sideBySide(rows, pitch, threads), pitch / threads, band.cover, weave, met);
    if (!weave.joined) return area;
    const below = areas.slice(0, index);
    const colourAt: ColourAt = (row, x) => below.findLast((area) => area.rows.some((each) => each.row === row.row && each.x0 < x && x < each.x1))?.shape.colour ?? band.colour;
    return area + drawJoins(rows, joinOf(shape), pitch, shape.colour, colourAt, met);
  });
  return ground + shapes.join('');
}

const joinOf = ({ join = 'slit' }: ClothShape): Meeting => join;

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
      if (b - a < 2) continue;
      rows.push({ y: (row + 0.5) * pitch, row: rowOnScreen(row, count, weave), ...onScreen(shownEnds(a, b, woven, joinOf(shape), weave), weave) });
    }
  }
  return rows;
}

/** The nearest drawn end that is a multiple of two. */
function snap(end: number, { ends, grouped }: Weave): number {
  return Math.max(0, Math.min(ends, Math.round(end / grouped / 2) * 2));
}

/** Ends `a` up to (not including) `b` as they show in a row: dovetailed, the end at each side is shared with what lies beside. */
function shownEnds(a: number, b: number, row: number, join: Meeting, { ends, joined }: Weave): Ends {
  const all = { first: 0, last: ends - 1 };
  const meeting = joined ? join : 'slit';
  return {
    first: a === 0 ? 0 : endsShown(all, a, meeting, row)[1].first,
    last: b === ends ? ends - 1 : endsShown(all, b, meeting, row)[0].last,
  };
}

function onScreen({ first, last }: Ends, { begin, width, end }: Weave): Pick<PickRow, 'x0' | 'x1'> {
  const [from, to] = [first * end, Math.min(width, (last + 1) * end)];
  return begin === 'head' ? { x0: width - to, x1: width - from } : { x0: from, x1: to };
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
