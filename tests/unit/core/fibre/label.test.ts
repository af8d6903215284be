import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { careFor, type CareSignName } from '#core/fibre/care.ts';
import { CARE_SIGNS } from '#core/fibre/care-signs.ts';
import { readComposition } from '#core/fibre/composition.ts';
import { contentWords, fibreContent } from '#core/fibre/content.ts';
import { FIBRES, fibreNamed, type FibreName } from '#core/fibre/fibres.ts';

const sharesOf = (text: string) => {
  const read = readComposition(text);
  return read.ok ? read.shares.map(({ fibre, percent }) => [fibre, percent]) : read.reason;
};

describe('what a yarn is made of', () => {
  test.each([
    ['wool', [['wool', 100]]],
    ['80 % wool, 20 % nylon', [['wool', 80], ['polyamide', 20]]],
    ['80% Wool 20% Nylon', [['wool', 80], ['polyamide', 20]]],
    ['wool 80, silk', [['wool', 80], ['silk', 20]]],
    ['72,5 % merino wool / 27,5 % mulberry silk', [['wool', 72.5], ['silk', 27.5]]],
    ['linen', [['flax', 100]]],
    ['50 % cotton and 50 % moonlight', [['cotton', 50], [null, 50]]],
  ])('is read from “%s”', (text, shares) => { expect(sharesOf(text)).toEqual(shares); });

  test.each([
    ['', /Write each fibre/], ['80 % wool, 30 % silk', /comes to 110 %/], ['60 % wool', /comes to 60 %/], ['wool, silk', /How much of each/],
    ['100 % wool, silk', /comes to 100 %/], ['20 % 30 %', /Write each fibre/],
  ])('is not taken from “%s”, and says why', (text, reason) => { expect(sharesOf(text)).toMatch(reason); });

  test('is known by every name of the list, and by no other word', () => {
    for (const name of Object.keys(FIBRES)) expect(fibreNamed(name)).toBe(name);
    expect([fibreNamed('constructor'), fibreNamed('toString'), fibreNamed('')]).toEqual([null, null, null]);
  });
});

const known = (grams: number, fibre: FibreName) => ({ grams, shares: [{ fibre, words: fibre, percent: 100 }] });

describe('what a piece is made of', () => {
  test('goes by mass, the largest first, what is unknown last', () => {
    expect(fibreContent([known(40, 'cotton'), { grams: 100, shares: null }, known(60, 'wool')])).toEqual([{ fibre: 'wool', percent: 30 }, { fibre: 'cotton', percent: 20 }, { fibre: null, percent: 50 }]);
  });

  test('comes to 100 by the largest remainder', () => {
    // Thirds: 33.33 each; one of them is told as 34.
    expect(fibreContent([known(1, 'wool'), known(1, 'silk'), known(1, 'cotton')]).map(({ percent }) => percent)).toEqual([34, 33, 33]);
    // 66.6 + 16.7 + 16.7: rounded down 66 + 16 + 16, two are missing, to those that lost .7.
    expect(fibreContent([known(666, 'wool'), known(167, 'silk'), known(167, 'cotton')]).map(({ percent }) => percent)).toEqual([66, 17, 17]);
  });

  test('always comes to 100, and no share is off by a whole per cent', () => {
    fc.assert(fc.property(fc.array(fc.record({ grams: fc.double({ min: 0.01, max: 5_000, noNaN: true }), fibre: fc.constantFrom(...Object.keys(FIBRES) as FibreName[]) }), { minLength: 1, maxLength: 20 }), (yarns) => {
      const rows = fibreContent(yarns.map(({ grams, fibre }) => known(grams, fibre)));
      const total = yarns.reduce((sum, { grams }) => sum + grams, 0);
      expect(rows.reduce((sum, { percent }) => sum + percent, 0)).toBe(100);
      for (const { fibre, percent } of rows) {
        const exact = (yarns.filter((yarn) => yarn.fibre === fibre).reduce((sum, { grams }) => sum + grams, 0) / total) * 100;
        expect(Math.abs(percent - exact)).toBeLessThan(1);
      }
    }));
  });

  test('of nothing is nothing, and a trace is not told as none', () => {
    expect(fibreContent([])).toEqual([]);
    expect(fibreContent([known(0, 'wool')])).toEqual([]);
    expect(fibreContent([known(999, 'wool'), known(1, 'silk')]).map(contentWords)).toEqual(['100\u00a0% wool', 'less than 1\u00a0% silk']);
  });
});

describe('care', () => {
  const signs = (...fibres: (FibreName | null)[]): CareSignName[] => careFor(fibres).map(({ sign }) => sign);

  test('goes by the fibre that bears least, line by line', () => {
    expect(signs('cotton')).toEqual(['wash-40', 'no-bleach', 'no-tumble', 'line-in-shade', 'iron-200', 'clean-p']);
    expect(signs('cotton', 'wool')).toEqual(['hand-wash', 'no-bleach', 'no-tumble', 'flat-in-shade', 'iron-150', 'clean-p-mild']);
    expect(signs('jute', 'silk')).toEqual(['no-wash', 'no-bleach', 'no-tumble', 'flat-in-shade', 'iron-110', 'no-clean']);
  });

  test('promises nothing for a fibre nobody knows', () => {
    for (const fibres of [[null], [], ['cotton', null]] as const) expect(signs(...fibres)).toEqual(['no-wash', 'no-bleach', 'no-tumble', 'flat-in-shade', 'no-iron', 'no-clean']);
  });

  test('has a drawn sign and a sentence for each', () => {
    for (const fibre of Object.keys(FIBRES) as FibreName[]) for (const { sign, words } of careFor([fibre])) expect([CARE_SIGNS[sign].lines.length > 0, words.endsWith('.')]).toEqual([true, true]);
  });
});
