/** What somebody writes down of a piece that is off the loom. */
import { z } from 'astro/zod';
import { filled } from '#contracts/fields.ts';
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

export const HangForm = z.object({
  series,
  name: filled('The name is missing. Write how you want to be called there; a first name is enough.', 80),
  words: z.string().trim().max(500, 'At most 500 characters work here.').default(''),
  agreed: z.literal('yes', { errorMap: () => ({ message: 'Nothing is shown without your agreement. Tick this when you want your piece to be seen.' }) }),
});
export type HangInput = z.output<typeof HangForm>;

/** Hidden fields: what is not one of ours finds nothing. */
const publicId = z.string().max(26).catch('');

export const HidePieceForm = z.object({
  piece: publicId,
  reason: filled('The reason is missing. Its maker reads it, and it is kept in the log.', 300),
});
export type HidePieceInput = z.output<typeof HidePieceForm>;

export const ShowPieceForm = z.object({ piece: publicId });
export type ShowPieceInput = z.output<typeof ShowPieceForm>;
