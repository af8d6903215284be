/** Ticking off what is gathered and what is done. */
import { z } from 'astro/zod';

const publicId = z.string().regex(/^[0-9a-z]{26}$/);
const shared = {
  series: z.string().regex(/^[a-z0-9-]{1,64}$/),
  ticked: z.union([z.boolean(), z.enum(['yes', 'no']).transform((word) => word === 'yes')]),
  /** When she ticked, by her device; a tick made without signal arrives later. */
  changedAt: z.coerce.date().optional(),
};

export const TickInput = z.discriminatedUnion('subject', [
  /** A line of a merged list stands for several things, which are ticked together. */
  z.object({ subject: z.literal('gather'), items: z.union([publicId.transform((id) => [id]), z.array(publicId).min(1).max(60)]), ...shared }),
  z.object({ subject: z.literal('step'), lesson: publicId, item: z.string().regex(/^[a-z0-9-]{1,64}$/), ...shared }),
]);
export type TickInput = z.output<typeof TickInput>;
