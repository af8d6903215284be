/** An amount as text for the eye, in the units a person chose. */
import type { Amount } from '#core/craft/amounts.ts';
import type { Units } from '#core/units/units.ts';

/**
 * A stretch of an amount's text. Markup sets `fraction` with the font's fractions;
 * joining all `text` gives the plain sentence, spaces included.
 */
export interface AmountPart {
  readonly kind: 'number' | 'fraction' | 'unit' | 'text';
  readonly text: string;
}

export function formatAmount(_amount: Amount, _units: Units): AmountPart[] {
  return [];
}
