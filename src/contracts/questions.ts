/** Asking on a part, answering, and looking after the words of both. */
import { z } from 'astro/zod';
import { ticked, written } from '#contracts/fields.ts';

/** Hidden fields: what is not one of ours finds nothing. */
const publicId = z.string().max(26).catch('');
const ofWhat = z.enum(['question', 'answer']).catch('question');
const MOST = 2_000;

export const AskForm = z.object({
  series: z.string().max(64).catch(''),
  lesson: publicId,
  /** The step it is about; empty for the whole part. */
  step: z.string().max(64).nullish().transform((step) => (step === '' || step === undefined ? null : step)),
  /** Public id of the photo of hers it is about; empty for none. */
  photo: z.string().max(26).nullish().transform((photo) => (photo === '' || photo === undefined ? null : photo)),
  words: written('Your question is missing. Write what you see on your loom and what you want to know.', MOST),
  to: z.enum(['teacher', 'class'], { errorMap: () => ({ message: 'Choose who sees it.' }) }),
  letter: ticked,
  /** She has seen what was asked before in like words. */
  looked: ticked,
});
export type AskInput = z.output<typeof AskForm>;

export const AnswerForm = z.object({
  question: publicId,
  words: written('Your answer is missing.', MOST),
  /** Answers that stood there when the page was drawn. */
  seen: z.coerce.number().int().min(0).max(999).catch(0),
});
export type AnswerInput = z.output<typeof AnswerForm>;

/** Names a question or an answer. */
export const WordsForm = z.object({ of: ofWhat, which: publicId });
export type WordsInput = z.output<typeof WordsForm>;

export const ChangeWordsForm = WordsForm.extend({ words: written('The words are missing. To take them out, use “Take out”.', MOST) });
export type ChangeWordsInput = z.output<typeof ChangeWordsForm>;

export const ReportForm = WordsForm.extend({ why: written('Say in a few words why it should not stand there.', 600) });
export type ReportInput = z.output<typeof ReportForm>;

export const SettleReportForm = z.object({ report: publicId, words: z.enum(['take-out', 'stand']) });
export type SettleReportInput = z.output<typeof SettleReportForm>;
