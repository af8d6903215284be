/** The worker's day: jobs and letters as they fall due, small chores now and then, until it is told to stop. */
import { hostname } from 'node:os';
import { setTimeout as pause } from 'node:timers/promises';
import { randomUUID } from 'node:crypto';
import { systemClock, type Context } from '#server/context.ts';
import { LONG_LANES, type LongLane } from '#server/jobs/definition.ts';
import type { RegisteredJob } from '#server/jobs/handlers/index.ts';
import { releaseAll } from '#server/jobs/leases.ts';
import { runDueJobs, runLongJob } from '#server/jobs/run-due.ts';
import { sendDueMails, type PostOffice } from '#server/mail/send-due.ts';
import { services } from '#server/services.ts';

export interface WorkerOptions {
  readonly jobs: readonly RegisteredJob[];
  readonly office: PostOffice;
  /** Small things done every `everySeconds`, e.g. forgetting old counters. */
  readonly chores: readonly { readonly everySeconds: number; run(ctx: Context): Promise<void> }[];
  readonly signal: AbortSignal;
}

const IDLE_MS = 400;
const TROUBLE_MS = 3_000;

export function workerContext(): Context {
  return { actor: null, requestId: `worker-${randomUUID()}`, ip: '127.0.0.1', clock: systemClock, services: services() };
}

/** Works until `signal` aborts; then finishes the quick things it holds, drops the long ones, and gives back the rest. */
export async function work(options: WorkerOptions): Promise<void> {
  const owner = `${hostname().slice(0, 20).replace(/[^\x21-\x7e]/g, '')}-${process.pid}-${randomUUID().slice(0, 8)}`;
  await Promise.all([quickLane(options, owner), ...LONG_LANES.map((lane) => longLane(lane, options, owner))]);
  await Promise.all([releaseAll('jobs', owner), releaseAll('mails', owner)]);
}

/** What takes minutes or hours, one at a time; no letter waits for that. */
async function longLane(lane: LongLane, { jobs, signal }: WorkerOptions, owner: string): Promise<void> {
  while (!signal.aborted) {
    const claimed = await runLongJob(workerContext(), lane, owner, jobs, signal).catch((error: unknown) => tellTrouble(owner, error, signal));
    if (claimed === 0) await pause(IDLE_MS, undefined, { signal }).catch(() => undefined);
  }
}

/** The database may be starting again; nothing that was claimed is lost, its lease runs out. */
async function tellTrouble(owner: string, error: unknown, signal: AbortSignal): Promise<number> {
  console.error(JSON.stringify({ level: 'error', worker: owner, message: error instanceof Error ? error.message : String(error) }));
  await pause(TROUBLE_MS, undefined, { signal }).catch(() => undefined);
  return 0;
}

async function quickLane(options: WorkerOptions, owner: string): Promise<void> {
  const due = options.chores.map((chore) => ({ chore, at: 0 }));
  while (!options.signal.aborted) {
    let claimed = 0;
    try {
      claimed += await runDueJobs(workerContext(), owner, options.jobs);
      claimed += await sendDueMails(options.office, owner);
      for (const entry of due) {
        if (Date.now() < entry.at) continue;
        entry.at = Date.now() + entry.chore.everySeconds * 1_000;
        await entry.chore.run(workerContext());
      }
    } catch (error) {
      await tellTrouble(owner, error, options.signal);
    }
    if (claimed === 0) await pause(IDLE_MS, undefined, { signal: options.signal }).catch(() => undefined);
  }
}
