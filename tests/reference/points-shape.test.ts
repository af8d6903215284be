/** Shapes drawn by points, against the shoelace formula and against counting ends one by one. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { ShapePoint } from '#core/craft/piece.ts';
import { areaOfPoints, boxOfPoints, climbOfPoints, runsOfPoints } from '#core/craft/points-shape.ts';
import { rowsOfShape, stepShape } from '#core/craft/shapes.ts';
import { placeShape } from '#core/craft/techniques/colour-rows.ts';
import { cases } from '../support/random-cases.ts';
import { expectClose } from './close.ts';

/** Area of a line that does not cross itself, from its corners (Meister 1769; schoolbook). */
function shoelace(points: readonly ShapePoint[]): number {
  return Math.abs(points.reduce((sum, a, index) => {
    const b = points[(index + 1) % points.length] ?? a;
    return sum + a.xMm * b.yMm - b.xMm * a.yMm;
  }, 0)) / 2;
}

/** Whether a place lies inside, by a ray to the right: odd crossings (Shimrat 1962, Comm. ACM 5, algorithm 112). */
function isInside(points: readonly ShapePoint[], x: number, y: number): boolean {
  let inside = false;
  points.forEach((a, index) => {
    const b = points[(index + points.length - 1) % points.length] ?? a;
    if (a.yMm > y !== b.yMm > y && x < ((b.xMm - a.xMm) * (y - a.yMm)) / (b.yMm - a.yMm) + a.xMm) inside = !inside;
  });
  return inside;
}

/** A star about its middle: corners in order of their angle never make sides cross. */
const stars = fc
  .array(fc.tuple(fc.double({ min: 0.2, max: 1, noNaN: true }), fc.double({ min: 0.3, max: 1, noNaN: true })), { minLength: 3, maxLength: 14 })
  .map((corners) => {
    const total = corners.reduce((sum, [step]) => sum + step, 0);
    let turned = 0;
    return corners.map(([step, reach]): ShapePoint => {
      turned += (step / total) * 2 * Math.PI;
      return { xMm: 120 * reach * Math.cos(turned), yMm: 90 * reach * Math.sin(turned) };
    });
  })
  .filter((points) => boxOfPoints(points).heightMm > 20 && boxOfPoints(points).widthMm > 20);

const crossed = fc.array(fc.record({ xMm: fc.double({ min: -80, max: 80, noNaN: true }), yMm: fc.double({ min: -60, max: 60, noNaN: true }) }), { minLength: 3, maxLength: 8 })
  .filter((points) => boxOfPoints(points).heightMm > 20 && boxOfPoints(points).widthMm > 20);

const grid = fc.record({ spacingMm: fc.double({ min: 2, max: 9, noNaN: true }), pickSpacingMm: fc.double({ min: 0.8, max: 4, noNaN: true }) });

describe('the true area of a shape drawn by points', () => {
  test('is the shoelace’s where no side crosses another', () => {
    fc.assert(fc.property(stars, (points) => {
      const area = shoelace(points);
      return Math.abs(areaOfPoints(points) - area) <= 1e-9 * area + 1e-9;
    }), { numRuns: cases(500) });
  });

  test('counts a bow tie’s two wings, whose signed areas cancel in the shoelace', () => {
    const tie = [{ xMm: 0, yMm: 0 }, { xMm: 100, yMm: 60 }, { xMm: 100, yMm: 0 }, { xMm: 0, yMm: 60 }];
    expect(shoelace(tie)).toBe(0);
    expectClose(areaOfPoints(tie), 2 * (60 * 50) / 2, 1e-12);
  });

  test('leaves the middle of a five-pointed star out, as even-odd does (hand count: outline less pentagon)', () => {
    const corner = (k: number): ShapePoint => ({ xMm: Math.sin((4 * Math.PI * k) / 5), yMm: Math.cos((4 * Math.PI * k) / 5) });
    const star = [0, 1, 2, 3, 4].map(corner);
    const inner = Math.cos((2 * Math.PI) / 5) / Math.cos(Math.PI / 5);
    const outline = 5 * inner * Math.sin(Math.PI / 5);
    const pentagon = (5 / 2) * inner * inner * Math.sin((2 * Math.PI) / 5);
    expectClose(areaOfPoints(star), outline - pentagon, 1e-9);
  });
});

