/** What a job is: a name, the shape of its payload, how often it may be tried. The work itself is in handlers/, loaded by the worker only. */
import type { z } from 'astro/zod';

/** Films take as long as they last, folders some minutes; neither waits for the other. */
export const LONG_LANES = ['films', 'folders'] as const;
export type LongLane = (typeof LONG_LANES)[number];

export interface JobDefinition<P> {
  readonly type: string;
  readonly payload: z.ZodType<P>;
  readonly maxAttempts: number;
  /** Seconds to wait before each further try; the last one holds for all later tries. */
  readonly backoffSeconds: readonly number[];
  /** Who does it: `quick`, some at once; else one at a time of its kind beside all others, held by a lease that is renewed while it goes on. */
  readonly lane: 'quick' | LongLane;
}

export function defineJob<P>(definition: Omit<JobDefinition<P>, 'maxAttempts' | 'backoffSeconds' | 'lane'> & Partial<JobDefinition<P>>): JobDefinition<P> {
  return { maxAttempts: 8, backoffSeconds: [2, 10, 60, 300, 1_800], lane: 'quick', ...definition };
}
