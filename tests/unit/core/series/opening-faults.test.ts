import { describe, expect, test } from 'vitest';
import { openingFaults, type PartOpening } from '#core/series/opening-faults.ts';
import { ruleWords } from '#core/timetable/rule-words.ts';
import { changedLines } from '#core/lesson-text/changed-lines.ts';

const part = (number: number, given: Partial<PartOpening> = {}): PartOpening => ({ number, opensAfterPart: null, waitsFor: 'verdict', hasCheckpoint: false, opensAt: null, ...given });

describe('parts that could never open', () => {
  test.each([
    ['a later one', [part(1, { opensAfterPart: 2 }), part(2, { hasCheckpoint: true })], 'It waits for Part 2, which comes later, so nobody could ever open it.'],
    ['itself', [part(1, { opensAfterPart: 1, hasCheckpoint: true })], 'It waits for its own photo, so nobody could ever open it.'],
    ['one that was taken out', [part(1, { opensAfterPart: 'taken-out' })], 'It waits for a part that was taken out. Choose another part, or let it open in another way.'],
    ['itself to be done', [part(1, { opensAfterPart: 1, waitsFor: 'done' })], 'It waits for itself, so nobody could ever open it.'],
    ['a later one to be done', [part(1, { opensAfterPart: 2, waitsFor: 'done' }), part(2)], 'It waits for Part 2, which comes later, so nobody could ever open it.'],
    ['one without a photo', [part(1), part(2, { opensAfterPart: 1 })], 'It waits for a verdict on Part 1, which asks for no photo.'],
  ])('wait for %s', (_words, parts, says) => {
    expect(openingFaults(parts).map((fault) => fault.says)).toEqual([says]);
  });

  test('or open before an earlier one', () => {
    const faults = openingFaults([part(1, { opensAt: new Date('2027-02-01') }), part(2, { opensAt: new Date('2027-01-01') })]);
    expect(faults).toEqual([{ part: 2, says: 'It opens before Part 1. Parts open in their order.' }]);
  });

  test('there are none in a series in order', () => {
    expect(openingFaults([part(1, { hasCheckpoint: true }), part(2, { opensAfterPart: 1 }), part(3, { opensAfterPart: 2, waitsFor: 'done' }), part(4, { opensAt: new Date('2027-01-01') })])).toEqual([]);
  });
});

describe('a rule in words', () => {
  const numberOf = (publicId: string): number | undefined => (publicId === 'b' ? 2 : undefined);
  test.each([
    [{ rule: 'at-once' }, 'at once'],
    [{ rule: 'after-seat', days: 0 }, 'as soon as the seat begins'],
    [{ rule: 'after-seat', days: 1 }, '1 day after the seat began'],
    [{ rule: 'after-seat', days: 7 }, '7 days after the seat began'],
    [{ rule: 'on-date', wall: '2027-07-01T09:00', zone: 'Europe/Berlin' }, 'on 1 July 2027 at 09:00'],
    [{ rule: 'after-verdict', lesson: 'b' }, 'after you say weave on to the photo of Part 2'],
    [{ rule: 'after-part', lesson: 'b' }, 'when Part 2 is done'],
    [{ rule: 'after-part', lesson: 'gone' }, 'after a part that was taken out'],
    [{ rule: 'after-verdict', lesson: 'gone' }, 'after a photo of a part that was taken out'],
  ] as const)('%j', (rule, words) => {
    expect(ruleWords(rule, numberOf)).toBe(words);
  });
});

describe('what changed between two texts', () => {
  const told = (before: string, after: string): string[] => changedLines(before, after).map(({ kind, text }) => `${kind} ${text}`);

  test('nothing, when they are the same', () => {
    expect(told('a\nb', 'a\nb')).toEqual([]);
  });

  test('a changed line is told as taken out and put in, with what stands round it', () => {
    expect(told('1\n2\n3\n4\n5\n6\n7\n8', '1\n2\n3\n4\nfive\n6\n7\n8')).toEqual(['gap ', 'same 3', 'same 4', 'out 5', 'in five', 'same 6', 'same 7', 'gap ']);
  });

  test('the lines of the new text are all there, in order', () => {
    const [before, after] = ['a\nb\nc\nd', 'b\nx\nd\ny'];
    expect(changedLines(before, after).filter(({ kind }) => kind !== 'out').map(({ text }) => text).join('\n')).toBe(after);
    expect(changedLines(before, after).filter(({ kind }) => kind !== 'in').map(({ text }) => text).join('\n')).toBe(before);
  });
});
