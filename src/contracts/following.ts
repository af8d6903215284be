/** Following a series: forms that work without JavaScript. */
import { z } from 'astro/zod';
import { readStash } from '#core/gathering/stash.ts';

const slug = z.string().regex(/^[a-z0-9-]{1,64}$/);
const publicId = z.string().regex(/^[0-9a-z]{26}$/);

/** Boxes of a gathering list as they were sent: `shown` were on the page, `had` were ticked when it was drawn. */
export const GatheredForm = z.object({
  series: slug,
  shown: z.array(z.string().max(2_000)).max(200).default([]),
  had: z.array(z.string().max(2_000)).max(200).default([]),
  gathered: z.array(z.string().max(2_000)).max(200).default([]),
}).transform(({ series, shown, had, gathered }) => ({
  series,
  /** Only what she changed: what another device ticked meanwhile stays. */
  changes: [...new Set(shown)].filter((line) => had.includes(line) !== gathered.includes(line)).map((line) => ({ items: line.split('.'), ticked: gathered.includes(line) })),
}));
export type GatheredInput = z.output<typeof GatheredForm>;

/** What she has of each yarn on her list, in the order of the list. */
export const StashForm = z.object({ series: slug, yarn: z.array(z.string().min(1).max(160)).max(60), have: z.array(z.string().max(40)).max(60) })
  .transform(({ series, yarn, have }, ctx) => ({
    series,
    has: yarn.flatMap((key, index) => {
      const read = readStash(have[index] ?? '');
      if (read.ok) return [{ yarn: key, stash: read.stash }];
      ctx.addIssue({ code: 'custom', path: ['have', index], message: read.reason });
      return [];
    }),
  }));
export type StashInput = z.output<typeof StashForm>;

export const CalendarForm = z.object({ series: slug });

/** `version` is the text she was shown. */
export const ReadForm = z.object({ series: slug, lesson: publicId, version: z.coerce.number().int().min(1) });
export type ReadInput = z.output<typeof ReadForm>;

export const FinishForm = z.object({ series: slug, lesson: publicId, done: z.enum(['yes', 'no']).transform((word) => word === 'yes') });
export type FinishInput = z.output<typeof FinishForm>;
