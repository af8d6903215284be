/** A series as plain files: what `series.yaml` may hold. The same shape is written when a series leaves the house. */
import { z } from 'astro/zod';
import { CRAFT_NAMES } from '#core/craft/crafts.ts';

const words = (most: number) => z.string().trim().min(1).max(most);
const NAME = /^[a-z0-9-]{1,64}$/;

const Opens = z.discriminatedUnion('rule', [
  z.object({ rule: z.literal('at-once') }).strict(),
  z.object({ rule: z.literal('on-date'), wall: z.string().regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/), zone: words(64) }).strict(),
  z.object({ rule: z.literal('after-seat'), days: z.number().int().min(0).max(365) }).strict(),
  /** `part` is the number of an earlier part with a checkpoint. */
  z.object({ rule: z.literal('after-verdict'), part: z.number().int().min(1).max(99) }).strict(),
]);

export const GatheringEntry = z.object({
  kind: z.enum(['tool', 'yarn', 'material']),
  name: words(120),
  amount: z.string().regex(/^[a-z0-9.-]{1,80}$/).optional(),
  amountText: words(80).optional(),
  standIn: words(200).optional(),
  untilPart: z.number().int().min(1).max(99).optional(),
  note: words(300).optional(),
}).strict();

export const CheckpointEntry = z.object({ ask: words(200), look: z.array(words(200)).max(12) }).strict();

export const SeriesFile = z.object({
  title: words(120),
  craft: z.enum(CRAFT_NAMES),
  techniques: z.array(words(40)).max(20),
  level: z.enum(['beginner', 'some-practice', 'sure-hand']),
  summary: words(400),
  story: words(5_000),
  price: z.object({ amountMinor: z.number().int().min(0), currency: z.string().regex(/^[A-Z]{3}$/) }).strict().optional(),
  lessons: z.array(z.object({
    file: z.string().regex(/^[0-9]{2}-[a-z0-9-]{1,80}\.mdx$/),
    title: words(120),
    minutes: z.number().int().min(1).max(6_000),
    preview: z.boolean().default(false),
    opens: Opens,
    checkpoint: CheckpointEntry.optional(),
    gathering: z.array(GatheringEntry).max(60).default([]),
  }).strict()).max(60),
  videos: z.array(z.object({ name: z.string().regex(NAME), title: words(120), file: words(120).optional() }).strict()).max(60).default([]),
}).strict();
export type SeriesFile = z.output<typeof SeriesFile>;
