/** Notices and nudges: what a teacher writes to her students, and what a student does with them. */
import { z } from 'astro/zod';

const publicId = z.string().regex(/^[0-9a-z]{26}$/);

/** One notice of hers by its public id, or `all`. */
export const MarkReadForm = z.object({ notice: z.union([z.literal('all'), publicId]) });
export type MarkReadInput = z.output<typeof MarkReadForm>;
