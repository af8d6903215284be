/** The counted rows of one person on her cloth: how far up they reach, and which bands each part weaves. */
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { spreadOverParts, type PartStretch } from '#core/craft/cloth/parts-strip.ts';
import type { MadeFor } from '#core/craft/made-for.ts';
import type { WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { stretchesOf } from './bands-by-part.ts';
import { countedShare } from './counted-bands.ts';
import type { RowCounts } from './row-count.ts';

export interface CountedCloth {
  readonly stretches: readonly PartStretch[];
  /** Of the piece's bands, in mm, by their place. */
  readonly heights: readonly number[];
  /** Share of the woven height that was counted or said to be woven, 0 to 1. */
  readonly counted: number;
}

/** @param amountKeys of each part's text, in the order of the parts */
export function countedCloth(made: MadeFor, cloth: WovenPiece, amountKeys: readonly (readonly string[])[], counts: RowCounts, said: WovenSoFar): CountedCloth {
  return {
    stretches: stretchesOf(made.piece, amountKeys) ?? spreadOverParts(cloth, amountKeys.length),
    heights: cloth.bands.map(({ heightMm }) => heightMm),
    counted: countedShare(made, counts, said),
  };
}
