/** Videos on their way from a teacher's device to her students. */
import { z } from 'astro/zod';

const publicId = z.string().regex(/^[0-9a-z]{26}$/);
const name = z.string().regex(/^[a-z0-9-]{1,64}$/);

/** What an upload says of itself before its first byte. */
export const BeginVideo = z.object({
  lesson: publicId,
  /** The video it shall replace, by its name in the series; else it is a new one. */
  name: name.nullish().transform((given) => given ?? null),
  fileName: z.string().min(1).max(500),
  fileType: z.string().max(100).default(''),
  byteCount: z.number().int().min(0),
});
export type BeginVideoInput = z.output<typeof BeginVideo>;
