/** What somebody wants on her certificate: the address of the file says it, nothing is kept. */
import { z } from 'astro/zod';

const isDay = (text: string): boolean => {
  const moment = new Date(`${text}T00:00:00Z`);
  return !Number.isNaN(moment.getTime()) && moment.toISOString().startsWith(text);
};

export const CertificateForm = z.object({
  name: z.string().trim().max(200, 'At most 200 characters work here.').default(''),
  day: z.string().trim().regex(/^\d{4}-\d{2}-\d{2}$/, 'Write the day as year-month-day, such as 2026-12-01.').refine(isDay, 'There is no such day.'),
  hours: z.literal('yes').optional().catch(undefined).transform((value) => value !== undefined),
  paper: z.enum(['A4', 'LETTER']).catch('A4'),
});
export type CertificateInput = z.output<typeof CertificateForm>;
