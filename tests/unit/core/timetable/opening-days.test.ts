import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { clockWords } from '#core/moment-words.ts';
import { monthSheets } from '#core/timetable/month-sheet.ts';
import { earliestOf, openingDays, type PartToOpen, type SeatInTime } from '#core/timetable/opening-days.ts';
import { instantOfWall, standingOf, type OpeningRule } from '#core/timetable/opening.ts';

const part = (number: number, opens: OpeningRule, isPreview = false): PartToOpen => ({ publicId: `p${number}`, number, title: `Part ${number}`, opens, isPreview, asksForPhoto: false });
const start = new Date('2026-12-01T09:00:00Z');
const seat = (given: Partial<SeatInTime> = {}): SeatInTime => ({ seatStartedAt: start, wovenOnAt: new Map(), doneAt: new Map(), answerDays: 2, now: start, ...given });

describe('what somebody meets who starts today', () => {
  test('parts open from the start, after days, on a date, and when a photo was answered', () => {
    const days = openingDays([
      part(1, { rule: 'at-once' }),
      part(2, { rule: 'after-seat', days: 3 }),
      part(3, { rule: 'after-verdict', lesson: 'p2' }),
      part(4, { rule: 'on-date', wall: '2027-01-10T09:00', zone: 'Europe/Berlin' }),
      part(5, { rule: 'after-verdict', lesson: 'p4' }),
    ], seat());
    expect(days.map((day) => [day.when, day.when === 'at' ? day.at.toISOString() : day.when === 'verdict' ? [day.after, day.earliest?.toISOString()] : ''])).toEqual([
      ['from-the-start', ''],
      ['at', '2026-12-04T09:00:00.000Z'],
      ['verdict', [2, '2026-12-06T09:00:00.000Z']],
      ['at', '2027-01-10T08:00:00.000Z'],
      ['verdict', [4, '2027-01-12T08:00:00.000Z']],
    ]);
  });

  test('a date before the seat, nought days, and a part free to read are open from the start', () => {
    const days = openingDays([part(1, { rule: 'on-date', wall: '2026-11-01T09:00', zone: 'Europe/Berlin' }), part(2, { rule: 'after-seat', days: 0 }), part(3, { rule: 'after-seat', days: 9 }, true)], seat());
    expect(days.map(({ when }) => when)).toEqual(['from-the-start', 'from-the-start', 'from-the-start']);
  });

  test('a verdict that was given is a day like any other', () => {
    const at = new Date('2026-12-05T17:00:00Z');
    const [, waited] = openingDays([part(1, { rule: 'at-once' }), part(2, { rule: 'after-verdict', lesson: 'p1' })], seat({ wovenOnAt: new Map([['p1', at]]) }));
    expect(waited).toMatchObject({ when: 'at', at });
  });

  test('a photo not shown yet is answered no earlier than from now on', () => {
    const [, waited] = openingDays([part(1, { rule: 'at-once' }), part(2, { rule: 'after-verdict', lesson: 'p1' })], seat({ now: new Date('2026-12-20T09:00:00Z') }));
    expect(waited).toMatchObject({ when: 'verdict', after: 1, earliest: new Date('2026-12-22T09:00:00Z') });
  });

  test.each([['a later part', 'p2'], ['itself', 'p1'], ['a part that was taken out', 'gone']])('a part that waits for %s has no day', (_what, lesson) => {
    expect(openingDays([part(1, { rule: 'after-verdict', lesson }), part(2, { rule: 'at-once' })], seat())[0]).toMatchObject({ when: 'verdict', after: null, earliest: null });
  });

  test('a part that waits for one to be done opens the same day at the earliest, and a photo’s answer is waited for too', () => {
    const waits = { rule: 'after-part', lesson: 'p1' } as const;
    expect(openingDays([part(1, { rule: 'after-seat', days: 3 }), part(2, waits)], seat())[1]).toMatchObject({ when: 'part', after: 1, earliest: new Date('2026-12-04T09:00:00Z') });
    expect(openingDays([{ ...part(1, { rule: 'after-seat', days: 3 }), asksForPhoto: true }, part(2, waits)], seat())[1]).toMatchObject({ earliest: new Date('2026-12-06T09:00:00Z') });
    const at = new Date('2026-12-02T10:00:00Z');
    expect(openingDays([part(1, { rule: 'at-once' }), part(2, waits)], seat({ doneAt: new Map([['p1', at]]) }))[1]).toMatchObject({ when: 'at', at });
    expect(openingDays([part(1, { rule: 'after-part', lesson: 'p2' }), part(2, { rule: 'at-once' })], seat())[0]).toMatchObject({ when: 'part', after: null, earliest: null });
  });

  test('two verdicts in a row take the promised time twice', () => {
    const days = openingDays([part(1, { rule: 'at-once' }), part(2, { rule: 'after-verdict', lesson: 'p1' }), part(3, { rule: 'after-verdict', lesson: 'p2' })], seat());
    expect(days.map((day) => earliestOf(day, seat())?.toISOString())).toEqual(['2026-12-01T09:00:00.000Z', '2026-12-03T09:00:00.000Z', '2026-12-05T09:00:00.000Z']);
  });
});

