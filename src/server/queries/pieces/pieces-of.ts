/** The piece of a series, as its teacher describes it and as a student changed it for herself. */
import type { MyPiece } from '#core/craft/fit.ts';
import type { Piece } from '#core/craft/crafts.ts';
import { MyPieceRow, PatternPiece } from '#server/models/index.ts';

export interface PiecesOf {
  readonly pattern: Piece | null;
  /** Empty when she changed nothing. */
  readonly mine: MyPiece;
  /** Counts her changes; a form sends it back, so that two tabs do not undo each other. */
  readonly revision: number;
}

/** `enrolmentId` null: only the pattern. */
export async function piecesOf(seriesId: number, enrolmentId: number | null): Promise<PiecesOf> {
  const [pattern, mine] = await Promise.all([
    PatternPiece.findByPk(seriesId),
    enrolmentId === null ? null : MyPieceRow.findByPk(enrolmentId),
  ]);
  return { pattern: pattern?.data ?? null, mine: mine?.data ?? {}, revision: mine?.revision ?? 0 };
}
