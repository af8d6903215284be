/** Looms of a person's own, as her forms send them. */
import { z } from 'astro/zod';

const PublicId = z.string().regex(/^[0-9a-z]{26}$/);

/** The fields of the loom itself are texts, read by core. Without `loom` it is a new one. */
export const OwnLoomForm = z.object({ loom: PublicId.optional() }).catchall(z.string().catch(''));
export type OwnLoomInput = z.output<typeof OwnLoomForm>;

export const TakeOutLoomForm = z.object({
  loom: PublicId,
  /** Puts it back instead. */
  back: z.string().optional(),
});
export type TakeOutLoomInput = z.output<typeof TakeOutLoomForm>;
