/** Time at the loom, as a student says it. */
import { z } from 'astro/zod';
import { parseTime } from '#core/units/parse-time.ts';

const publicId = z.string().regex(/^[0-9a-z]{26}$/);
const MOST_MINUTES = 24 * 60;

const minutes = z.string().default('').transform((typed, context) => {
  const read = parseTime(typed);
  if (!read.ok) {
    context.addIssue({ code: z.ZodIssueCode.custom, message: read.reason });
    return z.NEVER;
  }
  if (read.minutes > MOST_MINUTES) {
    context.addIssue({ code: z.ZodIssueCode.custom, message: 'A day has 24 hours. Write down each day by itself.' });
    return z.NEVER;
  }
  return read.minutes;
});

const isDay = (text: string): boolean => {
  const moment = new Date(`${text}T00:00:00Z`);
  return !Number.isNaN(moment.getTime()) && moment.toISOString().startsWith(text);
};

export const WriteTimeForm = z.object({
  series: z.string().regex(/^[a-z0-9-]{1,64}$/),
  /** Made up by the page, so that a form that comes twice is written down once. */
  entry: publicId,
  day: z.string().trim().regex(/^\d{4}-\d{2}-\d{2}$/, 'Write the day as year-month-day, such as 2026-12-01.').refine(isDay, 'There is no such day.'),
  woven: minutes.refine((found) => found > 0, 'Write down at least a minute.'),
});
export type WriteTimeInput = z.output<typeof WriteTimeForm>;

/** `woven` 0 takes it out. */
export const ChangeTimeForm = z.object({
  entry: publicId,
  // A button of its own may say 0 beside the field.
  woven: z.union([z.string(), z.array(z.string()).transform((sent) => sent.at(-1) ?? '')]).pipe(minutes),
});
export type ChangeTimeInput = z.output<typeof ChangeTimeForm>;
