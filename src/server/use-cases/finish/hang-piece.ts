import type { HangInput } from '#contracts/finish.ts';
import { WALL_CONSENT } from '#core/finish/wall-consent.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError } from '#server/errors.ts';
import { WallPiece } from '#server/models/index.ts';
import { heldRow, writableBy } from './_finished-row.ts';

/**
 * Hangs her finished piece on the shared wall, as she agreed. One that was taken down by somebody else stays down.
 * @throws as `writableBy`; CONFLICT before every part is done, and without a photo.
 */
export async function hangPiece(ctx: Context, { series, name, words }: HangInput): Promise<void> {
  const { seat, hasFinished } = await writableBy(ctx, series);
  if (!hasFinished) throw new AppError('CONFLICT', { says: 'The wall shows pieces of finishers. A part of this series is not done yet.' });
  await withTransaction(async () => {
    const { mediaId } = await heldRow(seat.enrolmentId);
    if (mediaId === null) throw new AppError('CONFLICT', { says: 'The wall shows your photo. Put one in its place above, then hang it.' });
    const shown = { mediaId, shownName: name, words, agreedAt: ctx.clock.now(), agreedTo: WALL_CONSENT.version, withdrawnAt: null };
    const before = await WallPiece.findOne({ where: { enrolmentId: seat.enrolmentId } });
    if (before === null) await WallPiece.create({ enrolmentId: seat.enrolmentId, ...shown });
    else await before.update(shown);
  });
}
