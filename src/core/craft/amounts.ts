/** Amounts a text or a gathering list can ask of a plan by name, each with the way it was got. */
import { fail, type Outcome } from '#core/outcome.ts';
import type { Piece } from '#core/craft/piece.ts';
import type { Plan } from '#core/craft/plan.ts';

/** Where the least certain input came from: counted by the person, read off a label, computed, or taken from a table. */
export type Trust = 'measured' | 'label' | 'formula' | 'class';

export interface HowReckoned {
  /** In words and signs, such as `rows × pick length`. */
  readonly formula: string;
  readonly inputs: readonly { readonly name: string; readonly value: string }[];
  /** Where the formula comes from. */
  readonly source: string;
  readonly trust: Trust;
}

/** How a length is shown: a size to the nearest, a least size or a cut length rounded up, yarn in metres. */
export type LengthUse = 'size' | 'least' | 'cut' | 'yarn';

interface AmountFacts {
  readonly key: string;
  /** What it is, in words: `Warp ends`. */
  readonly label: string;
  readonly howReckoned: HowReckoned;
}

export type Amount = AmountFacts &
  (
    | { readonly kind: 'length'; readonly mm: number; readonly use: LengthUse }
    | { readonly kind: 'mass'; readonly grams: number }
    | { readonly kind: 'count'; readonly count: number; readonly one: string; readonly many: string }
    | { readonly kind: 'time'; readonly hours: number; readonly low: number; readonly high: number }
    | { readonly kind: 'size'; readonly widthMm: number; readonly heightMm: number; readonly use: LengthUse }
  );

/** Every key, with `<role>` and `<name>` standing for a yarn role and a band's name. */
export const AMOUNT_KEYS = [
  'ends', 'nails', 'spacing', 'width', 'height', 'wound-width', 'loom.width', 'loom.height',
  'warp', 'warp.mass', 'warp.balls',
  'yarn.<role>', 'yarn.<role>.mass', 'yarn.<role>.balls',
  'band.<name>.height', 'band.<name>.rows', 'band.<name>.knots', 'band.<name>.stitches',
  'band.<name>.strands', 'band.<name>.cut', 'band.<name>.yarn',
  'spacer.width', 'spacer.height', 'dowel.length', 'dowel.diameter', 'cord',
  'hours', 'mass', 'pick', 'rows-per-load',
] as const;

/** The amount a key names for this piece; a key no plan gives is `E_ENUM`. */
export function amountOf(key: string, _piece: Piece, _plan: Plan): Outcome<Amount> {
  return fail([{ code: 'E_ENUM', path: '', message: `No amount is called “${key}”.` }]);
}
