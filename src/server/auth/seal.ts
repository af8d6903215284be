/** Seals on texts that leave the house and come back: addresses that are a proof by themselves, so that none has to be kept. */
import { createHmac, timingSafeEqual } from 'node:crypto';
import { config } from '#server/config.ts';

/** 43 characters that only this house can make of `text`, another for each purpose. */
export function seal(purpose: string, text: string): string {
  const key = createHmac('sha256', config().secret).update(purpose).digest();
  return createHmac('sha256', key).update(text).digest('base64url');
}

/** Whether two texts are the same, told in a time that says nothing of where they differ. */
export function isSame(given: string, right: string): boolean {
  const [a, b] = [Buffer.from(given), Buffer.from(right)];
  return a.length === b.length && timingSafeEqual(a, b);
}
