/** One round of the worker: claims due jobs, does them, writes down how each ended. */
import type { Context } from '#server/context.ts';
import type { RegisteredJob } from '#server/jobs/handlers/index.ts';
import { claimDue, finishDead, finishDone, finishLater } from '#server/jobs/leases.ts';
import { Job } from '#server/models/index.ts';

const LEASE_SECONDS = 300;

/** @returns how many jobs were claimed. */
export async function runDueJobs(ctx: Context, owner: string, jobs: readonly RegisteredJob[], limit = 4): Promise<number> {
  const claims = await claimDue('jobs', owner, limit, LEASE_SECONDS);
  await Promise.all(claims.map(({ id, attempts }) => runOne(ctx, owner, jobs, id, attempts)));
  return claims.length;
}

async function runOne(ctx: Context, owner: string, jobs: readonly RegisteredJob[], id: number, attempts: number): Promise<void> {
  const job = await Job.findByPk(id);
  if (job === null) return;
  const registered = jobs.find(({ definition }) => definition.type === job.type);
  if (registered === undefined) {
    await finishDead('jobs', owner, id, `no handler for ${job.type}`);
    return;
  }
  try {
    await registered.run(ctx, job.payload);
    await finishDone('jobs', owner, id);
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    console.error(JSON.stringify({ level: 'error', job: job.type, id, attempts, message: error instanceof Error ? error.stack : message }));
    const { maxAttempts, backoffSeconds } = registered.definition;
    if (attempts >= maxAttempts) await finishDead('jobs', owner, id, message);
    else await finishLater('jobs', owner, id, backoffSeconds[Math.min(attempts, backoffSeconds.length) - 1] ?? 60, message);
  }
}
