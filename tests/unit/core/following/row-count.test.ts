import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { planPiece } from '#core/craft/plan.ts';
import { countedBands, countedShare, countsAt, wovenByCount } from '#core/following/counted-bands.ts';
import { fellOf, type PartInHand } from '#core/following/progress.ts';
import { bandForPart, bandInHand, MOST_ROWS, newerTally, rowPlaceWords, rowsOf, type CountedBand, type Tally } from '#core/following/row-count.ts';
import { lowTide } from '../../../support/low-tide.ts';

const band = (index: number, rows: number): CountedBand => ({ index, key: `b${String(index)}`, words: `band ${String(index)}`, technique: 'tabby', rows });
const bands = [band(1, 10), band(2, 1), band(4, 40)];

describe('rows that several devices count', () => {
  const tally = fc.record({ rows: fc.integer({ min: -50, max: 50 }), version: fc.integer({ min: 1, max: 9 }) });

  test('add up, and never fall below none', () => {
    expect(rowsOf([12, -2, 3])).toBe(13);
    expect(rowsOf([2, -5])).toBe(0);
    expect(rowsOf([])).toBe(0);
    expect(rowsOf([MOST_ROWS, MOST_ROWS])).toBe(MOST_ROWS);
  });

  test('of one device’s states the newest holds, in whichever order they come and however often', () => {
    fc.assert(fc.property(fc.uniqueArray(tally, { selector: ({ version }) => version, minLength: 1 }), fc.nat(), (states, turn) => {
      const newest = states.reduce((a, b) => (b.version > a.version ? b : a));
      const mixed: Tally[] = [...states.slice(turn % states.length), ...states, ...states.slice(0, turn % states.length)];
      expect(mixed.reduce(newerTally)).toEqual(newest);
    }));
  });
});

describe('the band in hand', () => {
  test.each<[string, Record<string, number>, number]>([
    ['is the first while nothing is counted', {}, 1],
    ['is the one with rows in it', { b1: 3 }, 1],
    ['is the next one once all rows are there', { b1: 10 }, 2],
    ['is the last one she counted in, whatever she left short below', { b1: 3, b4: 2 }, 4],
    ['stays the last one when that is full', { b4: 41 }, 4],
    ['knows no band that the piece does not have', { gone: 9 }, 1],
  ])('%s', (_, counts, index) => {
    expect(bandInHand(bands, counts)?.index).toBe(index);
  });

  test('is none in a piece without rows', () => {
    expect(bandInHand([], {})).toBeUndefined();
    expect(bandForPart([], ['b1'], {})).toBeUndefined();
  });

  test('is told with its row', () => {
    expect(rowPlaceWords(bands, { b1: 3 })).toBe('row 3 of 10 of the band “band 1”');
    expect(rowPlaceWords([{ ...band(0, 4), key: '#0', words: 'the first band' }], { '#0': 4 })).toBe('row 4 of 4 of the first band');
    expect(rowPlaceWords(bands, { b1: 10 })).toBe('');
    expect(rowPlaceWords([], {})).toBe('');
  });

  test.each<[string, readonly string[], Record<string, number>, number]>([
    ['is the part’s first where nothing below it was counted', ['b2', 'b4'], {}, 2],
    ['is the part’s last once she is beyond it', ['b1', 'b2'], { b4: 3 }, 2],
    ['is the one in hand within the part', ['b1', 'b2'], { b1: 10 }, 2],
    ['is the one in hand in a part that weaves none', [], { b1: 10 }, 2],
  ])('while a part is woven %s', (_, own, counts, index) => {
    expect(bandForPart(bands, own, counts)?.index).toBe(index);
  });
});

describe('the fell of Low Tide', () => {
  const made = async () => {
    const piece = await lowTide();
    const plan = planPiece(piece, 'cm');
    if (!plan.ok) throw new RangeError('Low Tide can be woven');
    return { piece, plan: plan.value };
  };

  test('rises row by row, through bands that have no rows of their own', async () => {
    const low = await made();
    const counted = countedBands(low);
    expect(counted.map(({ key }) => key).slice(0, 3)).toEqual(['foot', 'fringe-under', 'between-fringes']);
    expect(counted.find(({ key }) => key === 'dark-shore')?.words).toBe('dark shore');
    const foot = counted[0]?.rows ?? 0;
    expect(wovenByCount(counted, { foot: foot - 1 })).toEqual({ bandsDone: 1, rows: foot - 1 });
    expect(wovenByCount(counted, { foot })).toEqual({ bandsDone: 2 });
    const shares = Array.from({ length: foot + 1 }, (_, rows) => countedShare(low, { foot: rows }, { bandsDone: 0 }));
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(new Set(shares).size).toBe(foot + 1);
    expect(shares.at(-1)).toBeCloseTo(12 / 440, 2);
  });

  test.each([{ bandsDone: 0 }, { bandsDone: 5, rows: 3 }, { bandsDone: 6 }, { bandsDone: 8, rows: 1 }, { bandsDone: 13 }])('stands in the counts as it was said: %j', async (said) => {
    const counted = countedBands(await made());
    const before = Object.fromEntries(counted.map(({ key }) => [key, 2]));
    expect(wovenByCount(counted, { ...before, ...countsAt(counted, said) })).toEqual(said);
  });

  test('is where she said in My piece when that is further than what she counted', async () => {
    const low = await made();
    expect(countedShare(low, { foot: 2 }, { bandsDone: 6 })).toBeCloseTo(countedShare(low, {}, { bandsDone: 6 }), 12);
    expect(countedShare(low, { sky: 4 }, { bandsDone: 6 })).toBeGreaterThan(countedShare(low, {}, { bandsDone: 6 }));
  });
});

describe('the fell of parts', () => {
  const part = (number: number, given: Partial<PartInHand> = {}): PartInHand => ({ number, title: '', steps: ['a', 'b'], ticked: new Set(), isFinished: false, asksForPhoto: false, verdict: null, standing: { open: true }, ...given });
  const stretches = [{ bands: [] }, { bands: [0, 1] }, { bands: [2] }];
  const heights = [10, 30, 60];
  const second = (given: Partial<PartInHand>) => [part(1, { isFinished: true }), part(2, given), part(3)];

  test('stands by the steps while nothing is counted in the part in hand', () => {
    expect(fellOf(second({ ticked: new Set(['a']) }), stretches, heights, 0)).toMatchObject({ done: 1.5, share: 0.2 });
  });

  test('stands by the rows once some are counted, whatever is ticked', () => {
    const fell = fellOf(second({ ticked: new Set(['a']) }), stretches, heights, 0.1);
    expect(fell.share).toBeCloseTo(0.1);
    expect(fell.done).toBeCloseTo(1.25);
  });

  test('is the further of both when every step is ticked: who stopped counting is not held back', () => {
    expect(fellOf(second({ ticked: new Set(['a', 'b']) }), stretches, heights, 0.1).share).toBeCloseTo(0.4 * 0.96);
  });

  test('never falls below what the teacher has seen, and a part in hand is never whole', () => {
    const seen = [part(1, { isFinished: true }), part(2, { verdict: 'weave-on' }), part(3)];
    expect(fellOf(seen, stretches, heights, 0.1)).toMatchObject({ done: 2, share: 0.4 });
    expect(fellOf(second({ verdict: 'waits' }), stretches, heights, 0.7)).toMatchObject({ done: 1.96, share: 0.7 });
  });

  test('is at the end when all parts are done', () => {
    expect(fellOf([part(1, { isFinished: true })], [{ bands: [0] }], [10], 0)).toEqual({ done: 1, inHand: undefined, share: 1 });
  });
});
