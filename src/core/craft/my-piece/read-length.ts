import { lengthOf } from '#core/craft/amounts/amount-types.ts';
import { readText } from '#core/craft/piece-form/field-text.ts';
import { textOf, type Texts } from '#core/craft/piece-form/typed-piece.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import type { AskedLength } from './asked-of-mine.ts';

const limitText = (mm: number, { kind }: AskedLength, units: Units): string => amountText(lengthOf(mm, kind === 'fine' ? 'fine' : 'size'), units);

/** Undefined for an empty field, and, with a sentence in `faults`, for one that cannot be: `3 mm` is a length, but no loom. */
export function readLength({ texts, units }: { readonly texts: Texts; readonly units: Units }, asked: AskedLength, faults: Map<string, string>): number | undefined {
  const text = textOf(texts, asked.key);
  if (text.trim() === '') return undefined;
  const read = readText(text, asked, units);
  if (!read.ok) {
    faults.set(asked.key, read.says);
    return undefined;
  }
  const { least, most, below, above } = asked.plausible;
  const [leastMm, mostMm] = [least[units], most[units]];
  if (read.value >= leastMm && read.value <= mostMm) return read.value;
  faults.set(asked.key, `${read.value < leastMm ? below : above} Between ${limitText(leastMm, asked, units)} and ${limitText(mostMm, asked, units)} works.`);
  return undefined;
}
