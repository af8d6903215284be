import { describe, expect, test } from 'vitest';
import { nextMorning } from '#core/timetable/next-morning.ts';

const of = (now: string, zone: string): [string, string] => {
  const { day, at } = nextMorning(new Date(now), zone);
  return [day, at.toISOString()];
};

describe('the next morning', () => {
  test('is today before seven by her clocks, tomorrow from then on', () => {
    expect(of('2026-12-01T05:59:59.999Z', 'Europe/Berlin')).toEqual(['2026-12-01', '2026-12-01T06:00:00.000Z']);
    expect(of('2026-12-01T06:00:00Z', 'Europe/Berlin')).toEqual(['2026-12-02', '2026-12-02T06:00:00.000Z']);
  });

  test('is a day of her own calendar, not of ours', () => {
    expect(of('2026-12-01T23:00:00Z', 'Pacific/Auckland')).toEqual(['2026-12-03', '2026-12-02T18:00:00.000Z']);
    expect(of('2026-12-01T10:00:00Z', 'America/Halifax')).toEqual(['2026-12-01', '2026-12-01T11:00:00.000Z']);
  });

  test('stays at seven when the clocks change in between', () => {
    expect(of('2026-03-28T12:00:00Z', 'Europe/Berlin')).toEqual(['2026-03-29', '2026-03-29T05:00:00.000Z']);
    expect(of('2026-10-24T12:00:00Z', 'Europe/Berlin')).toEqual(['2026-10-25', '2026-10-25T06:00:00.000Z']);
  });

  test('is by UTC where the zone is none', () => {
    expect(of('2026-12-01T08:00:00Z', 'Nowhere/Here')).toEqual(['2026-12-02', '2026-12-02T07:00:00.000Z']);
  });
});
