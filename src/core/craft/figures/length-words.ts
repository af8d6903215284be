/** Amounts as a figure says them, exactly as the text beside it does. */
import type { LengthUse } from '#core/craft/amounts/amount-types.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

export function lengthWords(mm: number, units: Units, use: LengthUse): string {
  return amountText({ kind: 'length', mm, use }, units);
}

export function massWords(grams: number, units: Units): string {
  return amountText({ kind: 'mass', grams }, units);
}

export function countWords(count: number, one: string, many: string): string {
  return count === 1 ? `1 ${one}` : `${String(count)} ${many}`;
}
