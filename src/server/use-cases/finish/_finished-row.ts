import type { Context } from '#server/context.ts';
import { AppError, found, signedIn } from '#server/errors.ts';
import { Enrolment, FinishedPiece } from '#server/models/index.ts';
import { finishedPiece, type FinishedPieceFor } from '#server/queries/finish/finished-piece.ts';

/**
 * The piece of the one who asks, when she may write something down of it.
 * @throws UNAUTHENTICATED; NOT_FOUND without a seat; CONFLICT while it is neither finished nor said to be.
 */
export async function writableBy(ctx: Context, slug: string): Promise<FinishedPieceFor> {
  const piece = found(await finishedPiece(signedIn(ctx), slug, ctx.clock.now()));
  if (!piece.mayWriteDown) throw new AppError('CONFLICT', { says: 'A part of this series is not done yet. Finish it, or say that your piece is off the loom.' });
  return piece;
}

/** The row of a seat, made where there is none. Holds the seat: call it first in a transaction. */
export async function heldRow(enrolmentId: number): Promise<FinishedPiece> {
  const seat = await Enrolment.findByPk(enrolmentId, { lock: true });
  if (seat?.state !== 'active') throw new AppError('GONE', { says: 'Your seat has ended meanwhile. Nothing was kept.' });
  return (await FinishedPiece.findByPk(enrolmentId)) ?? FinishedPiece.create({ enrolmentId });
}
