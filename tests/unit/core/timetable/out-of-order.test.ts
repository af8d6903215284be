import { expect, test } from 'vitest';
import { outOfOrder } from '#core/timetable/out-of-order.ts';
import type { OpeningRule } from '#core/timetable/opening.ts';

const start = new Date('2026-12-01T08:00:00Z');
const told = (...rules: OpeningRule[]): string[] => outOfOrder(rules.map((opens, index) => ({ publicId: `p${index + 1}`, number: index + 1, title: '', opens, isPreview: false, asksForPhoto: false })), start).map(({ says }) => says);
const after = (days: number): OpeningRule => ({ rule: 'after-seat', days });

test('parts that open one after another, or together, are in order', () => {
  expect(told({ rule: 'at-once' }, after(0), after(7), after(7), { rule: 'after-verdict', lesson: 'p4' }, after(14))).toEqual([]);
});

test('a part that opens before one in front of it is told with how much earlier', () => {
  expect(told({ rule: 'at-once' }, after(3), after(10), after(7))).toEqual(['Part 4 would open 3 days before Part 3.']);
  expect(told(after(1), { rule: 'at-once' })).toEqual(['Part 2 would open a day before Part 1.']);
});

test('a date is held against days after the seat, for who starts today', () => {
  expect(told({ rule: 'on-date', wall: '2026-12-10T09:00', zone: 'Europe/Berlin' }, after(2))).toEqual(['Part 2 would open 7 days before Part 1.']);
});

test('a part that waits for a verdict is held against the day the photo can be shown', () => {
  expect(told(after(5), { rule: 'after-verdict', lesson: 'p1' }, after(4))).toEqual(['Part 3 would open a day before Part 1.']);
});

test('the part it is told against is the one that opens last of those in front', () => {
  expect(told(after(2), after(20), after(9))).toEqual(['Part 3 would open 11 days before Part 2.']);
});

test('hours are told as hours', () => {
  expect(told({ rule: 'on-date', wall: '2026-12-01T14:00', zone: 'UTC' }, { rule: 'on-date', wall: '2026-12-01T09:00', zone: 'UTC' })).toEqual(['Part 2 would open 5 hours before Part 1.']);
});
