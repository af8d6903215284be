/** What a teacher writes in her workroom: series, parts, gathering lists. The sentences are what she reads at the field. */
import { z } from 'astro/zod';
import { CRAFT_NAMES } from '#core/craft/crafts.ts';
import type { LessonProblem } from '#core/lesson-text/problem.ts';
import { timeZone } from './people.ts';

const slug = z.string().regex(/^[a-z0-9-]{1,64}$/);
const publicId = z.string().regex(/^[0-9a-z]{26}$/);
/** Signs a draft may have; a little more than a text that can be published, so that one that grew too long is not lost. */
export const LONGEST_DRAFT = 220_000;
const revision = z.coerce.number().int().min(0);
const ticked = z.string().optional().transform((value) => value !== undefined);
const words = (name: string, most: number) =>
  z.string({ required_error: `${name} is missing.` }).trim().min(1, `${name} is missing.`).max(most, `At most ${most.toLocaleString('en-GB')} characters work here.`);
const maybeWords = (most: number) =>
  z.string().trim().max(most, `At most ${most.toLocaleString('en-GB')} characters work here.`).optional().transform((value) => (value === undefined || value === '' ? null : value));
const wholeNumber = (says: string, least: number, most: number) =>
  z.string({ required_error: says }).trim().regex(/^\d{1,6}$/, says).transform(Number).refine((n) => n >= least && n <= most, says);

/** `dates`: what parts that open on a date keep when the zone changes. */
export const WorkroomForm = z.object({ name: words('The name', 120), timeZone, dates: z.enum(['moment', 'clock'], { errorMap: () => ({ message: 'Choose what the dates keep.' }) }).default('moment') });
export type WorkroomInput = z.output<typeof WorkroomForm>;

export const LEVELS = ['beginner', 'some-practice', 'sure-hand'] as const;

export const NewSeriesForm = z.object({ title: words('The title', 120), craft: z.enum(CRAFT_NAMES).default('frame-loom') });
export type NewSeriesInput = z.output<typeof NewSeriesForm>;

export const SeriesDetailsForm = z.object({
  series: slug,
  revision,
  title: words('The title', 120),
  summary: z.string().trim().max(400, 'At most 400 characters work here.').default(''),
  story: z.string().trim().max(5_000, 'At most 5,000 characters work here.').default(''),
  level: z.enum(LEVELS),
  techniques: z.string().trim().max(300).default('').transform((text) => text.split(',').map((word) => word.trim()).filter((word) => word !== ''))
    .pipe(z.array(z.string().max(40, 'A technique’s name has at most 40 characters.')).max(20, 'At most 20 techniques work here.')),
  /** As typed; parsed by core with the currency. Empty: no price yet. */
  price: z.string().trim().max(20).default(''),
  currency: z.string().regex(/^[A-Z]{3}$/),
});
export type SeriesDetailsInput = z.output<typeof SeriesDetailsForm>;

export const SeriesForm = z.object({ series: slug });

export const NewLessonForm = z.object({ series: slug, title: words('The title', 120) });
export type NewLessonInput = z.output<typeof NewLessonForm>;

export const LessonDraftForm = z.object({
  lesson: publicId,
  revision,
  source: z.string({ required_error: 'The text did not arrive, so nothing was changed.' }).max(LONGEST_DRAFT, 'A part holds at most 200,000 characters. Make two of it.'),
});
export type LessonDraftInput = z.output<typeof LessonDraftForm>;

/** An earlier text to be taken up again: `v3` for a published version, else the public id of one that was set aside. */
export const RestoreTextForm = z.object({ lesson: publicId, revision, text: z.string().regex(/^(?:v\d{1,6}|[0-9a-z]{26})$/) });
export type RestoreTextInput = z.output<typeof RestoreTextForm>;

/** How a text was read: without problems it can be published. */
export interface TextRemarks {
  readonly problems: readonly LessonProblem[];
  readonly warnings: readonly LessonProblem[];
}

