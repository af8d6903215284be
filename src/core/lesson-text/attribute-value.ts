// Judging the value of one attribute: the same rules for what a writer types and for what a stored tree holds.
import type { AttributeSchema } from './components.ts';
import { isAmountKey } from './amount-key.ts';
import { badCharacterReason, findBadCharacter } from './characters.ts';

const NAME = /^[a-z0-9][a-z0-9-]{0,63}$/;

/** True for a name of a step, picture or video: small letters, digits and hyphens, at most 64. */
export function isName(value: string): boolean {
  return NAME.test(value);
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
      return { ok: false, reason: 'No plan has an amount of that name. Write it like "warp", "ends", "yarn.ground" or "band.sky.height".' };
    case 'choice':
      if (schema.options.includes(value)) return { ok: true, value };
      return { ok: false, reason: `Choose one of these: ${schema.options.join(', ')}.` };
    case 'words':
      if (value === '' && schema.mayBeEmpty !== true) return { ok: false, reason: 'Write at least one word between the quotes.' };
      if (value.length > schema.maximum) return { ok: false, reason: `At most ${String(schema.maximum)} characters fit here; these are ${String(value.length)}.` };
      return { ok: true, value };
  }
}
