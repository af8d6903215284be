import { describe, expect, test } from 'vitest';
import { instantOfWall, standingOf, type SeatFacts } from '#core/timetable/opening.ts';

const facts = (given: Partial<SeatFacts> = {}): SeatFacts => ({
  seatStartedAt: new Date('2026-03-01T10:00:00Z'),
  wovenOn: new Set(),
  done: new Set(),
  now: new Date('2026-03-03T09:00:00Z'),
  ...given,
});

describe('when a part opens', () => {
  test('at once: it is open', () => {
    expect(standingOf({ rule: 'at-once' }, facts())).toEqual({ open: true });
  });

  test('on a date: shut a second before, open at the stroke, on the teacher’s own clock', () => {
    const rule = { rule: 'on-date', wall: '2026-07-01T09:00', zone: 'Europe/Berlin' } as const;
    expect(standingOf(rule, facts({ now: new Date('2026-07-01T06:59:59Z') }))).toEqual({ open: false, until: 'date', opensAt: new Date('2026-07-01T07:00:00Z') });
    expect(standingOf(rule, facts({ now: new Date('2026-07-01T07:00:00Z') }))).toEqual({ open: true });
  });

  test('so many days after the seat: counted from the moment of the seat', () => {
    const rule = { rule: 'after-seat', days: 2 } as const;
    expect(standingOf(rule, facts())).toEqual({ open: false, until: 'date', opensAt: new Date('2026-03-03T10:00:00Z') });
    expect(standingOf(rule, facts({ now: new Date('2026-03-03T10:00:00Z') }))).toEqual({ open: true });
  });

  test('after a verdict: shut until the named part has "weave on", whatever other parts have', () => {
    const rule = { rule: 'after-verdict', lesson: 'b' } as const;
    expect(standingOf(rule, facts({ wovenOn: new Set(['a']) }))).toEqual({ open: false, until: 'verdict', lesson: 'b' });
    expect(standingOf(rule, facts({ wovenOn: new Set(['a', 'b']) }))).toEqual({ open: true });
  });
});

describe('when another part must be done first', () => {
  const rule = { rule: 'after-part', lesson: 'b' } as const;
  test('shut until that one is done, whatever others are', () => {
    expect(standingOf(rule, facts({ done: new Set(['a']) }))).toEqual({ open: false, until: 'part', lesson: 'b' });
    expect(standingOf(rule, facts({ done: new Set(['b']) }))).toEqual({ open: true });
  });
});

describe('a wall clock in a zone', () => {
  // Offsets and change dates are those of the IANA time zone database.
  test.each([
    ['2026-01-15T09:00', 'Europe/Berlin', '2026-01-15T08:00:00.000Z', 'winter'],
    ['2026-07-15T09:00', 'Europe/Berlin', '2026-07-15T07:00:00.000Z', 'summer'],
    ['2026-03-29T02:30', 'Europe/Berlin', '2026-03-29T01:00:00.000Z', 'skipped in spring: the next minute there is'],
    ['2026-10-25T02:30', 'Europe/Berlin', '2026-10-25T00:30:00.000Z', 'twice in autumn: the first'],
    ['2026-03-08T02:15', 'America/St_Johns', '2026-03-08T05:30:00.000Z', 'skipped, in a zone half an hour off'],
    ['2026-06-01T12:00', 'Asia/Kathmandu', '2026-06-01T06:15:00.000Z', 'a quarter of an hour off'],
    ['2011-12-30T12:00', 'Pacific/Apia', '2011-12-30T10:00:00.000Z', 'a day that never was: the midnight after it'],
  ])('%s in %s is %s (%s)', (wall, zone, expected) => {
    expect(instantOfWall(wall, zone)?.toISOString()).toBe(expected);
  });

  test.each([['2026-02-30T09:00', 'Europe/Berlin'], ['tomorrow', 'Europe/Berlin'], ['2026-02-01T25:00', 'UTC'], ['2026-02-01T09:00', 'Europe/Saltmarsh'], ['2026-02-01T09:00', '']])('%s in "%s" is no time', (wall, zone) => {
    expect(instantOfWall(wall, zone)).toBeNull();
  });
});