/** The draft was kept. `savedAt` is a time of day on the teacher's clock. */
export interface DraftKept extends TextRemarks {
  readonly revision: number;
  readonly savedAt: string;
}

/** The draft was not kept, because another window kept `source` in the meantime. */
export interface DraftBehind {
  readonly behind: { readonly revision: number; readonly source: string };
}

export const LessonSettingsForm = z.object({
  lesson: publicId,
  title: words('The title', 120),
  minutes: wholeNumber('Between 1 and 6,000 minutes works.', 1, 6_000),
  isPreview: ticked,
  rule: z.enum(['at-once', 'on-date', 'after-seat', 'after-verdict', 'after-part']),
  /** The teacher's own clock, `YYYY-MM-DDTHH:mm`, in the zone of her workroom. */
  wall: z.string().trim().optional().transform((typed) => typed?.replace(/^(\d{4}-\d{2}-\d{2})\s+(\d{2}:\d{2})$/, '$1T$2')),
  days: z.string().optional(),
  /** Public id of the part whose verdict opens this one. */
  after: z.string().optional(),
  /** Public id of the part that must be done before this one opens. */
  afterPart: z.string().optional(),
  asksForPhoto: ticked,
  ask: z.string().trim().max(200, 'At most 200 characters work here.').default(''),
  /** One line for each point. */
  look: z.string().max(2_500).default('').transform((text) => text.split(/\r?\n/).map((line) => line.trim()).filter((line) => line !== ''))
    .pipe(z.array(z.string().max(200, 'At most 200 characters work in a line.')).max(12, 'At most 12 lines work here.')),
});
export type LessonSettingsInput = z.output<typeof LessonSettingsForm>;

export const LessonForm = z.object({ lesson: publicId });

/** By one place, or to the number it shall have: 1 puts it first. */
export const MoveLessonForm = z.object({
  lesson: publicId,
  by: z.enum(['up', 'down']).optional(),
  to: wholeNumber('Say which number the part shall have.', 1, 99).optional(),
  /** She has read that a part would open before an earlier one. */
  anyway: z.literal('yes').optional(),
}).refine(({ by, to }) => by !== undefined || to !== undefined, { path: ['to'], message: 'Say which number the part shall have.' });
export type MoveLessonInput = z.output<typeof MoveLessonForm>;

const thingFields = {
  kind: z.enum(['tool', 'yarn', 'material']),
  name: words('The name', 120),
  lookOut: maybeWords(300),
  getFrom: maybeWords(200),
  standIn: maybeWords(200),
};
const gatheringFields = {
  ...thingFields,
  amountKey: maybeWords(80),
  amountText: maybeWords(80),
  untilPart: z.string().trim().optional().transform((text) => (text === undefined || text === '' ? null : Number(text)))
    .refine((part) => part === null || (Number.isInteger(part) && part >= 1 && part <= 99), 'Write the number of a part, or leave it empty.'),
  note: maybeWords(300),
  /** Its words are kept for other lists too. */
  keep: ticked,
};
export const NewGatheringForm = z.object({ lesson: publicId, ...gatheringFields });
export type NewGatheringInput = z.output<typeof NewGatheringForm>;
export const GatheringForm = z.object({ item: publicId, ...gatheringFields });
export type GatheringInput = z.output<typeof GatheringForm>;
export const GatheringItemForm = z.object({ item: publicId });
export const NewKeptThingForm = z.object(thingFields);
export type NewKeptThingInput = z.output<typeof NewKeptThingForm>;
export const KeptThingForm = z.object({ thing: publicId, ...thingFields });
export type KeptThingInput = z.output<typeof KeptThingForm>;
/** A thing as it is kept for all lists. */
export interface ThingKept extends NewKeptThingInput {
  readonly publicId: string;
}
export const KeptThingItemForm = z.object({ thing: publicId });

export const MoveGatheringForm = z.object({ item: publicId, by: z.enum(['up', 'down']) });
