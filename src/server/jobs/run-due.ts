/** One round of the worker: claims due jobs, does them, writes down how each ended. */
import type { Context } from '#server/context.ts';
import { LONG_LANES, type LongLane } from '#server/jobs/definition.ts';
import type { Held, RegisteredJob } from '#server/jobs/handlers/index.ts';
import { claimDue, finishDead, finishDone, finishLater, renewLease } from '#server/jobs/leases.ts';
import { Job } from '#server/models/index.ts';

const LEASE_SECONDS = 300;
/** A long job whose worker died is taken over soon, since a living one renews its lease. */
const LONG_LEASE_SECONDS = 60;
const RENEW_SECONDS = 15;

const typesIn = (lanes: readonly LongLane[], jobs: readonly RegisteredJob[]): string[] => jobs.filter(({ definition: { lane } }) => lane !== 'quick' && lanes.includes(lane)).map(({ definition }) => definition.type);

/** Does what is due of the quick jobs. @returns how many were claimed. */
export async function runDueJobs(ctx: Context, owner: string, jobs: readonly RegisteredJob[], limit = 4): Promise<number> {
  const claims = await claimDue('jobs', owner, limit, LEASE_SECONDS, { not: typesIn(LONG_LANES, jobs) });
  const never = new AbortController().signal;
  await Promise.all(claims.map(({ id, attempts }) => runOne(ctx, owner, jobs, id, { attempts, signal: never })));
  return claims.length;
}

/**
 * Does one job of a long lane, holding it as long as it takes. When `signal` aborts, or another worker took it over, it is dropped
 * where it stands; whoever claims it next begins it anew.
 * @returns how many were claimed.
 */
export async function runLongJob(ctx: Context, lane: LongLane, owner: string, jobs: readonly RegisteredJob[], signal: AbortSignal): Promise<number> {
  const types = typesIn([lane], jobs);
  const [claim] = types.length === 0 ? [] : await claimDue('jobs', owner, 1, LONG_LEASE_SECONDS, { only: types });
  if (claim === undefined) return 0;
  const lost = new AbortController();
  const renewing = setInterval(() => {
    void renewLease('jobs', owner, claim.id, LONG_LEASE_SECONDS).then((held) => { if (!held) lost.abort(new Error('another worker holds this job now')); }, () => undefined);
  }, RENEW_SECONDS * 1_000);
  try {
    await runOne(ctx, owner, jobs, claim.id, { attempts: claim.attempts, signal: AbortSignal.any([signal, lost.signal]) });
  } finally {
    clearInterval(renewing);
  }
  return 1;
}

async function runOne(ctx: Context, owner: string, jobs: readonly RegisteredJob[], id: number, held: Held & { readonly attempts: number }): Promise<void> {
  const job = await Job.findByPk(id);
  if (job === null) return;
  const registered = jobs.find(({ definition }) => definition.type === job.type);
  if (registered === undefined) {
    await finishDead('jobs', owner, id, `no handler for ${job.type}`);
    return;
  }
  const { maxAttempts, backoffSeconds } = registered.definition;
  const { attempts } = held;
  const giveUp = async (why: string): Promise<void> => {
    if (await finishDead('jobs', owner, id, why)) await registered.gaveUp?.(ctx, job.payload);
  };
  // Claimed more often than tried to its end: the work took its worker down each time.
  if (attempts > maxAttempts) {
    await giveUp(job.lastError ?? 'the worker ended while doing this');
    return;
  }
  try {
    await registered.run(ctx, job.payload, held);
    await finishDone('jobs', owner, id);
  } catch (error) {
    // A stopping worker gives back what it holds.
    if (held.signal.aborted) return;
    const message = error instanceof Error ? error.message : String(error);
    console.error(JSON.stringify({ level: 'error', job: job.type, id, attempts, message: error instanceof Error ? error.stack : message }));
    if (attempts >= maxAttempts) await giveUp(message);
    else await finishLater('jobs', owner, id, backoffSeconds[Math.min(attempts, backoffSeconds.length) - 1] ?? 60, message);
  }
}
