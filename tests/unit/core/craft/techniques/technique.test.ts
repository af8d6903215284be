import { describe, expect, test } from 'vitest';
import { areasOfRow, isSymmetric, longestSlitRows, placeShape, type BandGrid } from '#core/craft/techniques/colour-rows.ts';
import { TECHNIQUE_NAMES, TECHNIQUES } from '#core/craft/techniques/registry.ts';
import { picksOn, threadOn, type DressedLoom } from '#core/craft/techniques/technique.ts';

const BARE_LOOM: DressedLoom = {
  workingEnds: 60,
  spacingMm: 5,
  warpDiameterMm: 0.8,
  widthMm: 300,
  beat: { picksPerCm: 6 },
  tailMm: 50,
  threads: new Map(),
  picks: new Map(),
};

test('every technique is in the list it is chosen from', () => {
  expect([...TECHNIQUE_NAMES].sort()).toEqual(Object.keys(TECHNIQUES).sort());
});

test('weaving with a yarn that was never laid is a programmer’s mistake', () => {
  expect(() => threadOn(BARE_LOOM, 'sky')).toThrow('no yarn in the role sky');
  expect(() => picksOn(BARE_LOOM, { role: 'sky' })).toThrow('no picks of the yarn sky');
});

describe('colours in a row', () => {
  const grid: BandGrid = { rows: 20, ends: 60, spacingMm: 5, pickSpacingMm: 2, widthMm: 300 };
  const block = (centreMm: number, baseMm: number) => placeShape({ shape: 'rectangle', yarn: 'red', baseMm, heightMm: 20, centreMm, bottomMm: 10, join: 'interlock' }, grid);

  test('are the ground from edge to edge where no shape stands', () => {
    expect(areasOfRow(0, 'sky', [block(150, 100)], 60)).toEqual([{ yarn: 'sky', ends: 60, left: 'selvedge', right: 'selvedge' }]);
    expect(areasOfRow(15, 'sky', [block(150, 100)], 60)).toHaveLength(1);
  });

  test('are ground, shape, ground where one stands, joined as it asks', () => {
    expect(areasOfRow(5, 'sky', [block(150, 100)], 60)).toEqual([
      { yarn: 'sky', ends: 20, left: 'selvedge', right: 'interlock' },
      { yarn: 'red', ends: 20, left: 'interlock', right: 'interlock' },
      { yarn: 'sky', ends: 20, left: 'interlock', right: 'selvedge' },
    ]);
  });

  test('are two where it touches a selvedge, one where it is as wide as the cloth', () => {
    expect(areasOfRow(5, 'sky', [block(50, 100)], 60).map(({ yarn }) => yarn)).toEqual(['red', 'sky']);
    expect(areasOfRow(5, 'sky', [block(150, 300)], 60)).toEqual([{ yarn: 'red', ends: 60, left: 'selvedge', right: 'selvedge' }]);
  });

  test('always come to the whole width', () => {
    const shapes = [block(60, 90), placeShape({ shape: 'circle', yarn: 'blue', radiusMm: 20, centreMm: 90 }, grid), placeShape({ shape: 'triangle', yarn: 'green', baseMm: 200, heightMm: 40, leanMm: 80 }, grid)];
    for (let row = 0; row < grid.rows; row += 1) {
      expect(areasOfRow(row, 'sky', shapes, 60).reduce((sum, { ends }) => sum + ends, 0)).toBe(60);
    }
  });

  test('leave a slit as tall as an upright side, and a short one along a slope', () => {
    expect(longestSlitRows(block(150, 100), 60)).toBe(10);
    const slope = placeShape({ shape: 'triangle', yarn: 'red', baseMm: 200, heightMm: 40, symmetric: false }, grid);
    expect(longestSlitRows(slope, 60)).toBeLessThan(3);
    expect(longestSlitRows({ rows: [[]] }, 60)).toBe(0);
  });

  test('a shape along a selvedge has one slit, on its inner side', () => {
    expect(longestSlitRows(block(50, 100), 60)).toBe(10);
    expect(longestSlitRows(block(150, 300), 60)).toBe(0);
  });

  test('of a shape that runs out of its band end with the band', () => {
    const { rows } = placeShape({ shape: 'rectangle', yarn: 'red', baseMm: 50, heightMm: 40, bottomMm: 30 }, grid);
    expect(rows).toHaveLength(5);
  });
});

test('a shape steps alike on both sides unless it leans or is asked to step otherwise', () => {
  const shape = { shape: 'triangle', yarn: 'red', baseMm: 60, heightMm: 40 } as const;
  expect(isSymmetric(shape)).toBe(true);
  expect(isSymmetric({ ...shape, leanMm: 0 })).toBe(true);
  expect(isSymmetric({ ...shape, leanMm: -10 })).toBe(false);
  expect(isSymmetric({ ...shape, symmetric: false })).toBe(false);
  expect(isSymmetric({ ...shape, leanMm: 10, symmetric: true })).toBe(true);
});
