/** Which colour lies where in the rows of a tabby band that has shapes in it. */
import type { ColourArea, Edge } from '#core/craft/colour-areas.ts';
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
  return rows.map((runs) => runs.map((run) => within(run, grid.ends)).filter(({ ends }) => ends > 0));
}

function within(run: EndRun, ends: number): EndRun {
  const start = Math.max(0, run.start);
  return { start, ends: Math.min(ends, run.start + run.ends) - start };
}

/** Ends of a row that one shape shows; `layer` counts the shapes from 1, and 0 is the ground. */
interface Run {
  readonly layer: number;
  ends: number;
}

/** The row as it is seen: a later shape lies over an earlier one. */
function runsOfRow(row: number, shapes: readonly PlacedShape[], ends: number): readonly Run[] {
  const layerAtEnd = new Array<number>(ends).fill(0);
  shapes.forEach(({ firstRow, rows }, index) => {
    for (const area of rows[row - firstRow] ?? []) layerAtEnd.fill(index + 1, area.start, area.start + area.ends);
  });
  const runs: Run[] = [];
  let run: Run | undefined;
  for (const layer of layerAtEnd) {
    if (run?.layer === layer) run.ends += 1;
    else runs.push((run = { layer, ends: 1 }));
  }
  return runs;
}

export interface YarnArea extends ColourArea {
  readonly yarn: string;
}

/** The colour areas of one row (from 0), left to right. */
export function areasOfRow(row: number, ground: string, shapes: readonly PlacedShape[], ends: number): readonly YarnArea[] {
  const runs = runsOfRow(row, shapes, ends);
  const shapeAt = (layer: number): PlacedShape | undefined => shapes[layer - 1];
  /** Neighbours meet as the upper one of them asks. */
  const edge = (run: Run, beside: Run | undefined): Edge =>
    beside === undefined ? 'selvedge' : shapeAt(Math.max(run.layer, beside.layer))?.join ?? 'slit';
  return runs.map((run, index) => ({
    yarn: shapeAt(run.layer)?.yarn ?? ground,
    ends: run.ends,
    left: edge(run, runs[index - 1]),
    right: edge(run, runs[index + 1]),
  }));
}

/** The most rows in which a slit beside the shape stays between the same two ends. A selvedge is no slit. */
export function longestSlitRows({ rows }: Pick<PlacedShape, 'rows'>, ends: number): number {
  let longest = 0;
  /** By the gap between two ends: the first and the last row so far of the slit that lies there. */
  const first: number[] = [];
  const last: number[] = [];
  const cut = (gap: number, row: number): void => {
    if (gap === 0 || gap === ends) return;
    if (last[gap] !== row - 1) first[gap] = row;
    last[gap] = row;
    longest = Math.max(longest, row - (first[gap] ?? row) + 1);
  };
  rows.forEach((areas, row) => {
    for (const area of areas) {
      cut(area.start, row);
      cut(area.start + area.ends, row);
    }
  });
  return longest;
}
