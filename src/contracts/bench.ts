/** What a teacher or helper says of a photo, and the phrases and the promise of her workroom. */
import { z } from 'astro/zod';
import { isSeeToMend } from '#core/following/see-to-mend.ts';
import { PHOTO_LIMITS } from '#core/photo/limits.ts';
import { LONGEST_PHRASE, MOST_PHRASES, phrasesOf } from '#core/workroom/bench.ts';

const Note = z.object({
  words: z.string().trim().min(1, 'A pin without words says nothing. Write what you see there, or take the pin out.').max(600, 'At most 600 characters work here.'),
  /** Thousandths of the photo's width and height from the upper left; absent when the note is about the whole. */
  xPermille: z.number().int().min(0).max(1_000).nullable(),
  yPermille: z.number().int().min(0).max(1_000).nullable(),
  /** Which shot of the showing it is about; without it the first. */
  shot: z.number().int().min(1).max(PHOTO_LIMITS.maxShots).optional(),
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

const photo = z.string().regex(/^[0-9a-z]{26}$/);

export const VerdictForm = z.object({
  photo,
  verdict: z.enum(['weave-on', 'mend-first'], { errorMap: () => ({ message: 'Choose weave on or mend first.' }) }),
  words: z.string().trim().max(2_000, 'At most 2,000 characters work here.').default(''),
  notes: Notes.default('[]'),
  /** With *mend first*: where it says how. */
  see: z.string().refine(isSeeToMend).nullish().catch(null),
  /** The photo that is taken in hand then; without it the oldest. */
  next: photo.optional().catch(undefined),
}).superRefine(({ verdict, words, notes }, context) => {
  if (verdict === 'mend-first' && words === '' && notes.length === 0) {
    context.addIssue({ code: 'custom', path: ['words'], message: 'Say what to mend: in words, or with a pin on the photo.' });
  }
});
export type VerdictInput = z.output<typeof VerdictForm>;

export const TakeBackForm = z.object({ photo });
export type TakeBackInput = z.output<typeof TakeBackForm>;

/** One phrase a line. `before` is what stood there when the form was drawn, so that nobody writes over another's. */
export const PhrasesForm = z.object({
  /** Handle of the workroom. */
  workroom: z.string().max(40),
  phrases: z.string().max(10_000, 'At most 20 phrases work, each up to 300 characters.').transform(phrasesOf)
    .refine((list) => list.length <= MOST_PHRASES, `At most ${MOST_PHRASES} phrases work. Take out those you say least.`)
    .refine((list) => list.every((phrase) => phrase.length <= LONGEST_PHRASE), `One of them is longer than ${LONGEST_PHRASE} characters. Say it in fewer, or in two lines.`),
  before: z.string().max(10_000).default('').transform(phrasesOf),
});
export type PhrasesInput = z.output<typeof PhrasesForm>;

export const PromiseForm = z.object({
  answerDays: z.coerce.number({ invalid_type_error: 'Write a number of days. Between 1 and 30 works.' }).int('Whole days work.').min(1, 'Between 1 and 30 days works.').max(30, 'Between 1 and 30 days works.'),
});
export type PromiseInput = z.output<typeof PromiseForm>;