describe('the ends of a shape drawn by points', () => {
  test('are those whose middle lies inside, counted one by one, crossing sides or not', () => {
    fc.assert(fc.property(fc.oneof(stars, crossed), grid, (points, { spacingMm, pickSpacingMm }) => {
      const box = boxOfPoints(points);
      const rows = rowsOfShape({ shape: 'points', points }, pickSpacingMm);
      const runs = runsOfPoints(points, { rows, spacingMm, pickSpacingMm, leftEnds: () => 0 });
      for (let row = 0; row < rows; row += 1) {
        const y = box.bottomMm + (row + 0.5) * pickSpacingMm;
        const own = runs[row] ?? [];
        for (let end = 0; end <= box.widthMm / spacingMm; end += 1) {
          const woven = own.some(({ start, ends }) => end >= start && end < start + ends);
          expect(woven, `row ${String(row)} end ${String(end)}`).toBe(isInside(points, box.leftMm + (end + 0.5) * spacingMm, y));
        }
      }
    }), { numRuns: cases(150) });
  });

  test('come to the true area within half an end for every edge they meet', () => {
    fc.assert(fc.property(stars, grid, (points, { spacingMm, pickSpacingMm }) => {
      const rows = rowsOfShape({ shape: 'points', points }, pickSpacingMm);
      const runs = runsOfPoints(points, { rows, spacingMm, pickSpacingMm, leftEnds: () => 0 });
      const stepped = runs.flat().reduce((sum, { ends }) => sum + ends, 0) * spacingMm * pickSpacingMm;
      const edges = points.length * rows;
      return Math.abs(stepped - shoelace(points)) <= edges * 0.5 * spacingMm * pickSpacingMm + boxOfPoints(points).widthMm * pickSpacingMm * 2;
    }), { numRuns: cases(300) });
  });

  test('a finer and finer grid comes to the true area (0.2 % at 0.5 by 0.25 mm)', () => {
    const kite = [{ xMm: 0, yMm: 40 }, { xMm: 60, yMm: 0 }, { xMm: 130, yMm: 40 }, { xMm: 60, yMm: 110 }];
    const fine = stepShape({ shape: 'points', points: kite }, { spacingMm: 0.5, pickSpacingMm: 0.25, ends: 400, symmetric: false });
    expectClose(fine.widths.reduce((sum, width) => sum + width, 0) * 0.5 * 0.25, shoelace(kite), 2e-3);
  });

  test('two shapes that share a side share out every end between them', () => {
    fc.assert(fc.property(grid, fc.double({ min: 5, max: 95, noNaN: true }), fc.double({ min: 5, max: 95, noNaN: true }), (on, foot, head) => {
      const left = [{ xMm: 0, yMm: 0 }, { xMm: foot, yMm: 0 }, { xMm: head, yMm: 80 }, { xMm: 0, yMm: 80 }];
      const right = [{ xMm: foot, yMm: 0 }, { xMm: 100, yMm: 0 }, { xMm: 100, yMm: 80 }, { xMm: head, yMm: 80 }];
      const rows = rowsOfShape({ shape: 'points', points: left }, on.pickSpacingMm);
      const of = (points: readonly ShapePoint[]) => runsOfPoints(points, { ...on, rows, leftEnds: () => boxOfPoints(points).leftMm / on.spacingMm });
      const [a, b] = [of(left), of(right)];
      const whole = Math.floor(100 / on.spacingMm + 0.5 + 1e-9);
      for (let row = 0; row < rows; row += 1) {
        expect([...(a[row] ?? []), ...(b[row] ?? [])].reduce((sum, { ends }) => sum + ends, 0)).toBe(whole);
        const seam = a[row]?.at(-1);
        const from = b[row]?.[0];
        if (seam !== undefined && from !== undefined) expect(seam.start + seam.ends).toBe(from.start);
      }
    }), { numRuns: cases(200) });
  });

  test('an edge just half-way between two ends goes up, whatever the last bit of the division says', () => {
    const square = [{ xMm: 0, yMm: 0 }, { xMm: 0.3, yMm: 0 }, { xMm: 0.3, yMm: 2 }, { xMm: 0, yMm: 2 }];
    for (const k of [1, 2, 3, 5, 7, 11]) {
      const wide = square.map(({ xMm, yMm }) => ({ xMm: xMm === 0 ? 0 : (k + 0.5) * 0.1 * 3, yMm }));
      expect(runsOfPoints(wide, { rows: 1, spacingMm: 0.1 * 3, pickSpacingMm: 2, leftEnds: () => 0 })).toEqual([[{ start: 0, ends: k + 1 }]]);
    }
  });

  test('a valley between two horns leaves two areas in a row, set about the middle of the cloth', () => {
    const horns = [{ xMm: 0, yMm: 0 }, { xMm: 100, yMm: 0 }, { xMm: 100, yMm: 60 }, { xMm: 50, yMm: 20 }, { xMm: 0, yMm: 60 }];
    const { rows } = placeShape({ shape: 'points', yarn: 'red', points: horns }, { rows: 50, ends: 60, spacingMm: 5, pickSpacingMm: 2, widthMm: 300 });
    expect(rows).toHaveLength(30);
    expect(rows[0]).toEqual([{ start: 20, ends: 20 }]);
    expect(rows[20]).toEqual([{ start: 20, ends: 5 }, { start: 35, ends: 5 }]);
  });
});

