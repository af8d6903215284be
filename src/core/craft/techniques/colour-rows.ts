/** Which colour lies where in the rows of a tabby band that has shapes in it. */
import type { ColourArea } from '#core/craft/colour-areas.ts';
import type { Shape, ShapeJoin } from '#core/craft/piece.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';
import { runsOfPoints, type EndRun } from '#core/craft/points-shape.ts';
import { rowsOfShape, stepShape, widthOfShape } from '#core/craft/shapes.ts';

export interface BandGrid {
  readonly rows: number;
  /** Working ends. */
  readonly ends: number;
  readonly spacingMm: number;
  readonly pickSpacingMm: number;
  /** Finished width of the cloth, over which a shape's place is measured. */
  readonly widthMm: number;
}

/** A shape stepped out and set in its place, in the band's own rows. */
export interface PlacedShape {
  readonly yarn: string;
  readonly join: ShapeJoin;
  readonly firstRow: number;
  /** Its areas in each row, left to right. A row may have none, and one drawn by points several. */
  readonly rows: readonly (readonly EndRun[])[];
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
  const all = shape.shape === 'points' ? pointRows(shape, grid) : evenRows(shape, grid);
  return { yarn: shape.yarn, join: shape.join ?? 'slit', firstRow, rows: all.slice(0, Math.max(0, grid.rows - firstRow)) };
}

const leanInEnds = (shape: Shape, grid: BandGrid): number => (shape.leanMm ?? 0) / grid.spacingMm;

/** One area a row, about a middle that moves as the shape leans. */
function evenRows(shape: Shape, grid: BandGrid): EndRun[][] {
  const { widths } = stepShape(shape, { ...grid, symmetric: isSymmetric(shape) });
  const centre = centreInEnds(shape, grid);
  return widths.map((width, index) => {
    const ends = Math.min(width, grid.ends);
    const middle = centre + (leanInEnds(shape, grid) * (index + 0.5)) / widths.length;
    return ends === 0 ? [] : [{ start: Math.min(grid.ends - ends, Math.max(0, roundHalfUp(middle - ends / 2))), ends }];
  });
}

/** The points' box about the shape's middle; what half an end of rounding puts over a selvedge is cut off there. */
function pointRows(shape: Shape & { readonly shape: 'points' }, grid: BandGrid): EndRun[][] {
  const left = centreInEnds(shape, grid) - widthOfShape(shape) / grid.spacingMm / 2;
  const lean = leanInEnds(shape, grid);
  const rows = runsOfPoints(shape.points, { ...grid, rows: rowsOfShape(shape, grid.pickSpacingMm), leftEnds: (share) => left + lean * share });
  return rows.map((runs) =>
    runs.flatMap(({ start, ends }) => {
      const [from, to] = [Math.max(0, start), Math.min(grid.ends, start + ends)];
      return to > from ? [{ start: from, ends: to - from }] : [];
    }),
  );
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
  const stretches = shapes.reduce<readonly Stretch[]>(
    (laid, { yarn, join, firstRow, rows }, index) =>
      (rows[row - firstRow] ?? []).reduce<readonly Stretch[]>((under, { start, ends: wide }) => layOver(under, { start, end: start + wide, yarn, layer: index + 1, join }), laid),
    [bare],
  );
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

/** The most rows in which a slit beside the shape stays between the same two ends. A selvedge is no slit. */
export function longestSlitRows({ rows }: Pick<PlacedShape, 'rows'>, ends: number): number {
  let longest = 0;
  let before: ReadonlyMap<number, number> = new Map();
  for (const runs of rows) {
    const gaps = runs.flatMap(({ start, ends: wide }) => [start, start + wide]).filter((gap) => gap > 0 && gap < ends);
    const now = new Map(gaps.map((gap) => [gap, (before.get(gap) ?? 0) + 1]));
    longest = Math.max(longest, ...now.values());
    before = now;
  }
  return longest;
}
