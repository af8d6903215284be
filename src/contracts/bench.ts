/** What a teacher or helper says of a photo. */
import { z } from 'astro/zod';

const Note = z.object({
  words: z.string().trim().min(1, 'A pin without words says nothing. Write what you see there, or take the pin out.').max(600, 'At most 600 characters work here.'),
  /** Thousandths of the photo's width and height from the upper left; absent when the note is about the whole. */
  xPermille: z.number().int().min(0).max(1_000).nullable(),
  yPermille: z.number().int().min(0).max(1_000).nullable(),
}).strict();
export type NoteInput = z.output<typeof Note>;

/** The notes travel in one field, so that a form without JavaScript sends them as well. */
const Notes = z.string().max(40_000).transform((text, context): unknown => {
  try {
    return text === '' ? [] : JSON.parse(text);
  } catch {
    context.addIssue({ code: 'custom', message: 'The pins could not be read. Set them again.' });
    return z.NEVER;
  }
}).pipe(z.array(Note).max(20, 'At most 20 pins work on one photo.'));

export const VerdictForm = z.object({
  photo: z.string().regex(/^[0-9a-z]{26}$/),
  verdict: z.enum(['weave-on', 'mend-first'], { errorMap: () => ({ message: 'Choose weave on or mend first.' }) }),
  words: z.string().trim().max(2_000, 'At most 2,000 characters work here.').default(''),
  notes: Notes.default('[]'),
}).superRefine(({ verdict, words, notes }, context) => {
  if (verdict === 'mend-first' && words === '' && notes.length === 0) {
    context.addIssue({ code: 'custom', path: ['words'], message: 'Say what to mend: in words, or with a pin on the photo.' });
  }
});
export type VerdictInput = z.output<typeof VerdictForm>;
