/** A month as a sheet of weeks, Monday first (ISO 8601), with what falls on each of its days by the clock of a zone. */
import { DateTime } from 'luxon';

export interface MonthSheet<T> {
  /** `December 2026` */
  readonly label: string;
  /** Seven places a week; null before the first day and after the last. */
  readonly weeks: readonly (readonly (SheetDay<T> | null)[])[];
}

export interface SheetDay<T> {
  readonly day: number;
  readonly entries: readonly T[];
}

/** The months in which anything falls, in order; a month without an entry is left out. */
export function monthSheets<T>(entries: readonly { readonly at: Date; readonly entry: T }[], zone: string): MonthSheet<T>[] {
  const local = entries.map(({ at, entry }) => ({ entry, on: DateTime.fromJSDate(at, { zone }).setLocale('en-GB') }));
  const months = [...new Map(local.map(({ on }) => [on.toFormat('yyyy-MM'), on.startOf('month')])).entries()].sort(([a], [b]) => (a < b ? -1 : 1));
  return months.map(([key, first]) => {
    const days = Array.from({ length: first.daysInMonth ?? 0 }, (_, index) => ({
      day: index + 1,
      entries: local.filter(({ on }) => on.toFormat('yyyy-MM') === key && on.day === index + 1).map(({ entry }) => entry),
    }));
    const places = [...Array.from({ length: first.weekday - 1 }, () => null), ...days];
    const weeks = Array.from({ length: Math.ceil(places.length / 7) }, (_, week) => Array.from({ length: 7 }, (_place, day) => places[week * 7 + day] ?? null));
    return { label: first.toFormat('LLLL yyyy'), weeks };
  });
}
