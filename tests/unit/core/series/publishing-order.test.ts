import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Missing } from '#core/series/missing.ts';
import { partMayGoOut, partsGoingOut, type PartToPublish } from '#core/series/publishing-order.ts';
import { partsList } from '#core/series/parts-list.ts';

const parts = (...published: boolean[]): PartToPublish[] => published.map((isPublished, index) => ({ number: index + 1, isPublished }));
const lacks = (part: number | null, blocks = true): Missing => ({ part, place: 'text', says: 'Nothing is written yet.', blocks });

describe('publishing a series', () => {
  test('lets out all parts when nothing is missing', () => {
    expect(partsGoingOut(parts(false, false, false), [lacks(2, false)])).toMatchObject({ out: [1, 2, 3], held: [] });
  });

  test('stops before the first part that is not ready: those behind it wait, ready or not', () => {
    expect(partsGoingOut(parts(false, false, false, false), [lacks(3)])).toMatchObject({ out: [1, 2], held: [3, 4] });
  });

  test('lets out nothing when the first part, or the series itself, lacks something', () => {
    expect(partsGoingOut(parts(false, false), [lacks(1)]).out).toEqual([]);
    expect(partsGoingOut(parts(true, false), [lacks(null)]).out).toEqual([]);
  });

  test('renews parts that are out already on both sides of one whose change is not ready', () => {
    expect(partsGoingOut(parts(true, true, true, false), [lacks(2)])).toMatchObject({ out: [1, 3, 4], held: [2] });
  });

  test('never leaves a part out whose earlier one students cannot read', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 8 }), fc.integer({ min: 0, max: 8 }), fc.array(fc.integer({ min: 1, max: 8 })), (count, alreadyOut, blocked) => {
      const all = Array.from({ length: count }, (_, index) => ({ number: index + 1, isPublished: index < alreadyOut }));
      const { out, held } = partsGoingOut(all, blocked.map((part) => lacks(part)));
      const readable = all.filter(({ number, isPublished }) => isPublished || out.includes(number)).map(({ number }) => number);
      expect(readable).toEqual(readable.map((_, index) => index + 1));
      expect([...out, ...held].sort((a, b) => a - b)).toEqual(all.map(({ number }) => number));
    }));
  });
});

describe('publishing one part', () => {
  test('is open to the next in order, and to any that is out', () => {
    expect(partMayGoOut(2, parts(true, false, false), [])).toEqual({ ok: true });
    expect(partMayGoOut(3, parts(true, false, true), [])).toEqual({ ok: true });
  });

  test('says which part must come first', () => {
    expect(partMayGoOut(3, parts(true, false, false), [])).toEqual({ ok: false, says: 'Part 2 is not published yet. Parts come out in their order: publish Part 2 first, or move this one before it.' });
  });

  test('says what the part lacks, before what lies in front of it', () => {
    expect(partMayGoOut(3, parts(true, false, false), [lacks(3)])).toEqual({ ok: false, says: 'Part 3 is not ready yet. Nothing is written yet.' });
    expect(partMayGoOut(2, parts(true, false, false), [lacks(3)])).toEqual({ ok: true });
  });
});

test.each([[[2], 'Part 2'], [[3, 2], 'Parts 2 and 3'], [[1, 2, 3, 5], 'Parts 1 to 3 and 5'], [[1, 3, 5, 6, 7, 9], 'Parts 1, 3, 5 to 7 and 9']])('parts %j are told as %s', (numbers, words) => {
  expect(partsList(numbers)).toBe(words);
});
