import type { NewSeriesInput } from '#contracts/workroom.ts';
import { slugOf } from '#core/lesson-text/slugs.ts';
import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { Series, Workroom } from '#server/models/index.ts';

/** Makes an empty draft series in the asker's workroom. Its address comes from its title; one that is taken gets a few letters more. */
export async function createSeries(ctx: Context, input: NewSeriesInput): Promise<Series> {
  authorize(ctx.actor !== null && ctx.actor.workroomId !== null, 'FORBIDDEN');
  const workroom = found(await Workroom.findByPk(ctx.actor.workroomId));
  const base = slugOf(input.title).replace(/[^a-z0-9-]/g, '').replace(/^-+|-+$/g, '').slice(0, 50) || 'series';
  return withTransaction(async () => {
    const taken = await Series.count({ where: { slug: base } });
    const slug = taken === 0 ? base : `${base}-${newPublicId().slice(-5)}`;
    return Series.create({ workroomId: workroom.id, slug, title: input.title, craft: input.craft, currency: workroom.currency });
  });
}
