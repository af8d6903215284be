// Whether a word names an amount at all. Which amounts a certain piece has is for its plan to say; but a key that no
// plan could ever have is a slip of the pen, and is told while its writer is still at it.
import { AMOUNT_KEYS } from '#core/craft/amounts.ts';

// Bands have small letters; a role of yarn may have capitals.
const OWN_NAME = /^[a-z0-9-]{1,40}$/i;

const patterns = AMOUNT_KEYS.map((key) => key.split('.'));

/** True for a key of `AMOUNT_KEYS`, with a name of the piece's own where a key has one: `yarn.ground.mass`. */
export function isAmountKey(value: string): boolean {
  if (value.length > 128) return false;
  const words = value.split('.');
  return patterns.some((pattern) => pattern.length === words.length && pattern.every((part, index) => (part.startsWith('<') ? OWN_NAME.test(words[index] ?? '') : part === words[index])));
}
