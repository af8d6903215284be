/** Shapes stepped out in whole ends and rows. */
import type { ShapeKind, ShapeMeasures } from '#core/craft/piece.ts';
import { areaOfPoints, boxOfPoints, runsOfPoints } from '#core/craft/points-shape.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';

export interface ShapeGrid {
  readonly spacingMm: number;
  readonly pickSpacingMm: number;
  /** Working ends of the whole cloth: a symmetric shape has its parity in every row. */
  readonly ends: number;
  /** Steps alike on both sides. */
  readonly symmetric: boolean;
}

export interface SteppedShape {
  readonly rows: number;
  /** Ends in each row, from the first. A row may have none. */
  readonly widths: readonly number[];
}

export function heightOfShape(measures: ShapeMeasures): number {
  if (measures.shape === 'points') return boxOfPoints(measures.points).heightMm;
  return measures.shape === 'circle' ? 2 * measures.radiusMm : measures.heightMm;
}

export function widthOfShape(measures: ShapeMeasures): number {
  if (measures.shape === 'points') return boxOfPoints(measures.points).widthMm;
  return measures.shape === 'circle' ? 2 * measures.radiusMm : measures.baseMm;
}

const WIDTH_KEY = { triangle: 'baseMm', rectangle: 'baseMm', circle: 'radiusMm', points: 'points' } as const;
const HEIGHT_KEY = { triangle: 'heightMm', rectangle: 'heightMm', circle: 'radiusMm', points: 'points' } as const;

/** The measure that says how wide a shape is, and the one that says how high. */
export const widthKeyOf = ({ shape }: ShapeMeasures): (typeof WIDTH_KEY)[ShapeKind] => WIDTH_KEY[shape];
export const heightKeyOf = ({ shape }: ShapeMeasures): (typeof HEIGHT_KEY)[ShapeKind] => HEIGHT_KEY[shape];

export function rowsOfShape(measures: ShapeMeasures, pickSpacingMm: number): number {
  return roundHalfUp(heightOfShape(measures) / pickSpacingMm);
}

type PlainMeasures = Exclude<ShapeMeasures, { readonly shape: 'points' }>;

/** Width in ends, not yet whole, of row `row` (from 1) of `rows`. */
function idealWidth(measures: PlainMeasures, grid: ShapeGrid, row: number, rows: number): number {
  switch (measures.shape) {
    case 'rectangle':
      return measures.baseMm / grid.spacingMm;
    case 'triangle':
      return (measures.baseMm / grid.spacingMm) * (1 - (row - 0.5) / rows);
    case 'circle': {
      const fromCentreMm = (row - 0.5) * grid.pickSpacingMm - measures.radiusMm;
      const halfMm = Math.sqrt(Math.max(0, measures.radiusMm ** 2 - fromCentreMm ** 2));
      return (2 * halfMm) / grid.spacingMm;
    }
  }
}

function wholeWidth(ideal: number, grid: ShapeGrid): number {
  if (!grid.symmetric) return Math.max(0, roundHalfUp(ideal));
  const odd = grid.ends % 2;
  return Math.max(0, 2 * roundHalfUp((ideal - odd) / 2) + odd);
}

/** The ends of every row; of points those of all its areas, the box's left edge in a gap. The stepped area differs from the true one by at most half an end a row, one when symmetric. */
export function stepShape(measures: ShapeMeasures, grid: ShapeGrid): SteppedShape {
  const rows = rowsOfShape(measures, grid.pickSpacingMm);
  if (measures.shape === 'points') {
    const areas = runsOfPoints(measures.points, { ...grid, rows, leftEnds: () => 0 });
    return { rows, widths: areas.map((runs) => runs.reduce((sum, { ends }) => sum + ends, 0)) };
  }
  const widths: number[] = [];
  for (let row = 1; row <= rows; row += 1) widths.push(wholeWidth(idealWidth(measures, grid, row, rows), grid));
  return { rows, widths };
}

export function trueArea(measures: ShapeMeasures): number {
  switch (measures.shape) {
    case 'rectangle':
      return measures.baseMm * measures.heightMm;
    case 'triangle':
      return (measures.baseMm * measures.heightMm) / 2;
    case 'circle':
      return Math.PI * measures.radiusMm ** 2;
    case 'points':
      return areaOfPoints(measures.points);
  }
}

/** Angle from the vertical of an edge that steps `ends` every `picks`. */
export function slopeAngle(ends: number, picks: number, grid: Pick<ShapeGrid, 'spacingMm' | 'pickSpacingMm'>): number {
  return Math.atan2(ends * grid.spacingMm, picks * grid.pickSpacingMm);
}
