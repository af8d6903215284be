/**
 * The private address of a student's calendar: whoever knows it reads when parts of one seat open, and nothing else.
 * Signed, so that none has to be kept; a new revision makes a new one and ends the old.
 */
import { isSame, seal } from '#server/auth/seal.ts';

export interface CalendarOf {
  /** Public id of the seat. */
  readonly seat: string;
  readonly revision: number;
}

export function calendarKey({ seat, revision }: CalendarOf): string {
  return `${seat}-${seal('calendar', `${seat} ${revision}`)}`;
}

/** The seat a key speaks of; null for what is no key. Whether it is the newest one is for `opensCalendar` to say. */
export function seatOfKey(key: string): string | null {
  return /^([0-9a-z]{26})-[A-Za-z0-9_-]{43}$/.exec(key)?.[1] ?? null;
}

export function opensCalendar(key: string, of: CalendarOf): boolean {
  return isSame(key, calendarKey(of));
}
