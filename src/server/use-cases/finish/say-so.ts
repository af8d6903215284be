import type { SaySoInput } from '#contracts/finish.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { found, signedIn } from '#server/errors.ts';
import { finishedPiece } from '#server/queries/finish/finished-piece.ts';
import { heldRow } from './_finished-row.ts';

/**
 * She says that her piece is off the loom, whatever the parts say. It opens her own page of it and nothing else: no
 * part is done by it.
 * @throws UNAUTHENTICATED; NOT_FOUND without a seat.
 */
export async function saySo(ctx: Context, { series }: SaySoInput): Promise<void> {
  const { seat, mayWriteDown } = found(await finishedPiece(signedIn(ctx), series, ctx.clock.now()));
  if (mayWriteDown) return;
  await withTransaction(async () => {
    await (await heldRow(seat.enrolmentId)).update({ saidAt: ctx.clock.now() });
  });
}
