import { z } from 'astro/zod';
import { defineJob } from '#server/jobs/definition.ts';

/** Hands a notice out, a few people at a time; public id. Begun again after a worker died, it goes on where it was. */
export const handOutNotice = defineJob({ type: 'hand-out-notice', payload: z.object({ notice: z.string() }) });
