/**
 * Which ends a shape takes in which pick, by stepping: the width of each row is rounded to whole ends.
 *
 * Widths follow the same rule as the yarn does: triangle x_j = (B/p)(1 - (j - 1/2)/N), rectangle constant, circle
 * x_j = (2/p) sqrt(R^2 - y_j^2); symmetric widths keep the parity of the working ends.
 */
import type { Shape } from '../piece.ts';
import type { EndSpan } from './cloth-piece.ts';

interface Grid {
  readonly spacingMm: number;
  readonly pickSpacingMm: number;
  readonly ends: number;
  /** Picks of the band. */
  readonly picks: number;
}

/** Spans in the order they are woven, cut at the selvedges and at the band's last pick. */
export function shapeSpans(shape: Shape, grid: Grid): EndSpan[] {
  const heightMm = shape.shape === 'circle' ? 2 * (shape.radiusMm ?? 0) : (shape.heightMm ?? 0);
  const rows = roundHalfUp(heightMm / grid.pickSpacingMm);
  const first = roundHalfUp((shape.bottomMm ?? 0) / grid.pickSpacingMm);
  const symmetric = shape.symmetric ?? (shape.leanMm ?? 0) === 0;
  const spans: EndSpan[] = [];
  for (let row = 0; row < rows && first + row < grid.picks; row++) {
    const up = (row + 0.5) / rows;
    const width = wholeEnds(widthMm(shape, up, heightMm) / grid.spacingMm, symmetric, grid.ends % 2);
    const span = place(width, middle(shape, up, grid), grid.ends);
    if (span !== undefined) spans.push({ row: first + row, ...span });
  }
  return spans;
}

/** @param up how far up the shape, 0..1, the middle of the row lies */
function widthMm(shape: Shape, up: number, heightMm: number): number {
  if (shape.shape === 'rectangle') return shape.baseMm ?? 0;
  if (shape.shape === 'triangle') return (shape.baseMm ?? 0) * (1 - up);
  const radius = shape.radiusMm ?? 0;
  const y = up * heightMm - radius;
  return 2 * Math.sqrt(Math.max(0, radius * radius - y * y));
}

function wholeEnds(ends: number, symmetric: boolean, parity: number): number {
  if (!symmetric) return roundHalfUp(ends);
  return Math.max(0, 2 * roundHalfUp((ends - parity) / 2) + parity);
}

/** Middle of the row in ends from the left selvedge. */
function middle(shape: Shape, up: number, grid: Grid): number {
  const base = shape.centreMm === undefined ? grid.ends / 2 : shape.centreMm / grid.spacingMm;
  return base + ((shape.leanMm ?? 0) / grid.spacingMm) * up;
}

function place(width: number, middleEnd: number, ends: number): { from: number; to: number } | undefined {
  const start = roundHalfUp(middleEnd - width / 2);
  const from = Math.max(0, start);
  const to = Math.min(ends, start + width);
  return to > from ? { from, to } : undefined;
}

/** The guard lets exact ties of binary fractions round the same way everywhere. */
function roundHalfUp(value: number): number {
  return Math.floor(value + 0.5 + 1e-9);
}
