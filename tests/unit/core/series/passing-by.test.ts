import { describe, expect, test } from 'vitest';
import { passingBy } from '#core/series/passing-by.ts';

/** Parts by what each waits for, in their order; null opens by itself. */
const parts = (...waits: readonly (number | 'taken-out' | null)[]) => waits.map((opensAfterPart, index) => ({ number: index + 1, opensAfterPart, isPreview: false }));

describe('parts that pass by one that waits', () => {
  test.each([
    ['none waits', parts(null, null, null)],
    ['all after it wait for the same part', parts(null, null, 2, 2, 2)],
    ['they wait through one another', parts(null, null, 2, 3, 4)],
    ['nothing comes after it', parts(null, null, 2)],
    ['it waits for what was taken out, which is told elsewhere', parts(null, 'taken-out', null)],
    ['it waits for a later one, which is told elsewhere', parts(null, 3, null)],
  ])('are none when %s', (_when, given) => {
    expect(passingBy(given)).toEqual([]);
  });

  test('are told together, at the first of them', () => {
    expect(passingBy(parts(null, null, 2, null, null))).toEqual([{ part: 4, says: 'Parts 4 and 5 can be opened while Part 3 still waits for Part 2. If they build on it, let them wait too.' }]);
  });

  test('are told where a wait begins anew in the middle, without the earlier photo', () => {
    expect(passingBy(parts(null, null, 2, 2, null, 5))).toEqual([{ part: 5, says: 'Parts 5 and 6 can be opened while Part 4 still waits for Part 2. If they build on it, let them wait too.' }]);
  });

  test('are told by the waiting part nearest in front', () => {
    expect(passingBy(parts(null, null, 2, null, 3, null)).map(({ says }) => says)).toEqual([
      'Part 4 can be opened while Part 3 still waits for Part 2. If it builds on it, let it wait too.',
      'Part 6 can be opened while Part 5 still waits for Part 3. If it builds on it, let it wait too.',
    ]);
  });

  test('may be free to read', () => {
    const given = parts(null, 1, null).map((part) => ({ ...part, isPreview: part.number === 3 }));
    expect(passingBy(given)).toEqual([]);
  });
});
