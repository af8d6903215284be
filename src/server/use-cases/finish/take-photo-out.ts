import type { SaySoInput } from '#contracts/finish.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { heldRow, writableBy } from './_finished-row.ts';
import { offWall } from './_off-wall.ts';
import { forgetPhoto } from './_forget-photo.ts';

/**
 * Takes the photo of her finished piece away for good, and the piece off the wall.
 * @throws as `writableBy`.
 */
export async function takePhotoOut(ctx: Context, { series }: SaySoInput): Promise<void> {
  const { seat } = await writableBy(ctx, series);
  const before = await withTransaction(async () => {
    const row = await heldRow(seat.enrolmentId);
    const { mediaId } = row;
    await row.update({ mediaId: null });
    await offWall(ctx, seat.enrolmentId);
    return mediaId;
  });
  await forgetPhoto(ctx.services.media, before);
}
