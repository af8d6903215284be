import { z } from 'astro/zod';
import { defineJob } from '#server/jobs/definition.ts';

/** Probes an uploaded video and makes of it what browsers play. Takes as long as the film, so it has a lane of its own. */
export const processVideo = defineJob({ type: 'process-video', payload: z.object({ video: z.string() }), maxAttempts: 4, lane: 'films' });
