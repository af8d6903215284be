/** Small things the worker does now and then. */
import { sessionAdapter } from '#server/auth/lucia.ts';
import type { WorkerOptions } from '#server/jobs/worker.ts';
import { forgetOldCounters } from '#server/web/rate-limit.ts';

const HOUR = 3_600;

export const CHORES: WorkerOptions['chores'] = [
  { everySeconds: HOUR, run: () => sessionAdapter.deleteExpiredSessions() },
  { everySeconds: HOUR, run: () => forgetOldCounters() },
];
