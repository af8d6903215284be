/** Shapes stepped out in whole ends and rows. */
import type { ShapeMeasures } from '#core/craft/piece.ts';
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
  return measures.shape === 'circle' ? 2 * measures.radiusMm : measures.heightMm;
}

export function widthOfShape(measures: ShapeMeasures): number {
  return measures.shape === 'circle' ? 2 * measures.radiusMm : measures.baseMm;
}

export function rowsOfShape(measures: ShapeMeasures, pickSpacingMm: number): number {
  return roundHalfUp(heightOfShape(measures) / pickSpacingMm);
}

/** Width in ends, not yet whole, of row `row` (from 1) of `rows`. */
function idealWidth(measures: ShapeMeasures, grid: ShapeGrid, row: number, rows: number): number {
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

/** The ends of every row. The stepped area differs from the true one by at most half an end a row, one when symmetric. */
export function stepShape(measures: ShapeMeasures, grid: ShapeGrid): SteppedShape {
  const rows = rowsOfShape(measures, grid.pickSpacingMm);
  const widths = Array.from({ length: rows }, (_, index) => wholeWidth(idealWidth(measures, grid, index + 1, rows), grid));
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
  }
}

/** Angle from the vertical of an edge that steps `ends` every `picks`. */
export function slopeAngle(ends: number, picks: number, grid: Pick<ShapeGrid, 'spacingMm' | 'pickSpacingMm'>): number {
  return Math.atan2(ends * grid.spacingMm, picks * grid.pickSpacingMm);
}
