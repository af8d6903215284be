/** The piece of a series, as its teacher describes it and as a student changed it for herself. */
import type { MyPiece } from '#core/craft/fit.ts';
import type { Piece } from '#core/craft/crafts.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { MyPieceRow, PatternPiece } from '#server/models/index.ts';

export interface PiecesOf {
  readonly pattern: Piece | null;
  /** Empty when she changed nothing. */
  readonly mine: MyPiece;
  /** How far she has woven it. */
  readonly woven: WovenSoFar;
  /** Counts her changes; a form sends it back, so that two tabs do not undo each other. */
  readonly revision: number;
}

/** `enrolmentId` null: only the pattern. */
export async function piecesOf(seriesId: number, enrolmentId: number | null): Promise<PiecesOf> {
  const [pattern, mine] = await Promise.all([
    PatternPiece.findByPk(seriesId),
    enrolmentId === null ? null : MyPieceRow.findByPk(enrolmentId),
  ]);
  return { pattern: pattern?.data ?? null, mine: mine?.data ?? {}, woven: mine?.woven ?? NOTHING_WOVEN, revision: mine?.revision ?? 0 };
}
