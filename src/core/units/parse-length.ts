/**
 * Lengths as people type them: `12,5`, `12.5`, `4 7/8`, `4⅞ in`, `30 cm`, `2 ft`. Both
 * the comma and the point are decimal marks; nothing separates thousands.
 */
import { METRES_PER_YARD } from '#core/craft/yarn/count.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import { readTypedNumber, spellOut } from '#core/units/typed-number.ts';

export type ParsedLength = { readonly ok: true; readonly mm: number } | { readonly ok: false; readonly reason: string };

const MM_PER_UNIT = {
  mm: 1,
  cm: 10,
  m: 1000,
  in: MM_PER_INCH,
  ft: 12 * MM_PER_INCH,
  yd: 1000 * METRES_PER_YARD,
} as const;

export type LengthUnit = keyof typeof MM_PER_UNIT;

const UNIT_WORDS: ReadonlyMap<string, LengthUnit> = new Map([
  ['mm', 'mm'],
  ['cm', 'cm'],
  ['m', 'm'],
  ['in', 'in'],
  ['in.', 'in'],
  ['inch', 'in'],
  ['inches', 'in'],
  ['"', 'in'],
  ['″', 'in'],
  ['”', 'in'],
  ['ft', 'ft'],
  ['foot', 'ft'],
  ['feet', 'ft'],
  ["'", 'ft'],
  ['′', 'ft'],
  ['’', 'ft'],
  ['yd', 'yd'],
  ['yard', 'yd'],
  ['yards', 'yd'],
]);

const ONE_LENGTH = 'Write one length, like 12.5 or 4 7/8.';
const LONGEST_TEXT = 40;
const SHAPE = /^(?<number>[\d.,/ -]+?) ?(?<unit>[a-z.]+|["″”'′’])?$/i;

const no = (reason: string): ParsedLength => ({ ok: false, reason });

/**
 * Reads a length; without a unit it is in `unit`. The reason, when it cannot be read, is
 * a sentence for the person who typed it.
 */
export function parseLength(typed: string, unit: LengthUnit): ParsedLength {
  const text = spellOut(typed);
  if (text === '') return no(`Type a length in ${unit}.`);
  if (text.length > LONGEST_TEXT) return no('That is too long for a length.');
  if (/^[-−–]/u.test(text)) return no('A length cannot be below 0.');
  const { number, unit: unitWord } = SHAPE.exec(text)?.groups ?? {};
  if (number === undefined) return no(ONE_LENGTH);
  const known = unitWord === undefined ? unit : UNIT_WORDS.get(unitWord.toLowerCase());
  if (known === undefined) return no(`“${unitWord ?? ''}” is no unit we know. Write mm, cm, m, in, ft or yd.`);
  const value = readTypedNumber(number.trim(), ONE_LENGTH);
  return typeof value === 'string' ? no(value) : { ok: true, mm: value * MM_PER_UNIT[known] };
}
