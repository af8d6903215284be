/** What a teacher asks of the table of her students, as it stands in an address. What cannot be read is not asked. */
import { z } from 'astro/zod';

const empty = (value: unknown): unknown => (value === '' ? undefined : value);
const asked = <T extends z.ZodTypeAny>(rule: T) => z.preprocess(empty, rule.optional().catch(undefined));

export const StudentsAsked = z.object({
  series: asked(z.string().regex(/^[a-z0-9-]{1,64}$/)),
  part: asked(z.coerce.number().int().min(1).max(99)),
  /** At least so many days without a step. */
  still: asked(z.coerce.number().int().min(1).max(3_650)),
});
export type StudentsAsked = z.output<typeof StudentsAsked>;
