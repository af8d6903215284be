import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { bandsByPart } from '#core/following/bands-by-part.ts';
import { nextAct } from '#core/following/next-act.ts';
import { opensShort, opensWhen } from '#core/following/opening-words.ts';
import { howFar, wovenShare, type PartInHand } from '#core/following/progress.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { lowTide } from '../../../support/low-tide.ts';

function part(number: number, given: Partial<PartInHand> = {}): PartInHand {
  return { number, title: `Part ${number}`, steps: ['a', 'b'], ticked: new Set(), isFinished: false, asksForPhoto: false, verdict: null, standing: { open: true }, ...given };
}
const all = new Set(['a', 'b']);
const closed = { open: false, until: 'verdict', lesson: 'x' } as const;

describe('how far a student is', () => {
  test('parts count as done in their order only, the one in hand by its steps', () => {
    const far = howFar([part(1, { isFinished: true }), part(2, { ticked: new Set(['a']) }), part(3, { isFinished: true })]);
    expect(far).toMatchObject({ done: 1.5, inHand: { number: 2 } });
  });

  test('a part whose steps are all ticked is nearly done, but not before it is said or seen', () => {
    expect(howFar([part(1, { ticked: all })]).done).toBeLessThan(1);
    expect(howFar([part(1, { ticked: all, verdict: 'weave-on' })])).toEqual({ done: 1, inHand: undefined });
  });

  test('a tick of a step that an older text had counts for nothing', () => {
    expect(howFar([part(1, { ticked: new Set(['gone']) })]).done).toBe(0);
  });

  test('cloth grows with the parts that weave it', () => {
    const stretches = [{ bands: [] }, { bands: [0, 1] }, { bands: [2] }];
    expect(wovenShare(1, stretches, [10, 30, 60])).toBe(0);
    expect(wovenShare(1.5, stretches, [10, 30, 60])).toBeCloseTo(0.2);
    expect(wovenShare(3, stretches, [10, 30, 60])).toBe(1);
  });
});

describe('the one next act', () => {
  test.each([
    ['begin, when nothing was touched', [part(1), part(2)], { act: 'begin', part: { number: 1 } }],
    ['go on at the first step that is not ticked', [part(1, { ticked: new Set(['a']) })], { act: 'go-on', step: 'b' }],
    ['show the photo, once the steps are done', [part(1, { ticked: all, asksForPhoto: true })], { act: 'show' }],
    ['close a part without a photo', [part(1, { ticked: all })], { act: 'close' }],
    ['mend first comes before everything', [part(1, { verdict: 'mend-first', asksForPhoto: true }), part(2)], { act: 'mend', part: { number: 1 } }],
    ['wait, while the photo is with the teacher and nothing else is open', [part(1, { verdict: 'waits' }), part(2, { standing: closed })], { act: 'wait', part: { number: 1 } }],
    ['go on in a later part that is open meanwhile', [part(1, { verdict: 'waits', ticked: all }), part(2)], { act: 'go-on', part: { number: 2 } }],
    ['a part that opens later', [part(1, { isFinished: true }), part(2, { standing: closed })], { act: 'opens', part: { number: 2 } }],
    ['finished', [part(1, { isFinished: true })], { act: 'finished' }],
    ['nothing, where there is no part', [], { act: 'none' }],
  ])('%s', (_name, parts, expected) => {
    expect(nextAct(parts)).toMatchObject(expected);
  });
});

describe('when a part opens, in words', () => {
  const facts = { teacher: 'Ilse', timeZone: 'Europe/Berlin' };

  test('what the teacher asked to be shown is what she must have seen', () => {
    expect(opensWhen({ ...facts, standing: closed, awaited: { number: 2, ask: 'Show your warped loom' } })).toBe('opens when Ilse has seen your warped loom');
    expect(opensWhen({ ...facts, standing: closed, awaited: { number: 2, ask: 'A photo of the back' } })).toBe('opens when Ilse has looked at your photo of Part 2');
  });

  test('a day stands on the clock of who reads it', () => {
    const standing = { open: false, until: 'date', opensAt: new Date('2027-06-09T22:30:00Z') } as const;
    expect(opensWhen({ ...facts, standing })).toBe('opens on 10 June 2027 at 00:30');
    expect(opensShort({ ...facts, standing })).toBe('Opens 10 June 2027');
  });
});

test('the texts of Low Tide tell which part weaves which band', async () => {
  const folder = new URL('../../../../content/series/low-tide/', import.meta.url);
  const { bands } = await lowTide();
  const keys = readdirSync(folder).filter((name) => name.endsWith('.mdx')).sort().map((name) => {
    const text = parseLessonText(readFileSync(new URL(name, folder), 'utf8'));
    return text.ok ? text.amounts : [];
  });
  const names = bandsByPart(bands, keys)?.map((part) => part.bands.map((band) => (typeof band === 'number' ? bands[band]?.name : band)));
  expect(names?.[0]).toEqual([]);
  expect(names?.[2]).toContain('fringe-over');
  expect(names?.[3]).toEqual(['dark-shore']);
  expect(names?.[4]).toEqual(['dunes']);
  expect(names?.[5]).toContain('sky');
  expect(names?.flat()).toHaveLength(bands.length);
  expect(bandsByPart(bands, keys.map(() => []))).toBeNull();
});
