import { z } from 'astro/zod';
import { defineJob } from '#server/jobs/definition.ts';

/** Tells a student what was said of her photo, unless that was taken back; `round` is the time it was said. */
export const sendVerdict = defineJob({ type: 'send-verdict', payload: z.object({ photoId: z.number().int(), round: z.number().int() }) });
