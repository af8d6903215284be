/** The head of a handbook page. */
import { z } from 'astro/zod';
import { isHandbookTopic } from '#core/handbook/reading-order.ts';

export const HandbookHead = z
  .object({
    title: z.string().min(3).max(60),
    /** One or two sentences, for the index and for search engines. */
    summary: z.string().min(20).max(200),
    topic: z.string().refine(isHandbookTopic, 'No topic of the handbook.'),
    /** Place among the pages of its topic. */
    order: z.number().int().min(1),
    /** Name of a band of Low Tide that shows what the page is about. */
    swatch: z.string().optional(),
    /** What its numbers rest on, in words. */
    sources: z.array(z.string().min(10)).default([]),
  })
  .strict();
export type HandbookHead = z.output<typeof HandbookHead>;
