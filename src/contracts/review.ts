/** What finishers say of a series, the teacher's answer, and the steward's say. */
import { z } from 'astro/zod';
import { filled } from '#contracts/fields.ts';

/** Hidden fields: what is not one of ours finds nothing. */
const publicId = z.string().max(26).catch('');

export const ReviewForm = z.object({
  series: z.string().max(64).catch(''),
  words: filled('Your words are missing. Say what somebody should know who thinks of making it.', 2_000),
  again: z.enum(['yes', 'no'], { errorMap: () => ({ message: 'Choose yes or no.' }) }),
  name: filled('The name is missing. Write how you want to be called there; a first name is enough.', 80),
});
export type ReviewInput = z.output<typeof ReviewForm>;

/** Empty words take the answer back. */
export const AnswerForm = z.object({
  review: publicId,
  words: z.string().trim().max(2_000, 'At most 2,000 characters work here.').default(''),
});
export type AnswerInput = z.output<typeof AnswerForm>;

export const HideReviewForm = z.object({
  review: publicId,
  reason: filled('The reason is missing. Its writer reads it, and it is kept in the log.', 300),
});
export type HideReviewInput = z.output<typeof HideReviewForm>;

export const ShowReviewForm = z.object({ review: publicId });
export type ShowReviewInput = z.output<typeof ShowReviewForm>;
