/** Weights as people type them: `250`, `8,5`, `1 3/4 oz`, `0.6 kg`. */
import { GRAMS_PER_POUND } from '#core/craft/yarn/count.ts';
import { readTypedNumber, spellOut } from '#core/units/typed-number.ts';

export const GRAMS_PER_OUNCE = GRAMS_PER_POUND / 16;

const GRAMS_PER_UNIT = { g: 1, kg: 1000, oz: GRAMS_PER_OUNCE, lb: GRAMS_PER_POUND } as const;

export type MassUnit = keyof typeof GRAMS_PER_UNIT;

export type ParsedMass = { readonly ok: true; readonly grams: number } | { readonly ok: false; readonly reason: string };

const ONE_WEIGHT = 'Write one weight, like 12.5 or 4 7/8.';
const LONGEST_TEXT = 40;
const SHAPE = /^(?<number>[\d.,/ -]+?) ?(?<unit>[a-z]+)?$/i;

const no = (reason: string): ParsedMass => ({ ok: false, reason });
const isUnit = (word: string): word is MassUnit => Object.hasOwn(GRAMS_PER_UNIT, word);

/** Reads a weight; without a unit it is in `unit`. The reason, when it cannot be read, is a sentence for who typed it. */
export function parseMass(typed: string, unit: MassUnit): ParsedMass {
  const text = spellOut(typed);
  if (text === '') return no(`Type a weight in ${unit}.`);
  if (text.length > LONGEST_TEXT) return no('That is too long for a weight.');
  if (/^[-−–]/u.test(text)) return no('A weight cannot be below 0.');
  const { number, unit: word = unit } = SHAPE.exec(text)?.groups ?? {};
  if (number === undefined) return no(ONE_WEIGHT);
  const known = word.toLowerCase();
  if (!isUnit(known)) return no(`“${word}” is no unit we know. Write g, kg, oz or lb.`);
  const value = readTypedNumber(number.trim(), ONE_WEIGHT);
  return typeof value === 'string' ? no(value) : { ok: true, grams: value * GRAMS_PER_UNIT[known] };
}
