import type { SaySoInput } from '#contracts/finish.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { found, signedIn } from '#server/errors.ts';
import { Enrolment, Series } from '#server/models/index.ts';
import { offWall } from './_off-wall.ts';

/**
 * Takes her piece off the wall, whatever became of her seat or of the series since.
 * @throws UNAUTHENTICATED; NOT_FOUND when she never had a seat in it.
 */
export async function takeOffWall(ctx: Context, { series: slug }: SaySoInput): Promise<void> {
  const { userId } = signedIn(ctx);
  const series = found(await Series.findOne({ where: { slug } }));
  await withTransaction(async () => {
    const seat = found(await Enrolment.findOne({ where: { userId, seriesId: series.id }, lock: true }));
    await offWall(ctx, seat.id);
  });
}
