import { describe, expect, test } from 'vitest';
import { beginningOf, monthOf, monthsUpTo, monthWords, sumsOf } from '#core/money/statement.ts';

describe('months of a statement', () => {
  test('a sale at half past eleven at night on the last of November is December’s for a teacher east of it', () => {
    const moment = new Date('2026-11-30T23:30:00Z');
    expect([monthOf(moment, 'UTC'), monthOf(moment, 'Europe/Berlin'), monthOf(moment, 'America/St_Johns')]).toEqual(['2026-11', '2026-12', '2026-11']);
  });

  test('twelve months end with the present one and cross the year', () => {
    const months = monthsUpTo(new Date('2027-02-15T12:00:00Z'), 'Europe/Berlin', 12);
    expect([months.length, months[0], months.at(-1)]).toEqual([12, '2026-03', '2027-02']);
    expect(beginningOf('2026-03', 'Europe/Berlin').toISOString()).toBe('2026-02-28T23:00:00.000Z');
    expect([monthWords('2026-12'), monthWords('2026-12', true)]).toEqual(['December 2026', 'Dec']);
  });
});

test('what is yours is what was taken less what went back and less the fee that stayed', () => {
  const at = new Date('2026-12-01T00:00:00Z');
  const entry = (kind: 'sale' | 'fee' | 'refund' | 'fee-refund', amountMinor: number) => ({ kind, amountMinor, currency: 'EUR', at });
  expect(sumsOf([entry('sale', 6_800), entry('fee', -544), entry('sale', 6_800), entry('fee', -544), entry('refund', -6_800), entry('fee-refund', 544)]))
    .toEqual({ seats: 2, takenMinor: 13_600, refundedMinor: -6_800, feeMinor: -544, yoursMinor: 6_256 });
  expect(sumsOf([])).toEqual({ seats: 0, takenMinor: 0, refundedMinor: 0, feeMinor: 0, yoursMinor: 0 });
});
