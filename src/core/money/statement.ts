/** Entries of an account told apart by the calendar month of its owner, and summed. */
import { DateTime } from 'luxon';

export interface Entry {
  readonly kind: 'sale' | 'fee' | 'refund' | 'fee-refund';
  /** Whole minor units; what goes out is negative. */
  readonly amountMinor: number;
  readonly currency: string;
  readonly at: Date;
}

export interface Sums {
  readonly seats: number;
  readonly takenMinor: number;
  readonly refundedMinor: number;
  readonly feeMinor: number;
  /** Of all of it. */
  readonly yoursMinor: number;
}

/** `2026-12`, on the clock of `timeZone`. */
export function monthOf(moment: Date, timeZone: string): string {
  return DateTime.fromJSDate(moment, { zone: timeZone }).toFormat('yyyy-MM');
}

/** The `count` months up to the one of `now`, oldest first. */
export function monthsUpTo(now: Date, timeZone: string, count: number): string[] {
  const last = DateTime.fromJSDate(now, { zone: timeZone }).startOf('month');
  return Array.from({ length: count }, (_, index) => last.minus({ months: count - 1 - index }).toFormat('yyyy-MM'));
}

/** The instant at which a month of `monthOf` begins. */
export function beginningOf(month: string, timeZone: string): Date {
  return DateTime.fromFormat(month, 'yyyy-MM', { zone: timeZone }).toJSDate();
}

/** `December 2026`, or `Dec` when short. */
export function monthWords(month: string, short = false): string {
  return DateTime.fromFormat(month, 'yyyy-MM', { zone: 'UTC' }).setLocale('en-GB').toFormat(short ? 'LLL' : 'LLLL yyyy');
}

/** Sums of entries in one currency. */
export function sumsOf(entries: readonly Entry[]): Sums {
  const of = (...kinds: readonly Entry['kind'][]): number => entries.filter(({ kind }) => kinds.includes(kind)).reduce((sum, { amountMinor }) => sum + amountMinor, 0);
  return {
    seats: entries.filter(({ kind }) => kind === 'sale').length,
    takenMinor: of('sale'),
    refundedMinor: of('refund'),
    feeMinor: of('fee', 'fee-refund'),
    yoursMinor: of('sale', 'refund', 'fee', 'fee-refund'),
  };
}
