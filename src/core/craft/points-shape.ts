/**
 * A shape drawn by points: where its rows cross it.
 *
 * The rule. Row j (from 0) is held against the level (j + ½)·pick above the lowest point: the middle of the row. What lies
 * inside on that level, by the even-odd rule, is its areas; there may be several. Their edges go to the nearest gap between
 * two ends, half up, so an end belongs to the shape when its middle lies in it. Corners need not go one way about, sides
 * may cross, and two shapes that share a side share out the ends between them: none twice, none left out.
 */
import type { ShapePoint } from '#core/craft/piece.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';

/** The smallest box round the points, mm. */
export interface PointsBox {
  readonly leftMm: number;
  readonly bottomMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
}

export function boxOfPoints(points: readonly ShapePoint[]): PointsBox {
  const xs = points.map(({ xMm }) => xMm);
  const ys = points.map(({ yMm }) => yMm);
  const leftMm = Math.min(...xs);
  const bottomMm = Math.min(...ys);
  return { leftMm, bottomMm, widthMm: Math.max(...xs) - leftMm, heightMm: Math.max(...ys) - bottomMm };
}

type Side = readonly [ShapePoint, ShapePoint];

const upwards = ([a, b]: Side): Side => (a.yMm <= b.yMm ? [a, b] : [b, a]);

/** Where the side from `low` to `high` meets a level between them. */
function crossingAt(low: ShapePoint, high: ShapePoint, yMm: number): number {
  return low.xMm + ((yMm - low.yMm) / (high.yMm - low.yMm)) * (high.xMm - low.xMm);
}

/** Sides from corner to corner, the last one back to the first. */
function sidesOf(points: readonly ShapePoint[]): Side[] {
  return points.flatMap((from, index) => {
    const to = points[(index + 1) % points.length];
    return to === undefined ? [] : [[from, to] as const];
  });
}

/**
 * Where the level `yMm` runs into the shape and out of it again, from the left: in, out, in, out. A side counts from its
 * lower corner up to, not including, its upper one, so that a corner is never met twice.
 */
export function crossingsAt(points: readonly ShapePoint[], yMm: number): number[] {
  const found = sidesOf(points).flatMap((side) => {
    const [low, high] = upwards(side);
    return yMm < low.yMm || yMm >= high.yMm ? [] : [crossingAt(low, high, yMm)];
  });
  return found.sort((a, b) => a - b);
}

/** A run of ends, from the left selvedge. */
export interface EndRun {
  readonly start: number;
  readonly ends: number;
}

export interface PointsGrid {
  readonly rows: number;
  readonly spacingMm: number;
  readonly pickSpacingMm: number;
  /** Where the left edge of the points' box stands at a share (0 at its foot, 1 at its head) of the shape's height, in ends. */
  readonly leftEnds: (share: number) => number;
}

/** The areas of every row, left to right; a row may have none. Areas that touch are one. */
export function runsOfPoints(points: readonly ShapePoint[], grid: PointsGrid): EndRun[][] {
  const box = boxOfPoints(points);
  /** The first row whose level is not below this height. */
  const rowFrom = (yMm: number): number => Math.max(0, Math.ceil((yMm - box.bottomMm) / grid.pickSpacingMm - 0.5));
  const crossed = Array.from({ length: grid.rows }, (): number[] => []);
  for (const side of sidesOf(points)) {
    const [low, high] = upwards(side);
    const end = Math.min(grid.rows, rowFrom(high.yMm));
    for (let row = rowFrom(low.yMm); row < end; row += 1) {
      const level = (row + 0.5) * grid.pickSpacingMm;
      crossed[row]?.push(grid.leftEnds(level / box.heightMm) + (crossingAt(low, high, box.bottomMm + level) - box.leftMm) / grid.spacingMm);
    }
  }
  return crossed.map((ends) => joinRuns(ends.sort((a, b) => a - b).map(roundHalfUp)));
}

/** How far its sides go up and down in all, over two: the height of a shape that every level meets twice, more of a jagged one. */
export function climbOfPoints(points: readonly ShapePoint[]): number {
  return sidesOf(points).reduce((sum, [a, b]) => sum + Math.abs(b.yMm - a.yMm), 0) / 2;
}

function joinRuns(edges: readonly number[]): EndRun[] {
  const runs: EndRun[] = [];
  for (let i = 0; i + 1 < edges.length; i += 2) {
    const start = edges[i] ?? 0;
    const ends = (edges[i + 1] ?? start) - start;
    if (ends <= 0) continue;
    const before = runs.at(-1);
    if (before !== undefined && before.start + before.ends === start) runs[runs.length - 1] = { start: before.start, ends: before.ends + ends };
    else runs.push({ start, ends });
  }
  return runs;
}

/** Between two levels at which sides begin, end or cross: there, widths change evenly. */
interface Strip {
  /** Inside the shape at half height, by the even-odd rule. */
  readonly insideMm: number;
  readonly heightMm: number;
}

export function stripsOfPoints(points: readonly ShapePoint[]): readonly Strip[] {
  const levels = [...new Set([...points.map(({ yMm }) => yMm), ...crossingLevels(points)])].sort((a, b) => a - b);
  return levels.flatMap((level, index) => {
    const next = levels[index + 1];
    if (next === undefined) return [];
    const edges = crossingsAt(points, (level + next) / 2);
    return [{ insideMm: edges.reduce((sum, x, at) => sum + (at % 2 === 0 ? -x : x), 0), heightMm: next - level }];
  });
}

/** True area by the even-odd rule, mm². */
export function areaOfPoints(points: readonly ShapePoint[]): number {
  return stripsOfPoints(points).reduce((area, { insideMm, heightMm }) => area + insideMm * heightMm, 0);
}

/** Levels at which two sides cross each other. */
function crossingLevels(points: readonly ShapePoint[]): number[] {
  const sides = sidesOf(points);
  return sides.flatMap(([a, b], index) =>
    sides.slice(index + 1).flatMap(([c, d]) => {
      const [ux, uy, vx, vy] = [b.xMm - a.xMm, b.yMm - a.yMm, d.xMm - c.xMm, d.yMm - c.yMm];
      const turn = ux * vy - uy * vx;
      if (turn === 0) return [];
      const along = ((c.xMm - a.xMm) * vy - (c.yMm - a.yMm) * vx) / turn;
      const across = ((c.xMm - a.xMm) * uy - (c.yMm - a.yMm) * ux) / turn;
      return along > 0 && along < 1 && across > 0 && across < 1 ? [a.yMm + along * uy] : [];
    }),
  );
}
