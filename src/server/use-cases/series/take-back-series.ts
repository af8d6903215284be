import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

/** Takes a series back to draft: nobody can buy it any more; who has a seat keeps what she has. */
export async function takeBackSeries(ctx: Context, slug: string): Promise<void> {
  const known = found(await Series.findOne({ where: { slug } }));
  authorize(mayTeachIn(ctx.actor, known.workroomId));
  await withTransaction(async () => {
    const series = found(await Series.findByPk(known.id, { lock: true }));
    await series.update({ state: 'draft' });
    await audit(ctx, 'take-back-series', { kind: 'series', id: series.publicId });
  });
}
