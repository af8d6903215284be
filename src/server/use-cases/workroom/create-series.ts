import type { NewSeriesInput } from '#contracts/workroom.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { Series, Workroom } from '#server/models/index.ts';
import { freeAddress } from '#server/use-cases/series/_free-address.ts';

/** Makes an empty draft series in the asker's workroom. Its address comes from its title; one that is taken gets a few letters more. */
export async function createSeries(ctx: Context, input: NewSeriesInput): Promise<Series> {
  authorize(ctx.actor !== null && ctx.actor.workroomId !== null, 'FORBIDDEN');
  const workroom = found(await Workroom.findByPk(ctx.actor.workroomId));
  return withTransaction(async () => {
    const slug = await freeAddress(input.title);
    return Series.create({ workroomId: workroom.id, slug, title: input.title, craft: input.craft, currency: workroom.currency });
  });
}
