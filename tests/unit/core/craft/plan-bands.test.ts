import { describe, expect, test } from 'vitest';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import { pieceOf, pieceWith, planOf, PLAIN_PIECE, problemsOf, refusals } from './a-piece.ts';

const firstBand = (...bands: Band[]) => planOf(pieceOf(...bands)).bands[0];

const RYA = { technique: 'rya', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 150, trimMm: 10, rows: 2, heightMm: 12 } as const;
const SOUMAK = { technique: 'soumak', yarn: 'ground', over: 4, back: 2, rows: 4, tabbyBetween: 2, tabbyYarn: 'ground' } as const;

describe('techniques in a piece', () => {
  test('soumak rows are as high as the yarn lies, with tabby in the rooms between', () => {
    const plan = planOf(pieceOf(SOUMAK));
    expect(plan.bands[0]).toMatchObject({ picks: 6, stitches: 120 });
    expect(plan.bands[0]?.heightMm).toBeCloseTo(4 * 1.43 * 1.011937 + 6 * plan.weft.pickSpacingMm, 4);
  });

  test('soumak without tabby between has no picks, and its ground yarn may jam in peace', () => {
    const plan = planOf(pieceWith({ yarns: { ...PLAIN_PIECE.yarns, thick: { tex: 25_000 } }, bands: [{ ...SOUMAK, tabbyYarn: 'thick', tabbyBetween: 0 }, ...PLAIN_PIECE.bands] }));
    expect(plan.bands[0]).not.toHaveProperty('picks');
    expect(plan.bands[0]).toMatchObject({ stitches: 120 });
  });

  test('rya counts knots and strands of all rows and tells the cut length', () => {
    expect(firstBand(RYA)).toMatchObject({ knots: 62, strands: 186 });
    expect(firstBand(RYA)?.cutMm).toBeGreaterThan(320);
  });

  test('rya takes as much yarn as all its strands are long', () => {
    const band = firstBand(RYA);
    expect(band?.yarnMm['ground']).toBeCloseTo(186 * (band?.cutMm ?? Number.NaN), 6);
  });

  test('rya takes its own number of strands, however many the yarn is otherwise taken with', () => {
    const cutWith = (strands: number): number | undefined =>
      planOf(pieceWith({ yarns: { ...PLAIN_PIECE.yarns, fringe: { metresPer100g: 300, strands } }, bands: [{ ...RYA, yarn: 'fringe' }, ...PLAIN_PIECE.bands] })).bands[0]?.cutMm;
    expect(cutWith(4)).toBe(cutWith(1));
  });

  test('roving is laid in as many passes as asked, one when not said', () => {
    const laid = (passes?: number): number => {
      const band = { technique: 'roving', yarn: 'fluff', over: 4, bulgeMm: 12, heightMm: 40 } as const;
      const piece = pieceWith({ yarns: { ...PLAIN_PIECE.yarns, fluff: { tex: 25_000 } }, bands: [passes === undefined ? band : { ...band, passes }, ...PLAIN_PIECE.bands] });
      return planOf(piece).yarns['fluff']?.netMm ?? 0;
    };
    expect(laid()).toBeCloseTo(511.6479, 3);
    expect(laid(3)).toBeCloseTo(3 * laid(), 9);
  });

  test('loop pile draws a loop on every second end between the selvedges', () => {
    const plan = planOf(pieceOf({ technique: 'loop-pile', yarn: 'ground', rodMm: 8, rows: 5, heightMm: 20 }, { technique: 'loop-pile', yarn: 'ground', loopMm: 20, rows: 1, heightMm: 5 }));
    expect(plan.bands[0]).toMatchObject({ picks: 5, stitches: 150 });
    expect(plan.bands[1]?.yarnMm['ground']).toBeCloseTo(plan.weft.pickMm + 30 * 40, 9);
    expect(plan.bands[0]?.yarnMm['ground']).toBeCloseTo(5 * (plan.weft.pickMm + 30 * Math.PI * (8 + 1.43 * 1.011937)), 2);
  });

  test('twining takes two strands a row, a little more than the way there and back', () => {
    const plan = planOf(pieceOf({ technique: 'twining', yarn: 'ground', rows: 3 }));
    const row = (plan.bands[0]?.yarnMm['ground'] ?? 0) / 3 - 100;
    expect(row / plan.ends.woundWidthMm).toBeGreaterThan(2);
    expect(row / plan.ends.woundWidthMm).toBeLessThan(3);
    expect(plan.bands[0]).toMatchObject({ stitches: 186 });
  });

  test('hem-stitch counts a smaller last bundle', () => {
    expect(firstBand({ technique: 'hem-stitch', yarn: 'ground', bundleEnds: 4, reachPicks: 2 })).toMatchObject({ stitches: 16, heightMm: 0 });
  });

  test('strands taken together lie thicker, and take their number of times the yarn', () => {
    const one = planOf(PLAIN_PIECE);
    const two = planOf(pieceWith({ yarns: { ground: { metresPer100g: 360, strands: 2 } } }));
    expect(two.weft.pickMm).toBeCloseTo(one.weft.pickMm, 9);
    expect((two.yarns['ground']?.netMm ?? 0) / (one.yarns['ground']?.netMm ?? 1)).toBeCloseTo(2, 9);
    expect(two.yarns['ground']?.massG).toBeCloseTo(one.yarns['ground']?.massG ?? 0, 9);
    expect(two.yarns['ground']?.loads).toBe(one.yarns['ground']?.loads);
  });

  test('a piece without a single pick still tells how its yarn would lie', () => {
    const piece = pieceWith({ size: { widthMm: 300, heightMm: 24 }, bands: [{ ...RYA, rows: 2, heightMm: 24 }] });
    expect(planOf(piece).weft).toMatchObject({ rawPicks: 0 });
    expect(planOf(piece).weft.pickMm).toBeGreaterThan(300);
  });

  test('the weft told is that of the yarn most picks are woven with, the first of two alike', () => {
    const yarns = { ...PLAIN_PIECE.yarns, other: { metresPer100g: 250 } };
    const half = (yarn: string) => ({ technique: 'tabby', yarn, heightMm: 50 }) as const;
    const size = { widthMm: 300, heightMm: 100 };
    const thick = planOf(pieceWith({ yarns, size, beat: { picksPerCm: 6 }, bands: [half('ground'), half('other')] })).weft.diameterSumMm;
    const thin = planOf(pieceWith({ yarns, size, beat: { picksPerCm: 6 }, bands: [half('other'), half('ground')] })).weft.diameterSumMm;
    expect(thick).toBeGreaterThan(thin);
  });
});

