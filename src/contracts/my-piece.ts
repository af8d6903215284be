/** A student's own loom, width and yarns, as her form sends them. */
import { z } from 'astro/zod';

/** The fields of the piece itself are texts, read by core: it speaks a weaver's language. */
export const MyPieceForm = z.object({
  series: z.string().regex(/^[a-z0-9-]{1,64}$/),
  revision: z.coerce.number().int().min(0),
  /** Everything as in the pattern again. */
  asPattern: z.string().optional(),
}).catchall(z.string().catch(''));
export type MyPieceInput = z.output<typeof MyPieceForm>;
