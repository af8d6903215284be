/** What every part of the piece's form needs: the ways of changing it, which stay the same, and what is shown around its fields. */
import { createContext, useContext, type Context } from 'react';
import type { Act } from '#core/craft/piece-form/change-typed.ts';
import type { Texts, TypedRow } from '#core/craft/piece-form/typed-piece.ts';
import type { Units } from '#core/units/units.ts';

export interface Hands {
  readonly type: (field: string, text: string) => void;
  readonly act: (act: Act) => void;
  /** Where the form is sent; buttons that move rows add their place to it. */
  readonly action: string;
}

/** A row of the form has its own, so that a letter typed elsewhere does not draw it anew. */
export interface Shown {
  readonly units: Units;
  readonly yarns: readonly TypedRow[];
  /** What is asked once for the whole piece; empty within a band, whose fields have no standards by it. */
  readonly texts: Texts;
  /** A sentence for each field that stands in the way. */
  readonly wrong: ReadonlyMap<string, string>;
  /** A sentence for each field worth a look. */
  readonly heed: ReadonlyMap<string, string>;
}

export const HandsContext = createContext<Hands | null>(null);
export const ShownContext = createContext<Shown | null>(null);

function within<T>(context: Context<T | null>): T {
  const value = useContext(context);
  if (value === null) throw new Error('a part of the form stands outside of it');
  return value;
}

export const useHands = (): Hands => within(HandsContext);
export const useShown = (): Shown => within(ShownContext);
