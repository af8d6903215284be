import { z } from 'astro/zod';
import { defineJob } from '#server/jobs/definition.ts';

/** Looks up whose address it is and writes her the letter: out of the request, so that its answer takes as long for every address. */
export const sendPasswordLink = defineJob({ type: 'send-password-link', payload: z.object({ addressKey: z.string() }) });