describe('a shape drawn by points, beside plain ones', () => {
  const on = { rows: 40, ends: 60, spacingMm: 5, pickSpacingMm: 2, widthMm: 300 };
  const drawn = (points: readonly (readonly [number, number])[]): readonly ShapePoint[] => points.map(([xMm, yMm]) => ({ xMm, yMm }));

  test('leans as a rectangle of the same size does (the same cloth described twice)', () => {
    const points = drawn([[0, 0], [52, 0], [52, 80], [0, 80]]);
    const twice = [{ shape: 'points', points } as const, { shape: 'rectangle', baseMm: 52, heightMm: 80, symmetric: false } as const];
    const [byPoints, plain] = twice.map((shape) => placeShape({ ...shape, yarn: 'red', centreMm: 100, leanMm: 70 }, on).rows.map(([run]) => run?.start));
    expect(byPoints).toHaveLength(40);
    byPoints?.forEach((start, row) => { expect(Math.abs((start ?? Number.NaN) - (plain?.[row] ?? Number.NaN))).toBeLessThanOrEqual(1); });
    expect(byPoints?.at(-1)).toBeGreaterThan((byPoints?.[0] ?? 0) + 12);
  });

  test('has no area in a row where it is thinner than half an end (counted by hand)', () => {
    const sliver = drawn([[0, 0], [30, 0], [30, 2], [11, 2], [11, 4], [10, 4], [10, 2], [0, 2]]);
    expect(runsOfPoints(sliver, { ...on, rows: 2, leftEnds: () => 0 })).toEqual([[{ start: 0, ends: 6 }], []]);
  });

  test('is one area where a notch is thinner than an end, two where it is wider (counted by hand)', () => {
    const notched = (width: number): unknown => runsOfPoints(drawn([[0, 0], [50, 0], [50, 2], [20 + width, 2], [20 + width, 0.5], [20, 0.5], [20, 2], [0, 2]]), { ...on, rows: 1, leftEnds: () => 0 });
    expect(notched(1)).toEqual([[{ start: 0, ends: 10 }]]);
    expect(notched(10)).toEqual([[{ start: 0, ends: 4 }, { start: 6, ends: 4 }]]);
  });

  test('climbs as high as it is where every level meets it twice, and twice as high with two peaks (added by hand)', () => {
    expect(climbOfPoints(drawn([[0, 0], [40, 0], [20, 30]]))).toBe(30);
    expect(climbOfPoints(drawn([[0, 5], [20, 35], [40, 5], [60, 35], [80, 5]]))).toBe(60);
  });
});
