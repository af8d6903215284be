/** The strip of a class: the teacher's piece, and which of its bands each part weaves. */
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { spreadOverParts, type PartStretch } from '#core/craft/cloth/parts-strip.ts';
import { planPiece } from '#core/craft/plan.ts';
import { bandsByPart } from '#core/following/bands-by-part.ts';
import type { ClassSeries } from '#server/queries/workroom/class-of.ts';

export interface ClassStrip {
  readonly piece: WovenPiece;
  readonly parts: readonly PartStretch[];
}

/** Null while the piece is not described, or cannot be woven. */
export function classStrip({ piece, title, parts }: ClassSeries): ClassStrip | null {
  const plan = piece === null ? null : planPiece(piece);
  if (piece === null || plan?.ok !== true) return null;
  const cloth = clothPieceOf(piece, plan.value, title);
  return { piece: cloth, parts: bandsByPart(piece.bands, parts.map(({ amountKeys }) => amountKeys)) ?? spreadOverParts(cloth, parts.length) };
}
