/** The form of a pattern piece. Its fields are read by `core/craft/piece-form`; here stands what goes with them. */
import { z } from 'astro/zod';

export const PieceForm = z.object({
  series: z.string().regex(/^[a-z0-9-]{1,64}$/),
  /** Of the piece the form was drawn from; 0 when there was none. */
  revision: z.coerce.number().int().min(0),
}).catchall(z.union([z.string(), z.array(z.string())]));
