/**
 * A mark in a browser that signed in to an account before. It opens nothing; it only spares its owner the brakes that
 * somebody else's guessing sets off. Signed, so that nobody can make one.
 */
import { createHmac, timingSafeEqual } from 'node:crypto';
import { config } from '#server/config.ts';

const DAY_MS = 86_400_000;
export const KNOWN_DEVICE_DAYS = 365;

function seal(text: string): string {
  const key = createHmac('sha256', config().secret).update('known-device').digest();
  return createHmac('sha256', key).update(text).digest('base64url');
}

/** The mark of a browser in which the owner of `emailKey` has just signed in. */
export function markKnown(emailKey: string, now: Date): string {
  const until = now.getTime() + KNOWN_DEVICE_DAYS * DAY_MS;
  return `${until}.${seal(`${until} ${emailKey}`)}`;
}

/** Whether `mark` says that the owner of `emailKey` has signed in here, and is not too old. */
export function isKnown(mark: string | undefined, emailKey: string, now: Date): boolean {
  const [, until, sealed] = /^(\d{13})\.([A-Za-z0-9_-]{43})$/.exec(mark ?? '') ?? [];
  if (until === undefined || sealed === undefined || Number(until) <= now.getTime()) return false;
  return timingSafeEqual(Buffer.from(sealed), Buffer.from(seal(`${until} ${emailKey}`)));
}
