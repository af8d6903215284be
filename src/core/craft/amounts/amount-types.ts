/** What an amount is, and the way it was got. */
import type { Trust } from '#core/craft/trust.ts';

/**
 * How a length is shown. `size` and `fine` go to the nearest (centimetres or
 * millimetres), `least`, `fine-least` and `cut` are rounded up so that nothing comes out
 * short, `yarn` is metres or yards.
 */
export type LengthUse = 'size' | 'fine' | 'least' | 'fine-least' | 'cut' | 'yarn';

export type Quantity =
  | { readonly kind: 'length'; readonly mm: number; readonly use: LengthUse }
  | { readonly kind: 'mass'; readonly grams: number }
  | { readonly kind: 'count'; readonly count: number; readonly one: string; readonly many: string }
  | { readonly kind: 'time'; readonly hours: number; readonly low: number; readonly high: number }
  | { readonly kind: 'size'; readonly widthMm: number; readonly heightMm: number; readonly use: LengthUse };

/** What goes into an amount may also be a plain number, such as a tex, or a share, such as a margin. */
export type Input =
  | Quantity
  | { readonly kind: 'number'; readonly value: number; readonly unit?: string }
  | { readonly kind: 'share'; readonly share: number };

export interface HowReckoned {
  /** In words and signs, such as `rows × yarn of one row`. */
  readonly formula: string;
  readonly inputs: readonly { readonly name: string; readonly value: Input }[];
  /** Where the formula comes from. */
  readonly source: string;
  readonly trust: Trust;
}

/** An amount before it is asked for by a key. */
export interface Reckoned {
  /** What it is, in words: `Warp ends`. */
  readonly label: string;
  readonly quantity: Quantity;
  readonly how: HowReckoned;
}

interface AmountFacts {
  readonly key: string;
  /** What it is, in words: `Warp ends`. */
  readonly label: string;
  readonly howReckoned: HowReckoned;
}

export type Amount = Quantity & AmountFacts;

export const lengthOf = (mm: number, use: LengthUse): Quantity & { kind: 'length' } => ({ kind: 'length', mm, use });
export const massOf = (grams: number): Quantity & { kind: 'mass' } => ({ kind: 'mass', grams });
export const countOf = (count: number, one: string, many: string): Quantity & { kind: 'count' } => ({ kind: 'count', count, one, many });