describe('what a technique refuses', () => {
  const few = (band: Band): Partial<FrameLoomPiece> => ({ bands: [band, ...PLAIN_PIECE.bands] });

  test.each<[Band, string]>([
    [{ ...SOUMAK, over: 70, back: 2 }, 'E_FIT /bands/0/over'],
    [{ ...SOUMAK, back: 4 }, 'E_RANGE /bands/0/back'],
    [{ ...SOUMAK, rows: 0 }, 'E_RANGE /bands/0/rows'],
    [{ ...SOUMAK, tabbyBetween: -1 }, 'E_RANGE /bands/0/tabbyBetween'],
    [{ ...SOUMAK, tabbyYarn: 'nobody' }, 'E_ENUM /bands/0/tabbyYarn'],
    [{ ...RYA, legEnds: 32 }, 'E_FIT /bands/0/legEnds'],
    [{ ...RYA, strands: 1.5 }, 'E_COUNT /bands/0/strands'],
    [{ ...RYA, pileMm: 0 }, 'E_RANGE /bands/0/pileMm'],
    [{ ...RYA, trimMm: -1 }, 'E_RANGE /bands/0/trimMm'],
    [{ technique: 'roving', yarn: 'ground', over: 63, bulgeMm: 0, heightMm: 20 }, 'E_FIT /bands/0/over'],
    [{ technique: 'roving', yarn: 'ground', over: 4, bulgeMm: -1, heightMm: 20 }, 'E_RANGE /bands/0/bulgeMm'],
    [{ technique: 'roving', yarn: 'ground', over: 4, bulgeMm: 0, heightMm: 20, passes: 0 }, 'E_RANGE /bands/0/passes'],
    [{ technique: 'hem-stitch', yarn: 'ground', bundleEnds: 63, reachPicks: 2 }, 'E_FIT /bands/0/bundleEnds'],
    [{ technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 0 }, 'E_RANGE /bands/0/reachPicks'],
    [{ technique: 'twining', yarn: 'ground', rows: 0 }, 'E_RANGE /bands/0/rows'],
    [{ technique: 'loop-pile', yarn: 'ground', rodMm: 0, rows: 1, heightMm: 5 }, 'E_RANGE /bands/0/rodMm'],
    [{ technique: 'loop-pile', yarn: 'ground', loopMm: 0, rows: 1, heightMm: 5 }, 'E_RANGE /bands/0/loopMm'],
  ])('%j', (band, refusal) => {
    expect(refusals(pieceWith(few(band)))).toEqual([refusal]);
  });

  test.each([
    [{ technique: 'loop-pile', yarn: 'ground', rows: 1, heightMm: 5 }, 'E_NUM /bands/0/rodMm'],
    [{ technique: 'loop-pile', yarn: 'ground', rodMm: 8, loopMm: 8, rows: 1, heightMm: 5 }, 'E_ENUM /bands/0/loopMm'],
    [{ technique: 'tabby', yarn: 'ground' }, 'E_NUM /bands/0/heightMm'],
    [{ technique: 'tabby', yarn: 'ground', fill: false, heightMm: 3 }, 'E_ENUM /bands/0/fill'],
    [{ technique: 'tabby', yarn: '', heightMm: 3 }, 'E_ENUM /bands/0/yarn'],
    [{ technique: 'tabby', yarn: 7, heightMm: 3 }, 'E_ENUM /bands/0/yarn'],
    [{ technique: 'tabby', yarn: 'x'.repeat(41), heightMm: 3 }, 'E_RANGE /bands/0/yarn'],
    [{ technique: 'tabby', name: 'The Sky', yarn: 'ground', heightMm: 3 }, 'E_ENUM /bands/0/name'],
    [{ technique: 'tabby', name: 'sky', yarn: 'ground', heightMm: 3 }, 'E_ENUM /bands/1/name'],
    [{ technique: 'tabby', yarn: 'ground', heightMm: 3, over: 4 }, 'E_ENUM /bands/0/over'],
    [null, 'E_ENUM /bands/0'],
    ['tabby', 'E_ENUM /bands/0'],
  ])('%j', (band, refusal) => {
    expect(refusals({ ...PLAIN_PIECE, bands: [band, ...PLAIN_PIECE.bands] })).toEqual([refusal]);
  });

  test('a band that has a height cannot fill the rest as well', () => {
    expect(refusals({ ...PLAIN_PIECE, bands: [{ technique: 'tabby', yarn: 'ground', fill: true, heightMm: 3 }] })).toEqual(['E_ENUM /bands/0/heightMm']);
  });
});

