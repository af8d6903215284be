import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { amountText } from '#core/units/format-amount.ts';
import { parseLength, type LengthUnit } from '#core/units/parse-length.ts';

const mm = (typed: string, unit: LengthUnit = 'cm'): number => {
  const parsed = parseLength(typed, unit);
  return parsed.ok ? parsed.mm : Number.NaN;
};
const reason = (typed: string, unit: LengthUnit = 'cm'): string => {
  const parsed = parseLength(typed, unit);
  return parsed.ok ? `read as ${String(parsed.mm)} mm` : parsed.reason;
};

describe('a typed length', () => {
  test.each<[string, LengthUnit, number]>([
    ['12.5', 'cm', 125],
    ['12,5', 'cm', 125],
    [' 12 ', 'cm', 120],
    ['.5', 'cm', 5],
    ['30cm', 'in', 300],
    ['300 mm', 'in', 300],
    ['1.2 m', 'cm', 1200],
    ['4 7/8', 'in', 4.875 * 25.4],
    ['4-7/8', 'in', 4.875 * 25.4],
    ['7/8', 'in', 0.875 * 25.4],
    ['4⅞', 'in', 4.875 * 25.4],
    ['½', 'in', 12.7],
    ['4 7/8 in', 'cm', 4.875 * 25.4],
    ['12 inches', 'cm', 304.8],
    ['12"', 'cm', 304.8],
    ['12″', 'cm', 304.8],
    ['2 ft', 'cm', 609.6],
    ["2'", 'cm', 609.6],
    ['1 yd', 'cm', 914.4],
    ['12 IN', 'cm', 304.8],
    ['12 in.', 'cm', 304.8],
    ['19\u200911/16\u00a0in', 'cm', 19.6875 * 25.4],
    ['7\u204416', 'in', (7 / 16) * 25.4],
    ['0', 'mm', 0],
  ])('%s in %s', (typed, unit, expected) => {
    expect(mm(typed, unit)).toBeCloseTo(expected, 9);
  });
});

describe('what cannot be read says what works', () => {
  test.each([
    ['', 'Type a length in cm.'],
    ['   ', 'Type a length in cm.'],
    ['wide', 'Write one length, like 12.5 or 4 7/8.'],
    ['12 13', 'Write one length, like 12.5 or 4 7/8.'],
    ['1/2/3', 'Write one length, like 12.5 or 4 7/8.'],
    ['12-', 'Write one length, like 12.5 or 4 7/8.'],
    ['1e5', 'Write one length, like 12.5 or 4 7/8.'],
    ['NaN', 'Write one length, like 12.5 or 4 7/8.'],
    ['-5', 'A length cannot be below 0.'],
    ['−5 cm', 'A length cannot be below 0.'],
    ['1/0', 'A fraction cannot have 0 below its line.'],
    ['1,234.5', 'Write one comma or point only, and leave out marks between thousands.'],
    ['12 parsec', '“parsec” is no unit we know. Write mm, cm, m, in, ft or yd.'],
    ['1'.repeat(41), 'That is too long for a length.'],
  ])('%s', (typed, expected) => {
    expect(reason(typed)).toBe(expected);
  });

  test('nothing that can be typed makes it throw', () => {
    fc.assert(fc.property(fc.string({ maxLength: 60 }), (typed) => {
      const parsed = parseLength(typed, 'cm');
      return parsed.ok ? Number.isFinite(parsed.mm) && parsed.mm >= 0 : parsed.reason.length > 10;
    }), { numRuns: 2000, seed: 3 });
  });
});

test('what is shown can be typed back', () => {
  fc.assert(
    fc.property(fc.double({ min: 1, max: 5000, noNaN: true }), (length) => {
      const inches = mm(amountText({ kind: 'length', mm: length, use: 'size' }, 'in'));
      const centimetres = mm(amountText({ kind: 'length', mm: length, use: 'least' }, 'cm'));
      return Math.abs(inches - length) <= 25.4 / 32 + 1e-6 && centimetres >= length - 1e-6 && centimetres - length <= 1 + 1e-6;
    }),
    { numRuns: 1000, seed: 5 },
  );
});
