import { describe, expect, test } from 'vitest';
import { classPlace, countByPart, daysSince, type PartOfOne } from '#core/workroom/class-place.ts';
import { countWord, middleOf, waitedWords } from '#core/workroom/waited-words.ts';

const part = (given: Partial<PartOfOne> = {}): PartOfOne => ({ isFinished: false, verdict: null, steps: 4, ticked: 0, ...given });
const NOW = new Date('2026-12-01T10:00:00Z');
const ago = (hours: number): Date => new Date(NOW.getTime() - hours * 3_600_000);

describe('a student’s place in the class', () => {
  test.each([
    ['nothing done', [part(), part()], { at: 0, done: 0, verdict: null }],
    ['half of the first part', [part({ ticked: 2 }), part()], { at: 0, done: 0.5, verdict: null }],
    ['all steps ticked, not yet looked at', [part({ ticked: 4, verdict: 'waits' }), part()], { at: 0, done: 0.96, verdict: 'waits' }],
    ['a verdict ends a part', [part({ verdict: 'weave-on' }), part({ ticked: 1 })], { at: 1, done: 1.25, verdict: null }],
    ['a later part finished first does not count', [part(), part({ isFinished: true })], { at: 0, done: 0, verdict: null }],
    ['more ticks than the text has steps now', [part({ ticked: 9 })], { at: 0, done: 0.96, verdict: null }],
    ['all done', [part({ isFinished: true }), part({ verdict: 'weave-on' })], { at: undefined, done: 2, verdict: null }],
    ['a part without steps', [part({ steps: 0 })], { at: 0, done: 0, verdict: null }],
  ] as const)('%s', (_words, parts, place) => {
    expect(classPlace(parts, null)).toEqual(place);
  });

  test('follows the rows she counted in the part in hand, and never makes it whole', () => {
    const cloth = (counted: number) => ({ stretches: [{ bands: [0] }, { bands: [1] }], heights: [100, 300], counted });
    const parts = [part({ isFinished: true }), part({ ticked: 1 })];
    expect(classPlace(parts, cloth(0.625)).done).toBe(1.5);
    expect(classPlace(parts, cloth(1)).done).toBe(1.96);
    // Counted only in what is done already: the steps say it.
    expect(classPlace(parts, cloth(0.2)).done).toBe(1.25);
  });

  test('counts who moves and who stands still, at each part', () => {
    const students = [{ at: 0, lastStepAt: ago(1) }, { at: 0, lastStepAt: ago(14 * 24) }, { at: 1, lastStepAt: ago(14 * 24 - 1) }, { at: undefined, lastStepAt: ago(9_000) }];
    expect(countByPart(students, 3, NOW)).toEqual([{ moving: 1, still: 1 }, { moving: 1, still: 0 }, { moving: 0, still: 0 }]);
    expect(daysSince(new Date(NOW.getTime() + 1), NOW)).toBe(0);
  });
});

test.each([[0, '1\u00a0min'], [0.7, '42\u00a0min'], [11.9, '11\u00a0h'], [24, '1\u00a0day'], [37, '1\u00a0day 13\u00a0h'], [50, '2\u00a0days 2\u00a0h'], [24 * 9 + 5, '9\u00a0days']])('after %d hours one says %s', (hours, words) => {
  expect(waitedWords(ago(hours), NOW)).toBe(words);
});

test('small counts are words', () => {
  expect([0, 1, 3, 12, 13].map(countWord)).toEqual(['No', 'One', 'Three', 'Twelve', '13']);
});

test.each([[[], undefined], [[5], 5], [[9, 1, 5], 5], [[1, 2, 10, 4], 3]])('the middle of %j is %s', (values, middle) => {
  expect(middleOf(values)).toBe(middle);
});
