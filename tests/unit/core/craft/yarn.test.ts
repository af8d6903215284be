import { describe, expect, test } from 'vitest';
import { readCount } from '#core/craft/yarn/count-text.ts';
import { classesByLength, classesByWraps, YARN_CLASSES } from '#core/craft/yarn/classes.ts';
import { metresPer100gFromTex, texFromCount } from '#core/craft/yarn/count.ts';
import {
  compressedDiameter,
  compressedFromLoft,
  diameterOfMixed,
  diameterTogether,
  loftFromCompressed,
  loftFromWraps,
  texFromWraps,
  wrapsPerInch,
} from '#core/craft/yarn/diameter.ts';
import { gristOf, massOf, threadOf } from '#core/craft/yarn/thread.ts';

describe('a count on a label', () => {
  test.each([
    ['16', 'ne-cotton', 16, 1],
    ['8/2', 'ne-cotton', 8, 2],
    [' 8 / 2 ', 'ne-cotton', 8, 2],
    ['2.5', 'nm', 2.5, 1],
    ['12,5/1', 'nm', 12.5, 1],
    ['2/16', 'nm', 16, 2],
    ['16/2', 'nm', 16, 2],
    ['2/24', 'ne-worsted', 24, 2],
    ['40/2', 'lea', 40, 2],
    ['150/2', 'denier', 150, 2],
    ['8/3', 'jute', 8, 3],
    ['300/2', 'dtex', 300, 2],
  ] as const)('%s in %s is %f in %i plies, beyond doubt', (text, system, count, plies) => {
    expect(readCount(text, system)).toEqual({ count, plies, tex: expect.closeTo(plies * texFromCount(count, system), 9) as unknown });
  });

  test.each([
    ['2/8', 'ne-cotton', 8, 2],
    ['4/10', 'lea', 10, 4],
    ['3/3', 'nm', 3, 3],
    ['6/4', 'nm', 6, 4],
    ['5/5', 'ne-worsted', 5, 5],
    ['150/48', 'denier', 150, 1],
  ] as const)('%s in %s is read as %f in %i plies, and asked about', (text, system, count, plies) => {
    expect(readCount(text, system)).toMatchObject({ count, plies, doubt: 'which-is-plies' });
  });

  test('spun silk names the folded yarn', () => {
    expect(readCount('40/2', 'ne-cotton', ' SILK ')).toMatchObject({ plies: 2, doubt: 'silk', tex: expect.closeTo(texFromCount(40, 'ne-cotton'), 9) as unknown });
    expect(readCount('40/2', 'spun-silk')).toMatchObject({ plies: 2, doubt: 'silk', tex: expect.closeTo(texFromCount(40, 'ne-cotton'), 9) as unknown });
    expect(readCount('40', 'ne-cotton', 'silk')).not.toHaveProperty('doubt');
    expect(readCount('40/2', 'nm', 'silk')).not.toMatchObject({ doubt: 'silk' });
  });

  test.each(['', '/', '8/', '/2', '0', '8/0', '0/2', '8/2/2', '-8', '8x2', 'eight', '1e5', '٨'])('%s is none', (text) => {
    expect(readCount(text, 'ne-cotton')).toBeUndefined();
  });
});

describe('diameters', () => {
  test('wraps go to a thickness and back', () => {
    expect(loftFromWraps(10)).toBeCloseTo(2.54, 12);
    expect(wrapsPerInch(20, 50.8)).toBeCloseTo(10, 12);
    expect(loftFromCompressed(compressedFromLoft(2))).toBeCloseTo(2, 12);
  });

  test('a yarn known by its wraps alone has the tex of one so thick', () => {
    expect(loftFromCompressed(compressedDiameter(texFromWraps(10, 0.84), 0.84))).toBeCloseTo(2.54, 9);
  });

  test('like strands and unlike ones lie together by their areas', () => {
    expect(diameterTogether(1, 4)).toBe(2);
    expect(diameterOfMixed([3, 4])).toBe(5);
  });
});

describe('a thread', () => {
  test('takes its thickness from whatever the yarn says', () => {
    expect(gristOf({ tex: 400 })).toEqual({ tex: 400, plies: 1, trust: 'label' });
    expect(gristOf({ metresPer100g: 250 })).toEqual({ tex: 400, plies: 1, trust: 'label' });
    expect(gristOf({ count: { text: '10', system: 'nm' } })).toEqual({ tex: 100, plies: 1, trust: 'label' });
    expect(gristOf({ count: { text: '10', system: 'nm' }, ball: { metres: 500, grams: 100 } })).toEqual({ tex: 200, plies: 1, trust: 'label' });
    expect(gristOf({ tex: 400, ball: { metres: 500, grams: 100 } })).toEqual({ tex: 400, plies: 1, trust: 'label' });
    expect(gristOf({ class: 3 }).tex).toBeCloseTo(444.444, 3);
    expect(gristOf({ class: 3, ball: { metres: 500, grams: 100 } })).toEqual({ tex: 200, plies: 1, trust: 'label' });
  });

  test('of a yarn that was never read is a programmer’s mistake', () => {
    expect(() => gristOf({ count: { text: 'ten', system: 'nm' } })).toThrow('not a count: ten');
  });

  test('prefers its own K and counted wraps', () => {
    expect(threadOf({ tex: 500 }, 0.9).compressedMm).toBeCloseTo(0.8960071, 6);
    expect(threadOf({ tex: 500, ashenhurstK: 0.84 }, 0.9).compressedMm).toBeCloseTo(0.9600076, 6);
    expect(threadOf({ tex: 500, wrapsPerInch: 12.7 }, 0.9).loftMm).toBeCloseTo(2, 12);
  });

  test('of roving lies as thick as it was measured, and of a class as thick as its middle', () => {
    expect(threadOf({ tex: 25_000, freeDiameterMm: 28 }, 0.84)).toMatchObject({ loftMm: 28, strandLoftMm: 28 });
    expect(threadOf({ class: 4 }, 0.84)).toMatchObject({ tex: 625, loftMm: 25.4 / 10.5 });
    expect(threadOf({ class: 4, wrapsPerInch: 10 }, 0.84).loftMm).toBeCloseTo(2.54, 12);
    const labelled = threadOf({ class: 4, ball: { metres: 80, grams: 50 } }, 0.84);
    expect(labelled.loftMm).toBeCloseTo(loftFromCompressed(labelled.compressedMm), 12);
  });

  test('weighs its length', () => {
    expect(massOf(1_000_000, 400)).toBe(400);
  });
});

describe('yarn classes', () => {
  test('overlap, so a yarn may be of two', () => {
    expect(classesByWraps(14.5).map(({ number }) => number)).toEqual([1, 2, 3]);
    expect(classesByLength(125).map(({ number }) => number)).toEqual([4, 5]);
    expect(classesByWraps(4.5)).toEqual([]);
  });

  test('run from thin to thick by number', () => {
    const middles = YARN_CLASSES.map(({ wrapsPerInch: { min } }) => min);
    expect([...middles].sort((a, b) => b - a)).toEqual(middles);
    expect(metresPer100gFromTex(400)).toBe(250);
  });
});
