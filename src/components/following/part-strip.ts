// The strip beside the parts of a series: which bands each part weaves, and how far the student is.
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { spreadOverParts, type PartStretch } from '#core/craft/cloth/parts-strip.ts';
import { wovenOf } from '#core/craft/cloth-of.ts';
import type { MadeFor } from '#core/craft/made-for.ts';
import { stretchesOf } from '#core/following/bands-by-part.ts';
import { countedShare } from '#core/following/counted-bands.ts';
import { fellOf } from '#core/following/progress.ts';
import type { FollowedSeries } from '#server/queries/following/followed-series.ts';

export interface PartStrip {
  readonly piece: WovenPiece;
  readonly parts: readonly PartStretch[];
  readonly done: number;
}

/** Null for a series whose piece cannot be drawn. Without a seat all of it is shown woven. */
export function partStrip({ series, pieces, progress, amountKeys, counts }: FollowedSeries, made: MadeFor | null): PartStrip | null {
  if (made === null) return null;
  const piece = wovenOf(made.piece, made.plan, series.title);
  if (piece === null) return null;
  const parts = stretchesOf(made.piece, amountKeys) ?? spreadOverParts(piece, series.parts.length);
  const heights = piece.bands.map(({ heightMm }) => heightMm);
  return { piece, parts, done: series.seat === null ? series.parts.length : fellOf(progress, parts, heights, countedShare(made, counts, pieces.woven)).done };
}
