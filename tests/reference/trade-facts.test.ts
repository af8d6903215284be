/** Facts of the trade: common practice without a source, held against the reckoning with a wide tolerance. */
import { describe, expect, test } from 'vitest';
import { dowelLength } from '#core/craft/hanging.ts';
import { endsOnNails, nailsOnRail } from '#core/craft/nails.ts';
import { adviseSpacing, strandsFor } from '#core/craft/sett.ts';
import { rovingDiameter } from '#core/craft/yarn/roving.ts';
import { YARN_CLASSES } from '#core/craft/yarn/classes.ts';
import { loftFromWraps } from '#core/craft/yarn/diameter.ts';
import workedPiece from './worked-piece.json' with { type: 'json' };
import { planOf } from './worked-piece.ts';

const INCH = 25.4;
const QUARTER = INCH / 4;
const HALF = INCH / 2;
const COMMON_WARP_MM = 0.8;

/** What the reckoning warns of when the ground of the worked piece is this yarn, with ends so far apart. */
function warnedOf(spacingMm: number, ground: object): readonly string[] {
  const { warnings } = planOf({
    ...workedPiece,
    loom: { ...workedPiece.loom, nailPitchMm: 2 * spacingMm },
    yarns: { ...workedPiece.yarns, A: ground },
  });
  return warnings.filter(({ path }) => path === '/yarns/A').map(({ code }) => code);
}

/** Thickness of a class in the middle of its wraps. */
const loftOf = (number: number): number => {
  const range = YARN_CLASSES[number]?.wrapsPerInch ?? { min: 1, max: 1 };
  return loftFromWraps((range.min + Math.min(range.max, 40)) / 2);
};

describe('spacing', () => {
  test.each([5, 6])('C1a: class %i is too thick for ends a quarter inch apart, and suits half an inch', (number) => {
    expect(adviseSpacing(QUARTER, COMMON_WARP_MM, loftOf(number))).toBe('too-thick');
    expect(warnedOf(QUARTER, { class: number })).toContain('W_THICK');
    expect(warnedOf(HALF, { class: number })).not.toContain('W_THICK');
    expect(adviseSpacing(HALF, COMMON_WARP_MM, loftOf(number))).toBe('suits');
  });

  test('C1b: roving is too thick for a quarter inch', () => {
    expect(adviseSpacing(QUARTER, COMMON_WARP_MM, rovingDiameter(4000))).toBe('too-thick');
    expect(warnedOf(QUARTER, { tex: 4000, freeDiameterMm: rovingDiameter(4000) })).toContain('W_WARP_SHOWS');
  });

  test.each([1, 2])('C1c: class %i by itself is too thin for half an inch', (number) => {
    expect(adviseSpacing(HALF, COMMON_WARP_MM, loftOf(number))).toBe('too-thin');
    expect(warnedOf(HALF, { class: number })).toContain('W_LOOSE');
    expect(warnedOf(QUARTER, { class: number })).not.toContain('W_THICK');
    expect(adviseSpacing(QUARTER, COMMON_WARP_MM, loftOf(number))).not.toBe('too-thick');
  });

  test('C2: ends a quarter inch apart become half an inch by doubling them, and by warping the inner nails only', () => {
    const loom = { ...workedPiece.loom, kind: 'two-row-frame', nailPitchMm: INCH } as const;
    const all = planOf({ ...workedPiece, loom }).ends;
    const doubled = planOf({ ...workedPiece, loom, warp: { ...workedPiece.warp, endsTogether: 2 } }).ends;
    const inner = planOf({ ...workedPiece, loom: { ...loom, nailRows: 'inner' } }).ends;
    expect(all.spacingMm).toBeCloseTo(QUARTER, 12);
    for (const { spacingMm, working } of [doubled, inner]) {
      expect(spacingMm).toBeCloseTo(HALF, 12);
      expect(working).toBe(all.working / 2);
    }
    expect(inner.nailsTop).toBeLessThanOrEqual(all.nailsTop / 2 + 1);
  });

  test('a yarn too thin for its ends warns, and stops warning when strands are taken together', () => {
    const thin = { metresPer100g: 400 };
    const loose = (yarn: object): boolean =>
      planOf({
        ...workedPiece,
        loom: { ...workedPiece.loom, nailPitchMm: 2 * QUARTER },
        yarns: { ...workedPiece.yarns, A: yarn },
      }).warnings.some(({ code, path }) => code === 'W_LOOSE' && path === '/yarns/A');
    expect(loose(thin)).toBe(true);
    expect(loose({ ...thin, strands: 3 })).toBe(false);
  });
});

describe('bare warp', () => {
  test('C3: two to three inches stay unwoven where loops are tied to the rod', () => {
    const tied = planOf({ ...workedPiece, dowel: { ...workedPiece.dowel, fixing: 'tied' }, loom: { ...workedPiece.loom, insideHeightMm: 600 } });
    expect(tied.loom.topMm).toBeGreaterThanOrEqual(50);
    expect(tied.loom.topMm).toBeLessThanOrEqual(76);
  });

  test('C4: a spacer card of six inches sets the room for a fringe', () => {
    const { cut, loom } = planOf({
      ...workedPiece,
      loom: { ...workedPiece.loom, insideHeightMm: 700 },
      allowances: { ...workedPiece.allowances, bottomMm: 152.4 },
    });
    expect(cut.spacerCard.heightMm).toBe(152.4);
    expect(loom.bottomMm).toBe(152.4);
  });
});

test('C5: a shuttle of three draws weaves eight to nine rows of a piece 16 in wide at half-inch spacing', () => {
  const { yarns } = planOf({
    ...workedPiece,
    size: { widthMm: 16 * INCH, heightMm: 400 },
    loom: { ...workedPiece.loom, nailPitchMm: INCH, insideHeightMm: 620 },
    allowances: { ...workedPiece.allowances, loadMm: 3 * 1200 },
    yarns: { ...workedPiece.yarns, A: { metresPer100g: 115, wrapsPerInch: 7.5 } },
  });
  expect(yarns['A']?.rowsPerLoad).toBeGreaterThanOrEqual(8);
  expect(yarns['A']?.rowsPerLoad).toBeLessThanOrEqual(9);
});

test('C6: two dowels for pieces of 16 in come from one length of 48, and one fits the frame that takes the piece', () => {
  const dowel = dowelLength(16 * INCH);
  expect(2 * dowel).toBeLessThan(48 * INCH);
  const frame = 20 * INCH;
  expect(endsOnNails(nailsOnRail(frame, HALF), 'zigzag') * QUARTER).toBeGreaterThan(16 * INCH);
  expect(dowel).toBeLessThan(frame);
});

test('strands are taken together until the wished share of the room is filled, and none fit where warp alone fills it (areas of circles added)', () => {
  // 5 mm from end to end at 0.4 leave 2 mm, 0.8 of it warp: 1.2 mm of weft, as thick as four strands of 0.6 mm.
  expect(strandsFor(5, 0.8, 0.6, 0.4)).toBe(4);
  expect(strandsFor(5, 0.8, 3, 0.4)).toBe(1);
  expect(strandsFor(5, 2, 0.6, 0.4)).toBeUndefined();
});
