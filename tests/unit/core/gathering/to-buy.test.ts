import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import type { Material } from '#core/craft/craft.ts';
import { readStash, stashWords, type Stash } from '#core/gathering/stash.ts';
import { yarnsToBuy } from '#core/gathering/to-buy.ts';

const BALL = { metres: 100, grams: 50 };
function wool(given: Partial<Material> = {}): Material {
  return { key: 'yarn.sky', name: 'sky', label: 'Fenwool 6/2, Estuary', colour: '#224466', yarn: { tex: 500, ball: BALL }, lengthMm: 230_000, grams: 115, ...given };
}
const only = (materials: readonly Material[], stash: Stash | null = null) => {
  const key = yarnsToBuy(materials, new Map())[0]?.key ?? '';
  const [yarn] = yarnsToBuy(materials, stash === null ? new Map() : new Map([[key, stash]]));
  if (yarn === undefined) throw new RangeError('nothing to buy');
  return yarn;
};

describe('what is to buy of a yarn', () => {
  test('is rounded up to whole balls, and what is left over is told', () => {
    expect(only([wool()])).toMatchObject({ shareToBuy: 1, balls: { count: 3, leftOverMm: 70_000, tight: false } });
  });

  test('adds up all its places in the piece before it is rounded: 130 m and 60 m of 100 m balls are two, not three', () => {
    expect(only([wool({ lengthMm: 130_000, grams: 65 }), wool({ key: 'yarn.ridge', lengthMm: 60_000, grams: 30 })])).toMatchObject({ lengthMm: 190_000, grams: 95, balls: { count: 2 } });
  });

  test.each([
    [{ amount: 40_000, unit: 'mm' }, 190 / 230, 2, 10_000],
    [{ amount: 65, unit: 'g' }, 50 / 115, 1, 0],
    [{ amount: 1.5, unit: 'balls' }, 80 / 230, 1, 20_000],
    [{ amount: 3, unit: 'balls' }, 0, 0, 70_000],
    [{ amount: 115, unit: 'g' }, 0, 0, 0],
  ] as const)('takes off a stash of %j', (stash, share, count, leftOverMm) => {
    const yarn = only([wool()], stash);
    expect(yarn.shareToBuy).toBeCloseTo(share, 9);
    expect(yarn.balls?.count).toBe(count);
    expect(yarn.balls?.leftOverMm).toBeCloseTo(leftOverMm, 3);
  });

  test('keeps apart colours and put-ups of one name, and leaves out what is used up', () => {
    expect(yarnsToBuy([wool(), wool({ colour: '#aa0000' }), wool({ yarn: { tex: 500, ball: { metres: 200, grams: 100 } } }), wool({ label: 'Gone', lengthMm: 0 })], new Map())).toHaveLength(3);
  });

  test('is told by weight where no length is known, and balls say nothing without a put-up', () => {
    const { lengthMm: _none, ...roving } = wool({ yarn: { tex: 8_000 } });
    expect(only([roving], { amount: 15, unit: 'g' })).toMatchObject({ lengthMm: undefined, balls: undefined });
    expect(only([roving], { amount: 2, unit: 'balls' }).shareToBuy).toBe(1);
  });

  test('always suffices: balls and stash come to the need at least, and to less than one ball more', () => {
    fc.assert(fc.property(fc.double({ min: 1, max: 5_000, noNaN: true }), fc.double({ min: 0, max: 6_000, noNaN: true }), (needM, hasM) => {
      const { balls } = only([wool({ lengthMm: needM * 1_000, grams: needM / 2 })], hasM === 0 ? null : { amount: hasM * 1_000, unit: 'mm' });
      const inHand = (balls?.count ?? 0) * BALL.metres + hasM;
      expect(inHand).toBeGreaterThanOrEqual(needM - 1e-6);
      if (hasM < needM) expect(inHand - needM).toBeLessThan(BALL.metres + 1e-6);
    }));
  });
});

describe('a stash as it is typed', () => {
  test.each([
    ['40 g', { amount: 40, unit: 'g' }], ['0,2 kg', { amount: 200, unit: 'g' }], ['40 grams', { amount: 40, unit: 'g' }],
    ['120 m', { amount: 120_000, unit: 'mm' }], ['120 metres', { amount: 120_000, unit: 'mm' }], ['100 yd', { amount: 91_440, unit: 'mm' }],
    ['1,5 balls', { amount: 1.5, unit: 'balls' }], ['2 skeins', { amount: 2, unit: 'balls' }], ['1/2 ball', { amount: 0.5, unit: 'balls' }],
    ['', null], ['  ', null], ['0 g', null],
  ])('“%s”', (typed, stash) => {
    expect(readStash(typed)).toEqual({ ok: true, stash });
  });

  test.each(['40', 'some', '-3 g', '40 parsecs', '9000 balls', 'balls', '1 2 3 g'])('“%s” is asked for again, in words', (typed) => {
    const read = readStash(typed);
    expect(read.ok ? '' : read.reason).toMatch(/^(?:Write what you have|That is more than)/);
  });

  test('comes back as it can be read again', () => {
    for (const [words, units] of [['120 m', 'cm'], ['40 g', 'cm'], ['1.5 balls', 'cm'], ['1 ball', 'in']] as const) {
      const read = readStash(words);
      expect(read.ok && read.stash !== null ? stashWords(read.stash, units) : '').toBe(words);
    }
    const yards = readStash(stashWords({ amount: 91_440, unit: 'mm' }, 'in'));
    expect(yards).toEqual({ ok: true, stash: { amount: 91_440, unit: 'mm' } });
  });
});
