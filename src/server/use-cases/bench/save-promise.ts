import type { PromiseInput } from '#contracts/bench.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { Workroom } from '#server/models/index.ts';

/** Sets within how many days the teacher promises to answer a photo; students are told so at every checkpoint. */
export async function savePromise(ctx: Context, { answerDays }: PromiseInput): Promise<void> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const workroomId = found(ctx.actor.workroomId);
  await withTransaction(async () => {
    const workroom = found(await Workroom.findByPk(workroomId, { lock: true }));
    await workroom.update({ answerDays });
    await audit(ctx, 'promise-set', { kind: 'workroom', id: workroom.publicId }, { answerDays });
  });
}
