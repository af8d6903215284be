/** What a form asks: for each field its key, its kind and its words. */
import type { Texts } from './typed-piece.ts';

export interface Option {
  /** What the form sends. */
  readonly text: string;
  /** What it stands for in the piece. */
  readonly value: string | number | boolean;
  readonly label: string;
}

interface AskedWords {
  /** Place of the value below its owner, dotted: `size.widthMm`. */
  readonly key: string;
  readonly label: string;
  /** How sentences call it, where that is not the label. */
  readonly called?: string;
  readonly hint?: string;
  /** It must be filled in. */
  readonly needed?: true;
  /** What counts where it stays empty, as a value of the piece, by what is asked once; shown beside the field. */
  readonly standard?: (texts: Texts) => number;
  /** The same in words, where it is no number. */
  readonly otherwise?: string;
  /** What a new row begins with, as a value of the piece. */
  readonly starter?: number;
}

/**
 * `length` is typed in cm or in, `fine` in mm or in, `yarn` in m or yd, and all are millimetres in the piece. A `lean`
 * is a length that may be below 0. A `mass` is typed in g or oz and is grams. `points` are pairs of such lengths, `0 : 0; 12 : 0; 6 : 9`, across and up. A `share` is typed in per cent and is a fraction in the piece. A `role` is chosen
 * among the yarns of the form.
 */
export type Asked = AskedWords &
  (
    | { readonly kind: 'length' | 'fine' | 'yarn' | 'lean' | 'mass' | 'points' | 'share' | 'role' }
    | { readonly kind: 'number'; readonly unit?: string }
    | { readonly kind: 'text'; readonly maxLength: number }
    /** The first option counts where nothing is chosen, unless `needed`. */
    | { readonly kind: 'choice'; readonly options: readonly [Option, ...Option[]] }
  );

export type AskedKind = Asked['kind'];
/** What is asked for with a number. */
export type AskedMeasure = Asked & { readonly kind: 'length' | 'fine' | 'yarn' | 'lean' | 'mass' | 'share' | 'number' };

/** An option that stands for its own text. */
export const option = (text: string, label: string): Option => ({ text, value: text, label });