describe('shapes in tabby', () => {
  const shaped = (...shapes: unknown[]): unknown => ({
    ...PLAIN_PIECE,
    yarns: { ...PLAIN_PIECE.yarns, red: { metresPer100g: 180 }, blue: { metresPer100g: 180 } },
    bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 100, shapes }, ...PLAIN_PIECE.bands],
  });
  const triangle = { shape: 'triangle', yarn: 'red', baseMm: 150, heightMm: 90, join: 'slit' } as const;
  const star = { shape: 'points', yarn: 'red', points: [{ xMm: 0, yMm: 0 }, { xMm: 80, yMm: 0 }, { xMm: 80, yMm: 60 }, { xMm: 40, yMm: 20 }, { xMm: 0, yMm: 60 }] } as const;
  const yarnOf = (piece: unknown, role: string): number => planOf(piece).bands[0]?.yarnMm[role] ?? 0;

  test.each([
    [{ ...triangle, baseMm: 320 }, 'E_FIT /bands/0/shapes/0/baseMm'],
    [{ ...triangle, centreMm: 20 }, 'E_FIT /bands/0/shapes/0/centreMm'],
    [{ ...triangle, leanMm: 200 }, 'E_FIT /bands/0/shapes/0/leanMm'],
    [{ ...triangle, heightMm: 101 }, 'E_FIT /bands/0/shapes/0/heightMm'],
    [{ ...triangle, bottomMm: 20 }, 'E_FIT /bands/0/shapes/0/bottomMm'],
    [{ shape: 'circle', yarn: 'red', radiusMm: 160 }, 'E_FIT /bands/0/shapes/0/radiusMm'],
    [{ shape: 'circle', yarn: 'red', radiusMm: 60 }, 'E_FIT /bands/0/shapes/0/radiusMm'],
    [{ shape: 'rectangle', yarn: 'red', baseMm: 100, heightMm: 50, leanMm: 150 }, 'E_FIT /bands/0/shapes/0/leanMm'],
    [{ ...triangle, yarn: 'green' }, 'E_ENUM /bands/0/shapes/0/yarn'],
    [{ ...triangle, symmetric: 'yes' }, 'E_ENUM /bands/0/shapes/0/symmetric'],
    [{ ...triangle, join: 'glue' }, 'E_ENUM /bands/0/shapes/0/join'],
    [{ ...triangle, radiusMm: 3 }, 'E_ENUM /bands/0/shapes/0/radiusMm'],
    [{ ...star, points: [{ xMm: 0, yMm: 0 }, { xMm: 400, yMm: 0 }, { xMm: 0, yMm: 50 }] }, 'E_FIT /bands/0/shapes/0/points'],
    [{ ...star, points: [{ xMm: 0, yMm: 0 }, { xMm: 40, yMm: 0 }, { xMm: 0, yMm: 150 }] }, 'E_FIT /bands/0/shapes/0/points'],
    [{ ...star, points: [{ xMm: 0, yMm: 0 }, { xMm: 40, yMm: 20 }] }, 'E_RANGE /bands/0/shapes/0/points'],
    [{ ...star, points: [{ xMm: 0, yMm: 0 }, { xMm: 40, yMm: 20 }, { xMm: 60, yMm: 30 }] }, 'E_RANGE /bands/0/shapes/0/points'],
    [{ ...star, points: [] }, 'E_ENUM /bands/0/shapes/0/points'],
    [{ ...star, points: [{ xMm: 0, yMm: 0 }, { xMm: '40', yMm: 0 }, { xMm: 0, yMm: 50 }] }, 'E_NUM /bands/0/shapes/0/points/1/xMm'],
    [{ ...star, centreMm: 20 }, 'E_FIT /bands/0/shapes/0/centreMm'],
    [{ ...star, leanMm: 200 }, 'E_FIT /bands/0/shapes/0/leanMm'],
    [{ ...star, symmetric: true }, 'E_ENUM /bands/0/shapes/0/symmetric'],
    [{ ...star, baseMm: 5 }, 'E_ENUM /bands/0/shapes/0/baseMm'],
    [{ shape: 'star', yarn: 'red' }, 'E_ENUM /bands/0/shapes/0/shape'],
    [{ shape: 'circle', yarn: 'red' }, 'E_NUM /bands/0/shapes/0/radiusMm'],
  ])('%j is refused', (shape, refusal) => {
    expect(refusals(shaped(shape))).toEqual([refusal]);
  });

  test('drawn by points in the outline of a rectangle they take the very yarn of a rectangle', () => {
    const rectangle = shaped({ shape: 'rectangle', yarn: 'red', baseMm: 100, heightMm: 60, symmetric: false, centreMm: 150 });
    const points = shaped({ shape: 'points', yarn: 'red', points: [{ xMm: 7, yMm: -5 }, { xMm: 107, yMm: -5 }, { xMm: 107, yMm: 55 }, { xMm: 7, yMm: 55 }], centreMm: 150 });
    for (const role of ['ground', 'red']) expect(yarnOf(points, role)).toBeCloseTo(yarnOf(rectangle, role), 6);
  });

  test('with two horns they turn four times in a row where the horns stand, so a row of horns takes more than its ends', () => {
    const horns = planOf(shaped(star)).bands[0];
    expect(horns?.yarnMm['red']).toBeGreaterThan(0);
    expect((horns?.yarnMm['red'] ?? 0) + (horns?.yarnMm['ground'] ?? 0)).toBeGreaterThan(yarnOf(shaped(), 'ground') * 0.97);
  });

  test('too many of them are refused, none is as good as an empty list', () => {
    expect(refusals(shaped(...Array.from({ length: 25 }, () => triangle)))).toEqual(['E_RANGE /bands/0/shapes']);
    expect(refusals(shaped())).toEqual([]);
    expect(problemsOf({ ...PLAIN_PIECE, bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 400, shapes: 3 }] })).toHaveLength(1);
  });

  test('dovetailed and interlocked colours take more yarn than slits, ground and shape alike', () => {
    const [slit, dovetail, interlock] = (['slit', 'dovetail', 'interlock'] as const).map((join) => shaped({ ...triangle, join }));
    for (const role of ['ground', 'red']) {
      expect(yarnOf(dovetail, role)).toBeGreaterThan(yarnOf(slit, role));
      expect(yarnOf(interlock, role)).toBeGreaterThan(yarnOf(slit, role));
    }
  });

  test('a shape at the selvedge leaves the ground one area instead of two', () => {
    const inside = shaped({ ...triangle, baseMm: 100 });
    const atEdge = shaped({ ...triangle, baseMm: 100, centreMm: 50, leanMm: -50 });
    expect(planOf(atEdge).hours.likely).toBeLessThan(planOf(inside).hours.likely);
  });

  test('a later shape lies over an earlier one and takes its yarn', () => {
    const under = { shape: 'rectangle', yarn: 'red', baseMm: 200, heightMm: 50 };
    const over = { shape: 'rectangle', yarn: 'blue', baseMm: 100, heightMm: 50 };
    const alone = yarnOf(shaped(under), 'red');
    expect(yarnOf(shaped(under, over), 'red')).toBeLessThan(0.6 * alone);
    expect(yarnOf(shaped(over, under), 'blue')).toBe(0);
  });

  test('shapes side by side meet as the later of them asks', () => {
    const left = { shape: 'rectangle', yarn: 'red', baseMm: 155, heightMm: 50, centreMm: 75, symmetric: false, join: 'slit' };
    const right = { shape: 'rectangle', yarn: 'blue', baseMm: 155, heightMm: 50, centreMm: 225, symmetric: false };
    expect(yarnOf(shaped(left, { ...right, join: 'dovetail' }), 'red')).toBeGreaterThan(yarnOf(shaped(left, { ...right, join: 'slit' }), 'red'));
  });

  test('a leaning triangle has its top where it leans, and about the same yarn', () => {
    const upright = yarnOf(shaped({ ...triangle, symmetric: false }), 'red');
    const leaning = yarnOf(shaped({ ...triangle, leanMm: 60 }), 'red');
    expect(Math.abs(leaning / upright - 1)).toBeLessThan(0.02);
  });
});
