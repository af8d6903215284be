// Judging the value of one attribute: the same rules for what a writer types and for what a stored tree holds.
import type { AttributeSchema } from './components.ts';
import { badCharacterReason, findBadCharacter } from './characters.ts';

const NAME = /^[a-z0-9][a-z0-9-]{0,63}$/;
const AMOUNT_KEY = /^[a-z0-9-]{1,64}(?:\.[a-z0-9-]{1,64}){0,3}$/;

/** True for a name of a step, picture or video: small letters, digits and hyphens, at most 64. */
export function isName(value: string): boolean {
  return NAME.test(value);
}

/** True for text that has the form of an amount's key, such as `warp` or `band.sky.height`. */
export function isAmountKey(value: string): boolean {
  return value.length <= 128 && AMOUNT_KEY.test(value);
}

/** The value as it is kept (NFC, trimmed), or the reason why it cannot be kept. */
export function readAttributeValue(schema: AttributeSchema, raw: string): { ok: true; value: string } | { ok: false; reason: string } {
  const bad = findBadCharacter(raw);
  if (bad !== undefined) return { ok: false, reason: badCharacterReason(bad.code) };
  const value = raw.normalize('NFC').trim();
  switch (schema.kind) {
    case 'name':
      if (isName(value)) return { ok: true, value };
      return { ok: false, reason: 'A name has small letters, digits and hyphens only, at most 64, such as "tie-on".' };
    case 'amount':
      if (isAmountKey(value)) return { ok: true, value };
      return { ok: false, reason: 'An amount is named by words and dots, such as "warp" or "yarn.ground".' };
    case 'choice':
      if (schema.options.includes(value)) return { ok: true, value };
      return { ok: false, reason: `Choose one of these: ${schema.options.join(', ')}.` };
    case 'words':
      if (value === '' && schema.mayBeEmpty !== true) return { ok: false, reason: 'Write at least one word between the quotes.' };
      if (value.length > schema.maximum) return { ok: false, reason: `At most ${String(schema.maximum)} characters fit here; these are ${String(value.length)}.` };
      return { ok: true, value };
  }
}
