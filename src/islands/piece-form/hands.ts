/** What every part of the piece's form needs: what is typed, what was found in it, and the ways of changing it. */
import { createContext, useContext } from 'react';
import type { Act } from '#core/craft/piece-form/change-typed.ts';
import type { TypedPiece } from '#core/craft/piece-form/typed-piece.ts';

export interface Hands {
  readonly typed: TypedPiece;
  /** A sentence for each field that stands in the way. */
  readonly wrong: ReadonlyMap<string, string>;
  /** A sentence for each field worth a look. */
  readonly heed: ReadonlyMap<string, string>;
  readonly type: (field: string, text: string) => void;
  readonly act: (act: Act) => void;
  /** Where the form is sent; buttons that move rows add their place to it. */
  readonly action: string;
}

export const HandsContext = createContext<Hands | null>(null);

export function useHands(): Hands {
  const hands = useContext(HandsContext);
  if (hands === null) throw new Error('a part of the form stands outside of it');
  return hands;
}
