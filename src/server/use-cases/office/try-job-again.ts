import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { Job } from '#server/models/index.ts';
import { maySeeOffice } from '#server/policies/workroom.ts';

/**
 * Puts a job that was given up back into the queue, with all its tries before it.
 * @throws NOT_FOUND unless the steward asks; CONFLICT when it was not given up.
 */
export async function tryJobAgain(ctx: Context, { job: id }: { readonly job: number }): Promise<void> {
  authorize(maySeeOffice(ctx.actor));
  await withTransaction(async () => {
    const job = found(await Job.findByPk(id, { lock: true }));
    if (job.state !== 'dead') throw new AppError('CONFLICT', { says: 'This job was not given up: it is done, or waits to be.' });
    await job.update({ state: 'ready', attempts: 0, runAt: ctx.clock.now(), lastError: null });
    await audit(ctx, 'try-job-again', { kind: 'job', id: String(id) });
  });
}