// Dates of the changes: IANA time zone database, rules EU and US.
const CHANGES = [
  ['Europe/Berlin', '2026-03-29', 'spring'], ['Europe/Berlin', '2026-10-25', 'autumn'],
  ['America/New_York', '2026-03-08', 'spring'], ['America/New_York', '2026-11-01', 'autumn'],
] as const;

describe.each(CHANGES)('round the change of clocks in %s on %s (%s)', (zone, day) => {
  const around = [-2, -1, 0, 1, 2].map((offset) => new Date(Date.parse(`${day}T00:00:00Z`) + offset * 86_400_000).toISOString().slice(0, 10));

  test('a part that opens at nine opens at nine, whatever the offset', () => {
    for (const date of around) expect(clockWords(instantOfWall(`${date}T09:00`, zone) ?? start, zone)).toBe('09:00');
  });

  test('every minute of every day round it opens on that day, and a later minute never opens earlier', () => {
    fc.assert(fc.property(fc.constantFrom(...around), fc.integer({ min: 0, max: 1_439 }), fc.integer({ min: 0, max: 1_439 }), (date, a, b) => {
      const wall = (minute: number): string => `${date}T${String(Math.floor(minute / 60)).padStart(2, '0')}:${String(minute % 60).padStart(2, '0')}`;
      const [first, second] = [Math.min(a, b), Math.max(a, b)].map((minute) => instantOfWall(wall(minute), zone));
      expect(first).not.toBeNull();
      expect((first ?? start).getTime()).toBeLessThanOrEqual((second ?? start).getTime());
      for (const moment of [first, second]) expect(monthSheets([{ at: moment ?? start, entry: 'x' }], zone)[0]?.weeks.flat().find((place) => place?.entries.length === 1)?.day).toBe(Number(date.slice(8)));
    }));
  });

  test('the calendar and the door agree: shut the minute before, open at the stroke', () => {
    fc.assert(fc.property(fc.constantFrom(...around), fc.integer({ min: 0, max: 23 }), fc.integer({ min: 1, max: 40 }), (date, hour, days) => {
      for (const opens of [{ rule: 'on-date', wall: `${date}T${String(hour).padStart(2, '0')}:00`, zone } as const, { rule: 'after-seat', days } as const]) {
        const seatStartedAt = new Date(`${around[0] ?? ''}T00:00:00Z`);
        const [entry] = openingDays([part(1, opens)], seat({ seatStartedAt }));
        if (entry?.when !== 'at') continue;
        const standing = (now: Date): boolean => standingOf(opens, { seatStartedAt, wovenOn: new Set(), done: new Set(), now }).open;
        expect([standing(new Date(entry.at.getTime() - 1)), standing(entry.at)]).toEqual([false, true]);
      }
    }));
  });
});

describe('a month as a sheet', () => {
  test('begins on Monday and ends with its last day; what falls on a day stands there by the clock of the reader', () => {
    const at = new Date('2026-12-31T23:30:00Z');
    const [inBerlin] = monthSheets([{ at, entry: 'Part 2' }], 'Europe/Berlin');
    const [inNewYork] = monthSheets([{ at, entry: 'Part 2' }], 'America/New_York');
    expect([inBerlin?.label, inNewYork?.label]).toEqual(['January 2027', 'December 2026']);
    // 1 January 2027 is a Friday (ISO 8601 calendar).
    expect(inBerlin?.weeks[0]?.map((place) => place?.day ?? null)).toEqual([null, null, null, null, 1, 2, 3]);
    expect(inBerlin?.weeks[0]?.[4]?.entries).toEqual(['Part 2']);
    expect(inBerlin?.weeks.flat().filter((place) => place !== null)).toHaveLength(31);
  });

  test('months without an entry are left out', () => {
    expect(monthSheets(['2027-03-05', '2026-12-04', '2027-03-01'].map((date) => ({ at: new Date(`${date}T12:00:00Z`), entry: date })), 'UTC').map(({ label }) => label)).toEqual(['December 2026', 'March 2027']);
  });

});
