/** A piece of any craft as something that can be drawn. */
import type { ClothPiece, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { craftOf, type Piece, type Plan } from '#core/craft/crafts.ts';

/** @param title a teacher's words, as typed */
export function clothOf(piece: Piece, plan: Plan, title: string): ClothPiece {
  return craftOf(piece).draw({ piece, plan }, title);
}

/** Only what is woven in bands can be shown as strips and as growing cloth. */
export function wovenOf(piece: Piece, plan: Plan, title: string): WovenPiece | null {
  const cloth = clothOf(piece, plan, title);
  return cloth.kind === 'woven' ? cloth : null;
}
