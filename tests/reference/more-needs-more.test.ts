/** More of anything never needs less yarn, tried a thousand times and more. */
import fc from 'fast-check';
import { test } from 'vitest';
import { weftFacedCrimp } from '#core/craft/crimp.ts';
import { pickLength, turnLength } from '#core/craft/picks.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';
import { cases } from '../support/random-cases.ts';

const RUNS = { numRuns: cases(1500), seed: 20260821 };
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

test('more ends, more rows and more crimp never need less yarn', () => {
  fc.assert(
    fc.property(fc.integer({ min: 2, max: 2000 }), between(1, 12), between(0.05, 0.9), between(0.1, 5), between(1, 1.1), (ends, p, r, pickSpacing, more) => {
      const row = (count: number, tightness: number): number => pickLength(count, { stepMm: p * (1 + weftFacedCrimp(tightness)), turnMm: turnLength(tightness * p, pickSpacing) });
      const rows = (heightMm: number): number => roundHalfUp(heightMm / pickSpacing) * row(ends, r);
      return row(ends + 1, r) > row(ends, r) && row(ends, r * more) >= row(ends, r) * (1 - 1e-12) && rows(100 * more) >= rows(100);
    }),
    RUNS,
  );
});
