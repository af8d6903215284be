/** A series as plain files: what `series.yaml` may hold. The same shape is written when a series leaves the house. */
import { z } from 'astro/zod';
import { CAPTION_LIMITS } from '#core/captions/caption-faults.ts';
import { CRAFT_NAMES } from '#core/craft/crafts.ts';
import { isCurrency } from '#core/money/currency.ts';
import type { FolderFault } from '#core/series-folder/judge-entries.ts';

// Not trimmed: what goes out comes in again sign for sign.
const words = (most: number) => z.string().max(most).refine((text) => text.trim() !== '', 'There are no words here.');
const maybeNone = (most: number) => z.string().max(most).default('');
const NAME = /^[a-z0-9-]{1,64}$/;
const part = z.number().int().min(1).max(99);

const Opens = z.discriminatedUnion('rule', [
  z.object({ rule: z.literal('at-once') }).strict(),
  z.object({ rule: z.literal('on-date'), wall: z.string().regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/), zone: words(64) }).strict(),
  z.object({ rule: z.literal('after-seat'), days: z.number().int().min(0).max(365) }).strict(),
  /** `part` is the number of an earlier part with a checkpoint; none when that one was taken out, so that another must be chosen. */
  z.object({ rule: z.literal('after-verdict'), part: part.optional() }).strict(),
  /** `part` is the number of an earlier part. */
  z.object({ rule: z.literal('after-part'), part: part.optional() }).strict(),
]);

export const GatheringEntry = z.object({
  kind: z.enum(['tool', 'yarn', 'material']),
  name: words(120),
  /** A key of the plan. */
  amount: words(80).optional(),
  amountText: words(80).optional(),
  standIn: words(200).optional(),
  untilPart: part.optional(),
  note: words(300).optional(),
  lookOut: words(300).optional(),
  getFrom: words(200).optional(),
}).strict();

export type GatheringEntry = z.output<typeof GatheringEntry>;

export const CheckpointEntry = z.object({ ask: words(200), look: z.array(words(200)).max(12) }).strict();

/** Beside a film, or in place of one that did not come along: what a teacher wrote for it. */
export const VideoEntry = z.object({
  name: z.string().regex(NAME),
  title: maybeNone(120),
  /** Storyboard of a film that is drawn; for series that ship with the program. */
  file: words(120).optional(),
  film: z.string().max(120).optional(),
  captions: z.string().max(120).optional(),
  chapters: z.array(z.object({ atMs: z.number().int().min(0), title: words(CAPTION_LIMITS.maxTitleSigns) }).strict()).max(CAPTION_LIMITS.maxChapters).optional(),
  /** Which of the stills taken of the film stands for it. */
  poster: z.string().regex(/^still-[1-9]$/).optional(),
  durationMs: z.number().int().min(0).optional(),
  /** The part it was put in for. */
  part: part.optional(),
}).strict();
export type VideoEntry = z.output<typeof VideoEntry>;

export const PictureEntry = z.object({ name: z.string().regex(NAME), title: maybeNone(120), file: z.string().max(120), alt: z.string().max(300).optional(), part: part.optional() }).strict();
export type PictureEntry = z.output<typeof PictureEntry>;

export const SeriesFile = z.object({
  title: words(120),
  craft: z.enum(CRAFT_NAMES),
  techniques: z.array(words(40)).max(20),
  level: z.enum(['beginner', 'some-practice', 'sure-hand']),
  summary: maybeNone(400),
  story: maybeNone(5_000),
  /** No amount while there is no price yet. */
  price: z.object({ amountMinor: z.number().int().min(0).max(Number.MAX_SAFE_INTEGER).optional(), currency: z.string().refine(isCurrency, 'This currency does not work here yet.') }).strict().optional(),
  lessons: z.array(z.object({
    file: z.string().regex(/^[0-9]{2}-[a-z0-9-]{1,80}\.mdx$/),
    title: words(120),
    minutes: z.number().int().min(1).max(6_000),
    preview: z.boolean().default(false),
    opens: Opens,
    checkpoint: CheckpointEntry.optional(),
    gathering: z.array(GatheringEntry).max(200).default([]),
  }).strict()).max(99),
  videos: z.array(VideoEntry).max(99).default([]),
  pictures: z.array(PictureEntry).max(99).default([]),
}).strict();
export type SeriesFile = z.output<typeof SeriesFile>;
/** As it is written: what is not said takes its default. */
export type WrittenSeriesFile = z.input<typeof SeriesFile>;

/** What is told of a folder that came in. */
export interface BroughtIn {
  readonly partCount: number;
  /** Films that the worker makes ready now. */
  readonly filmCount: number;
  /** What came in as it is and has to be mended before publishing. */
  readonly toMend: readonly FolderFault[];
}

/** Why a folder did not come in. */
export interface FolderRefusal {
  readonly says: string;
  readonly faults: readonly FolderFault[];
}

/** Where a folder stands on its way in. */
export type ImportState = { readonly publicId: string; readonly fileName: string; readonly cameAt: Date } & (
  /** So many folders are before it. */
  | { readonly state: 'waiting'; readonly before: number }
  | { readonly state: 'working'; readonly filesDone: number; readonly filesAll: number }
  /** `slug` and `title` are null when the series was deleted since. */
  | { readonly state: 'done'; readonly slug: string | null; readonly title: string | null; readonly told: BroughtIn }
  | { readonly state: 'refused'; readonly told: FolderRefusal }
);
