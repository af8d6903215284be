import { z } from 'astro/zod';
import { defineJob } from '#server/jobs/definition.ts';

/** Brings in a series folder that has arrived; public id of its import. Waits behind other folders, never behind films. */
export const bringInFolder = defineJob({ type: 'bring-in-folder', payload: z.object({ folder: z.string() }), maxAttempts: 4, lane: 'folders' });
