import { Job } from '#server/models/index.ts';
import { paged, type Paged } from './paging.ts';

export type JobState = Job['state'];

export interface JobInList {
  readonly id: number;
  readonly type: string;
  readonly state: JobState;
  readonly attempts: number;
  readonly maxAttempts: number;
  readonly lastError: string | null;
  readonly madeAt: Date;
  readonly nextTryAt: Date;
}

/** Jobs of one state, or all, newest first. */
export async function listJobs(state: JobState | 'all', page: number): Promise<Paged<JobInList>> {
  const where = state === 'all' ? {} : { state };
  return paged(page, await Job.count({ where }), async (limit, offset) => {
    const jobs = await Job.findAll({ where, order: [['id', 'DESC']], limit, offset, attributes: { exclude: ['payload'] } });
    return jobs.map(({ id, type, state: is, attempts, maxAttempts, lastError, createdAt, runAt }) => ({ id, type, state: is, attempts, maxAttempts, lastError, madeAt: createdAt, nextTryAt: runAt }));
  });
}
