/** Ticking off what is gathered and what is done. */
import { z } from 'astro/zod';

const publicId = z.string().regex(/^[0-9a-z]{26}$/);
const shared = {
  series: z.string().regex(/^[a-z0-9-]{1,64}$/),
  ticked: z.union([z.boolean(), z.enum(['yes', 'no']).transform((word) => word === 'yes')]),
  /** The newest revision of the seat that the device knew as she ticked; absent from a form. */
  seen: z.number().int().min(0).optional(),
};

export const TickInput = z.discriminatedUnion('subject', [
  /** A line of a merged list stands for several things, which are ticked together. */
  z.object({ subject: z.literal('gather'), items: z.union([publicId.transform((id) => [id]), z.array(publicId).min(1).max(60)]), ...shared }),
  z.object({ subject: z.literal('step'), lesson: publicId, item: z.string().regex(/^[a-z0-9-]{1,64}$/), ...shared }),
]);
export type TickInput = z.output<typeof TickInput>;

/** A tick as it stands. `key` is a thing's public id, or a part's, colon, the step's id. */
export interface TickNow {
  readonly subject: 'gather' | 'step';
  readonly key: string;
  readonly ticked: boolean;
  readonly revision: number;
}

/** The answer: what was changed since `seen`, by this device and by others. */
export interface TicksTaken {
  readonly revision: number;
  readonly ticks: readonly TickNow[];
}
