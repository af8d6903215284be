import { createHmac, timingSafeEqual } from 'node:crypto';
import type { EventRefusal } from './payment-service.ts';

/** Oldest and youngest news we believe, in seconds by our clock. Both sides: a date in the future would never grow too old. */
const WINDOW_SECONDS = 300;

export type SignatureVerdict =
  | { readonly ok: true; readonly secretIndex: number; readonly clockSkewSeconds: number }
  | { readonly ok: false; readonly reason: EventRefusal };

/**
 * Checks a header `t=…,v1=…[,v1=…]`: the HMAC-SHA-256 of `${t}.${rawBody}` under one of our secrets, in hexadecimal.
 * Other schemes in the header are passed over. Several secrets are tried, so that a new one can be brought in
 * while the old one is still in use.
 */
export function verifySignature(rawBody: string, header: string | null | undefined, secrets: readonly string[], now: Date): SignatureVerdict {
  if (header === null || header === undefined || header === '') return { ok: false, reason: 'unsigned' };
  const signed = readHeader(header);
  if (!signed) return { ok: false, reason: 'malformed-signature' };
  const secretIndex = secrets.findIndex((secret) => {
    const expected = createHmac('sha256', secret).update(`${signed.timeText}.${rawBody}`, 'utf8').digest();
    return signed.signatures.some((signature) => signature.length === expected.length && timingSafeEqual(signature, expected));
  });
  if (secretIndex < 0) return { ok: false, reason: 'wrong-signature' };
  const clockSkewSeconds = Number(signed.timeText) - Math.floor(now.getTime() / 1000);
  if (clockSkewSeconds < -WINDOW_SECONDS) return { ok: false, reason: 'too-old' };
  if (clockSkewSeconds > WINDOW_SECONDS) return { ok: false, reason: 'from-the-future' };
  return { ok: true, secretIndex, clockSkewSeconds };
}

function readHeader(header: string): { timeText: string; signatures: Buffer[] } | undefined {
  const times: string[] = [];
  const signatures: Buffer[] = [];
  for (const part of header.split(',')) {
    const [name, value = '', ...more] = part.trim().split('=');
    if (more.length > 0) return undefined;
    if (name === 't') times.push(value);
    if (name === 'v1' && /^[0-9a-f]{64}$/.test(value)) signatures.push(Buffer.from(value, 'hex'));
  }
  const [timeText] = times;
  // Two times would leave it open which of them was signed.
  if (timeText === undefined || times.length > 1 || !/^\d{1,12}$/.test(timeText) || signatures.length === 0) return undefined;
  return { timeText, signatures };
}
