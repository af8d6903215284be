/**
 * The private address of a student's calendar: whoever knows it reads when parts of one seat open, and nothing else.
 * Signed, so that none has to be kept; a new revision makes a new one and ends the old.
 */
import { createHmac, timingSafeEqual } from 'node:crypto';
import { config } from '#server/config.ts';

export interface CalendarOf {
  /** Public id of the seat. */
  readonly seat: string;
  readonly revision: number;
}

function seal({ seat, revision }: CalendarOf): string {
  const key = createHmac('sha256', config().secret).update('calendar').digest();
  return createHmac('sha256', key).update(`${seat} ${revision}`).digest('base64url');
}

export function calendarKey(of: CalendarOf): string {
  return `${of.seat}-${seal(of)}`;
}

/** The seat a key speaks of; null for what is no key. Whether it is the newest one is for `opensCalendar` to say. */
export function seatOfKey(key: string): string | null {
  return /^([0-9a-z]{26})-[A-Za-z0-9_-]{43}$/.exec(key)?.[1] ?? null;
}

export function opensCalendar(key: string, of: CalendarOf): boolean {
  const [given, right] = [Buffer.from(key), Buffer.from(calendarKey(of))];
  return given.length === right.length && timingSafeEqual(given, right);
}
