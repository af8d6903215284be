import type { HidePieceInput, ShowPieceInput } from '#contracts/finish.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { Enrolment, Series, WallPiece } from '#server/models/index.ts';
import { mayTakeDown } from '#server/policies/finish.ts';

async function heldPiece({ actor }: Context, publicId: string): Promise<WallPiece> {
  const piece = found(await WallPiece.findOne({ where: { publicId }, lock: true }));
  const seat = found(await Enrolment.findByPk(piece.enrolmentId));
  const series = found(await Series.findByPk(seat.seriesId));
  authorize(mayTakeDown(actor, series.workroomId));
  return piece;
}

/**
 * Takes a piece off the wall for its maker, who reads the reason. Hung again by her, it stays hidden.
 * @throws NOT_FOUND unless the series' teacher or the steward asks.
 */
export async function hidePiece(ctx: Context, { piece: publicId, reason }: HidePieceInput): Promise<void> {
  await withTransaction(async () => {
    const piece = await heldPiece(ctx, publicId);
    if (piece.hiddenAt !== null) return;
    await piece.update({ hiddenAt: ctx.clock.now(), hiddenWhy: reason });
    await audit(ctx, 'hide-wall-piece', { kind: 'wall-piece', id: publicId }, { reason });
  });
}

/**
 * Lets a hidden piece be seen again, while its maker agrees.
 * @throws NOT_FOUND unless the series' teacher or the steward asks.
 */
export async function showPiece(ctx: Context, { piece: publicId }: ShowPieceInput): Promise<void> {
  await withTransaction(async () => {
    const piece = await heldPiece(ctx, publicId);
    if (piece.hiddenAt === null) return;
    await piece.update({ hiddenAt: null, hiddenWhy: '' });
    await audit(ctx, 'show-wall-piece', { kind: 'wall-piece', id: publicId });
  });
}
