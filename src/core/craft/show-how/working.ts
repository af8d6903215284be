/**
 * One number of a reckoning with the way it was got. Workings name each other, so that
 * every number can be followed back to what the person gave and to the standing numbers
 * the rules bring along.
 */
import type { Trust } from '#core/craft/trust.ts';

export type { Trust } from '#core/craft/trust.ts';

/** `share` is a fraction (0.02 is two per cent), `ratio` any other quotient of like things, `count` a whole number of things. */
export type WorkingUnit =
  | 'mm'
  | 'mm2'
  | 'per-mm'
  | 'per-cm'
  | 'per-inch'
  | 'm'
  | 'm-per-100g'
  | 'yd-per-lb'
  | 'tex'
  | 'g'
  | 'l'
  | 'l-per-kg'
  | 'cm3-per-g'
  | 'percent'
  | 'rad'
  | 's'
  | 'h'
  | 'per-hour'
  | 'N'
  | 'Pa'
  | 'share'
  | 'ratio'
  | 'count';

/** Exactly one of `from`, `path` and `source` says where the number comes from. */
export interface WorkingInput {
  /** As it stands in the formula. */
  readonly symbol: string;
  readonly name: string;
  readonly value: number | readonly number[];
  readonly unit: WorkingUnit;
  /** Id of the working that gave it. */
  readonly from?: string;
  /** JSON pointer to where the person gave it. */
  readonly path?: string;
  /** Of a default, or of a number the rule brings along. */
  readonly source?: string;
  readonly trust: Trust;
  /**
   * `false`: it is settled by doing it (ends that are wound, tails that are left), or so
   * little hangs on it, that it makes the result no less sure.
   */
  readonly weighs?: false;
}

export interface Working {
  /** Stable. Where the plan or the answer has the number, its path there, such as `yarns.A.netMm`. */
  readonly id: string;
  /** In plain words. */
  readonly name: string;
  /** An expression over the inputs' symbols that gives `value`, in the notation of mathjs. */
  readonly formula: string;
  readonly inputs: readonly WorkingInput[];
  readonly value: number;
  readonly unit: WorkingUnit;
  /** Where the formula comes from. */
  readonly source: string;
  /** Of the least certain thing that went in, the formula itself included. */
  readonly trust: Trust;
  /** Relative, one-sided 95 %: what to buy or allow on top so that it suffices. */
  readonly margin?: number;
}
