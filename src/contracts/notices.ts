/** Notices and nudges: what a teacher writes to her students, and what a student does with them. */
import { z } from 'astro/zod';
import { LETTER_KINDS } from '#core/notices/letter-kinds.ts';
import type { SaidBlock } from '#core/notices/said.ts';

const publicId = z.string().regex(/^[0-9a-z]{26}$/);

/** One notice of hers by its public id, or `all`. */
export const MarkReadForm = z.object({ notice: z.union([z.literal('all'), publicId]) });
export type MarkReadInput = z.output<typeof MarkReadForm>;

const ticked = z.string().optional().catch(undefined).transform((value) => value !== undefined);

/** Which letters of a workroom she wants; what is not ticked she does not. */
export const LettersForm = z.object({ workroom: publicId, source: z.enum(['account', 'notices', 'seat']), notices: ticked, nudges: ticked })
  .transform(({ workroom, source, ...kinds }) => ({ workroom, source, wanted: LETTER_KINDS.filter((kind) => kinds[kind]) }));
export type LettersInput = z.output<typeof LettersForm>;

const Run = z.object({ words: z.string(), strong: z.literal(true).optional(), href: z.string().optional() });

/** What was said, as it is kept. */
export const SaidBlocks: z.ZodType<SaidBlock[]> = z.array(z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('words'), words: z.string() }),
  z.object({ kind: z.literal('rows'), rows: z.array(z.tuple([z.string(), z.string()])) }),
  z.object({ kind: z.literal('list'), items: z.array(z.string()) }),
  z.object({ kind: z.literal('prose'), runs: z.array(Run) }),
  z.object({ kind: z.literal('points'), items: z.array(z.array(Run)) }),
]));
