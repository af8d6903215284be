/** Which colour lies where in the rows of a tabby band that has shapes in it. */
import type { ColourArea } from '#core/craft/colour-areas.ts';
import type { Shape, ShapeJoin } from '#core/craft/piece.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';
import { stepShape } from '#core/craft/shapes.ts';

export interface BandGrid {
  readonly rows: number;
  /** Working ends. */
  readonly ends: number;
  readonly spacingMm: number;
  readonly pickSpacingMm: number;
  /** Finished width of the cloth, over which a shape's place is measured. */
  readonly widthMm: number;
}

/** A run of ends in one row. */
export interface Span {
  readonly start: number;
  readonly ends: number;
}

/** A shape stepped out and set in its place: one span a row, in the band's own rows. */
export interface PlacedShape {
  readonly yarn: string;
  readonly join: ShapeJoin;
  readonly firstRow: number;
  readonly spans: readonly Span[];
}

/** Steps alike on both sides, unless asked otherwise or leaning. */
export function isSymmetric(shape: Shape): boolean {
  return shape.symmetric ?? (shape.leanMm ?? 0) === 0;
}

/** The middle of the base, counted in ends from the left selvedge. */
export function centreInEnds(shape: Shape, grid: Pick<BandGrid, 'ends' | 'widthMm'>): number {
  return shape.centreMm === undefined ? grid.ends / 2 : (shape.centreMm / grid.widthMm) * grid.ends;
}

export function placeShape(shape: Shape, grid: BandGrid): PlacedShape {
  const firstRow = roundHalfUp((shape.bottomMm ?? 0) / grid.pickSpacingMm);
  const { widths } = stepShape(shape, { ...grid, symmetric: isSymmetric(shape) });
  const centre = centreInEnds(shape, grid);
  const leanEnds = (shape.leanMm ?? 0) / grid.spacingMm;
  const spans = widths.slice(0, Math.max(0, grid.rows - firstRow)).map((width, index) => {
    const ends = Math.min(width, grid.ends);
    const middle = centre + (leanEnds * (index + 0.5)) / widths.length;
    return { start: Math.min(grid.ends - ends, Math.max(0, roundHalfUp(middle - ends / 2))), ends };
  });
  return { yarn: shape.yarn, join: shape.join ?? 'slit', firstRow, spans };
}

/** A stretch of a row in one yarn; `layer` 0 is the ground, later shapes lie over earlier ones. */
interface Stretch {
  readonly start: number;
  readonly end: number;
  readonly yarn: string;
  readonly layer: number;
  readonly join: ShapeJoin;
}

function layOver(stretches: readonly Stretch[], top: Stretch): Stretch[] {
  if (top.end <= top.start) return [...stretches];
  const beside = stretches.flatMap((under) => [
    { ...under, end: Math.min(under.end, top.start) },
    { ...under, start: Math.max(under.start, top.end) },
  ]);
  return [...beside.filter(({ start, end }) => end > start), top].sort((a, b) => a.start - b.start);
}

/** Neighbours meet as the upper one of them asks. */
function joinOf(a: Stretch, b: Stretch): ShapeJoin {
  return a.layer > b.layer ? a.join : b.join;
}

export interface YarnArea extends ColourArea {
  readonly yarn: string;
}

/** The colour areas of one row (from 0), left to right. */
export function areasOfRow(row: number, ground: string, shapes: readonly PlacedShape[], ends: number): readonly YarnArea[] {
  const bare: Stretch = { start: 0, end: ends, yarn: ground, layer: 0, join: 'slit' };
  const stretches = shapes.reduce<readonly Stretch[]>((laid, { yarn, join, firstRow, spans }, index) => {
    const span = spans[row - firstRow];
    if (span === undefined) return laid;
    return layOver(laid, { start: span.start, end: span.start + span.ends, yarn, layer: index + 1, join });
  }, [bare]);
  return stretches.map((stretch, index) => {
    const before = stretches[index - 1];
    const after = stretches[index + 1];
    return {
      yarn: stretch.yarn,
      ends: stretch.end - stretch.start,
      left: before === undefined ? 'selvedge' : joinOf(before, stretch),
      right: after === undefined ? 'selvedge' : joinOf(stretch, after),
    };
  });
}

/** The most rows in which a slit at one side of the shape stays between the same two ends. */
export function longestSlitRows({ spans }: PlacedShape): number {
  let longest = 0;
  for (const edgeOf of [(span: Span) => span.start, (span: Span) => span.start + span.ends]) {
    let run = 0;
    let before: number | undefined;
    for (const span of spans) {
      const edge = span.ends === 0 ? undefined : edgeOf(span);
      run = edge !== undefined && edge === before ? run + 1 : 1;
      before = edge;
      if (edge !== undefined) longest = Math.max(longest, run);
    }
  }
  return longest;
}
