import { DateTime } from 'luxon';

/** The day of a moment on a clock: `2026-12-01`. @param timeZone IANA name */
export function dayIn(moment: Date, timeZone: string): string {
  return DateTime.fromJSDate(moment, { zone: timeZone }).toFormat('yyyy-LL-dd');
}
