import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { feeOf, shareOf, splitAmount, taxWithin } from '#core/money/share.ts';

const amounts = fc.integer({ min: 1, max: 1_000_000_000 });
const rates = fc.integer({ min: 0, max: 10_000 });

describe('parts of a total', () => {
  test.each([
    [100, [1, 1, 1], [34, 33, 33]],
    [200, [1, 1, 1], [67, 67, 66]],
    [5, [1, 1], [3, 2]],
    [1, [0, 0, 7], [0, 0, 1]],
    [10_000, [5_000, 3_000, 2_000], [5_000, 3_000, 2_000]],
    [-100, [1, 1, 1], [-34, -33, -33]],
    [0, [], []],
    [0, [0, 0], [0, 0]],
    [7, [3, 2, 2], [3, 2, 2]],
    [1_000, [333, 333, 334], [333, 333, 334]],
  ])('%d in proportion to %j is %j', (total, weights, parts) => {
    expect(splitAmount(total, weights)).toEqual(parts);
  });

  test('always add up to the total, each less than one unit from its exact share', () => {
    const weights = fc.array(fc.integer({ min: 0, max: 1_000_000_000 }), { minLength: 1, maxLength: 40 }).filter((all) => all.some((w) => w > 0));
    fc.assert(
      fc.property(amounts, weights, (total, all) => {
        const parts = splitAmount(total, all);
        expect(parts.reduce((a, b) => a + b, 0)).toBe(total);
        const sum = all.reduce((a, b) => a + b, 0);
        for (const [index, part] of parts.entries()) {
          const exact = (total * (all[index] ?? 0)) / sum;
          expect(Math.abs(part - exact)).toBeLessThan(1.000001);
          if (all[index] === 0) expect(part).toBe(0);
        }
      }),
    );
  });

  test('a larger weight never gets a smaller part', () => {
    fc.assert(
      fc.property(amounts, fc.array(fc.integer({ min: 1, max: 1_000 }), { minLength: 2, maxLength: 12 }), (total, all) => {
        const sorted = all.toSorted((a, b) => b - a);
        const parts = splitAmount(total, sorted);
        expect(parts).toEqual(parts.toSorted((a, b) => b - a));
      }),
    );
  });

  test('an amount cannot be given to nobody', () => {
    expect(() => splitAmount(1, [])).toThrow(RangeError);
    expect(() => splitAmount(1, [0])).toThrow(RangeError);
    expect(() => splitAmount(1, [-1, 2])).toThrow(RangeError);
    expect(() => splitAmount(1.5, [1])).toThrow(RangeError);
  });
});

describe('the fee', () => {
  test('is rounded down', () => {
    expect(feeOf(6800, 1250)).toBe(850);
    expect(feeOf(6801, 1250)).toBe(850);
    expect(feeOf(6807, 1250)).toBe(850);
    expect(feeOf(6808, 1250)).toBe(851);
    expect(feeOf(7, 1250)).toBe(0);
  });

  test('never exceeds the agreed share, and is less than one unit below it', () => {
    fc.assert(
      fc.property(amounts, rates, (amount, rate) => {
        const fee = BigInt(feeOf(amount, rate));
        const exactTimesWhole = BigInt(amount) * BigInt(rate);
        expect(fee * 10_000n <= exactTimesWhole).toBe(true);
        expect((fee + 1n) * 10_000n > exactTimesWhole).toBe(true);
      }),
    );
  });

  test('is exact where doubles are not', () => {
    expect(feeOf(9_007_199_254_740_991, 10_000)).toBe(9_007_199_254_740_991);
  });

  test('is not taken of money given back, nor at a share that is none', () => {
    expect(() => feeOf(-1, 100)).toThrow(RangeError);
    expect(() => feeOf(1, 10_001)).toThrow(RangeError);
    expect(() => feeOf(1, 12.5)).toThrow(RangeError);
  });
});

describe('a share', () => {
  test('is rounded half away from zero, for money taken and money given back alike', () => {
    expect(shareOf(250, 100)).toBe(3);
    expect(shareOf(249, 100)).toBe(2);
    expect(shareOf(-250, 100)).toBe(-3);
    fc.assert(
      fc.property(amounts, rates, (amount, rate) => {
        expect(shareOf(amount, rate) + shareOf(-amount, rate)).toBe(0);
      }),
    );
  });
});

describe('the tax within a price', () => {
  test.each([
    [11_900, 1900, 1900],
    [6800, 1900, 1086],
    [6800, 0, 0],
    [100, 700, 7],
  ])('%d with %d basis points contains %d', (price, rate, tax) => {
    expect(taxWithin(price, rate)).toBe(tax);
  });

  test('and the rest make the price again when the tax is put on the rest', () => {
    fc.assert(
      fc.property(amounts, fc.integer({ min: 0, max: 3000 }), (price, rate) => {
        const rest = price - taxWithin(price, rate);
        expect(Math.abs(rest + shareOf(rest, rate) - price)).toBeLessThanOrEqual(1);
      }),
    );
  });
});
