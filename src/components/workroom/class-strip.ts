/** The strip of a class: the teacher's piece, and which of its bands each part weaves. */
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { spreadOverParts, type PartStretch } from '#core/craft/cloth/parts-strip.ts';
import { wovenOf } from '#core/craft/cloth-of.ts';
import { planPiece } from '#core/craft/plan.ts';
import { stretchesOf } from '#core/following/bands-by-part.ts';
import type { ClassSeries } from '#server/queries/workroom/class-of.ts';

export interface ClassStrip {
  readonly piece: WovenPiece;
  readonly parts: readonly PartStretch[];
}

/** Null while the piece is not described, cannot be made, or is not woven in bands. */
export function classStrip({ piece, title, parts }: ClassSeries): ClassStrip | null {
  const plan = piece === null ? null : planPiece(piece);
  if (piece === null || plan?.ok !== true) return null;
  const cloth = wovenOf(piece, plan.value, title);
  return cloth && { piece: cloth, parts: stretchesOf(piece, parts.map(({ amountKeys }) => amountKeys)) ?? spreadOverParts(cloth, parts.length) };
}
