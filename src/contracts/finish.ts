/** What somebody writes down of a piece that is off the loom. */
import { z } from 'astro/zod';
import { parseTime } from '#core/units/parse-time.ts';

const series = z.string().regex(/^[a-z0-9-]{1,64}$/);
const MOST_HOURS = 5_000;

/** Empty is nothing said. */
const minutes = z.string().default('').transform((typed, context) => {
  if (typed.trim() === '') return null;
  const read = parseTime(typed);
  if (read.ok && read.minutes <= MOST_HOURS * 60) return read.minutes;
  context.addIssue({ code: z.ZodIssueCode.custom, message: read.ok ? 'That is more hours than anybody wove at one piece.' : read.reason });
  return z.NEVER;
});

export const SaySoForm = z.object({ series });
export type SaySoInput = z.output<typeof SaySoForm>;

/** Fields of the yarns are called `grams:<key>` and `fibre:<key>`; what they hold is read with the piece at hand. */
export const FinishedForm = z.object({
  series,
  took: minutes,
  note: z.string().trim().max(2_000, 'At most 2,000 characters work here.').default(''),
}).catchall(z.unknown()).transform(({ series: slug, took, note, ...others }) => ({
  series: slug, minutes: took, note,
  typed: Object.fromEntries(Object.entries(others).filter((entry): entry is [string, string] => typeof entry[1] === 'string')),
}));
export type FinishedInput = z.output<typeof FinishedForm>;
