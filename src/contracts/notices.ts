/** Notices and nudges: what a teacher writes to her students, and what a student does with them. */
import { z } from 'astro/zod';
import { filled } from '#contracts/fields.ts';
import { ANSWER_PACES, LETTER_KINDS } from '#core/notices/letter-kinds.ts';
import type { SaidBlock } from '#core/notices/said.ts';

const publicId = z.string().regex(/^[0-9a-z]{26}$/);

/** One notice of hers by its public id, or `all`. */
export const MarkReadForm = z.object({ notice: z.union([z.literal('all'), publicId]) });
export type MarkReadInput = z.output<typeof MarkReadForm>;

const ticked = z.string().optional().catch(undefined).transform((value) => value !== undefined);

/** Which letters of a workroom she wants, and how often those about answers come; what is not ticked she does not. */
export const LettersForm = z.object({ workroom: publicId, source: z.enum(['account', 'notices', 'seat']), notices: ticked, nudges: ticked, answers: z.enum(ANSWER_PACES).default('at-once') })
  .transform(({ workroom, source, answers, ...kinds }) => ({ workroom, source, answers, wanted: LETTER_KINDS.filter((kind) => kinds[kind]) }));
export type LettersInput = z.output<typeof LettersForm>;

const Run = z.object({ words: z.string(), strong: z.literal(true).optional(), href: z.string().optional() });

/** What was said, as it is kept. */
export const SaidBlocks: z.ZodType<SaidBlock[]> = z.array(z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('words'), words: z.string() }),
  z.object({ kind: z.literal('rows'), rows: z.array(z.tuple([z.string(), z.string()])) }),
  z.object({ kind: z.literal('list'), items: z.array(z.string()) }),
  z.object({ kind: z.literal('prose'), runs: z.array(Run) }),
  z.object({ kind: z.literal('points'), items: z.array(z.array(Run)) }),
]));

const LONGEST_WORDS = 5_000;
const slug = z.string().regex(/^[a-z0-9-]{1,64}$/);
const oneLine = (text: string): boolean => !/\p{C}/u.test(text);
const words = filled('Say something first.', LONGEST_WORDS);

/** Empty where everybody is meant. */
const maybeNumber = (says: string, most: number) =>
  z.string().trim().default('').refine((text) => text === '' || (/^\d{1,4}$/.test(text) && Number(text) >= 1 && Number(text) <= most), says).transform((text) => (text === '' ? null : Number(text)));

export const NoticeDraftForm = z.object({
  /** The draft that is written over; absent for a new one. */
  notice: publicId.optional(),
  series: slug,
  part: maybeNumber('Choose a part of the list.', 99),
  still: maybeNumber('Write a number of days between 1 and 365, or leave it empty.', 365),
  title: filled('The heading is missing. It is what a letter is found by.', 120).refine(oneLine, 'There is a sign in it that cannot be shown. Type it again.'),
  words,
  postalAddress: z.string().trim().max(300, 'At most 300 characters work here.').default(''),
});
export type NoticeDraftInput = z.output<typeof NoticeDraftForm>;

export const NoticeForm = z.object({ notice: publicId });

export const SendNoticeForm = z.object({
  notice: publicId,
  when: z.enum(['now', 'later'], { errorMap: () => ({ message: 'Choose now or later.' }) }),
  /** Her own clock, `YYYY-MM-DDTHH:mm`, in the zone of her workroom. */
  wall: z.string().trim().default('').transform((typed) => typed.replace(/^(\d{4}-\d{2}-\d{2})\s+(\d{2}:\d{2})$/, '$1T$2')),
});
export type SendNoticeInput = z.output<typeof SendNoticeForm>;

export const NudgeForm = z.object({ seat: publicId, words, postalAddress: z.string().trim().max(300, 'At most 300 characters work here.').default('') });
export type NudgeInput = z.output<typeof NudgeForm>;
