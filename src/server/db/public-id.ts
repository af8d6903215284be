/** Names of rows that show in addresses: 128 random bits, so that knowing one tells nothing of another. */
import { randomBytes } from 'node:crypto';

const ALPHABET = '0123456789abcdefghjkmnpqrstvwxyz';
export const PUBLIC_ID = /^[0-9a-hjkmnp-tv-z]{26}$/;

/** 26 characters of lower-case Crockford base32. */
export function newPublicId(): string {
  let rest = BigInt(`0x${randomBytes(16).toString('hex')}`);
  let text = '';
  for (let i = 0; i < 26; i += 1) {
    text = `${ALPHABET.charAt(Number(rest & 31n))}${text}`;
    rest >>= 5n;
  }
  return text;
}
