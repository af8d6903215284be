/** What a job is: a name, the shape of its payload, how often it may be tried. The work itself is in handlers/, loaded by the worker only. */
import type { z } from 'astro/zod';

export interface JobDefinition<P> {
  readonly type: string;
  readonly payload: z.ZodType<P>;
  readonly maxAttempts: number;
  /** Seconds to wait before each further try; the last one holds for all later tries. */
  readonly backoffSeconds: readonly number[];
}

export function defineJob<P>(definition: Omit<JobDefinition<P>, 'maxAttempts' | 'backoffSeconds'> & Partial<JobDefinition<P>>): JobDefinition<P> {
  return { maxAttempts: 8, backoffSeconds: [2, 10, 60, 300, 1_800], ...definition };
}
