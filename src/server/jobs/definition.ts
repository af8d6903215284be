/** What a job is: a name, the shape of its payload, how often it may be tried. The work itself is in handlers/, loaded by the worker only. */
import type { z } from 'astro/zod';

export interface JobDefinition<P> {
  readonly type: string;
  readonly payload: z.ZodType<P>;
  readonly maxAttempts: number;
  /** Seconds to wait before each further try; the last one holds for all later tries. */
  readonly backoffSeconds: readonly number[];
  /** Takes minutes or hours: done one at a time beside the quick ones, held by a lease that is renewed while it goes on. */
  readonly isLong: boolean;
}

export function defineJob<P>(definition: Omit<JobDefinition<P>, 'maxAttempts' | 'backoffSeconds' | 'isLong'> & Partial<JobDefinition<P>>): JobDefinition<P> {
  return { maxAttempts: 8, backoffSeconds: [2, 10, 60, 300, 1_800], isLong: false, ...definition };
}
