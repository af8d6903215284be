import { Transaction } from 'sequelize';
import type { StashInput } from '#contracts/following.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found, signedIn } from '#server/errors.ts';
import { Enrolment, KeptStash } from '#server/models/index.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';

/** Keeps what a student has of the yarns on her list; of a yarn that is not named nothing changes. */
export async function keepStash(ctx: Context, { series: slug, has }: StashInput): Promise<void> {
  const { seat } = found(await seriesFor(signedIn(ctx), slug, ctx.clock.now()));
  authorize(seat !== null);
  const { enrolmentId } = seat;
  await withTransaction(async () => {
    await Enrolment.findByPk(enrolmentId, { lock: Transaction.LOCK.UPDATE });
    await KeptStash.destroy({ where: { enrolmentId, yarnKey: has.map(({ yarn }) => yarn) } });
    await KeptStash.bulkCreate(has.flatMap(({ yarn, stash }) => (stash === null ? [] : [{ enrolmentId, yarnKey: yarn, ...stash }])));
  });
}
