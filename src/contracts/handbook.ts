/** The head of a handbook page, and the topics the handbook is ordered by. */
import { z } from 'astro/zod';

/** In the order they are read. */
export const HANDBOOK_TOPICS = [
  { key: 'loom', title: 'The loom', says: 'Frame, nails, spacing, and the warp that is wound on them.' },
  { key: 'yarn', title: 'Yarn', says: 'How thick a yarn is, how to tell, and how to look after it.' },
  { key: 'techniques', title: 'Techniques', says: 'What the weft can do, from the plainest row to pile and ridge.' },
  { key: 'mending', title: 'Mending', says: 'What you see, what it means, and what to do about it.' },
  { key: 'safety', title: 'Safety', says: 'What can hurt, and whom to ask.' },
] as const;

export type HandbookTopic = (typeof HANDBOOK_TOPICS)[number]['key'];

const keys = HANDBOOK_TOPICS.map(({ key }) => key);

export const HandbookHead = z
  .object({
    title: z.string().min(3).max(60),
    /** One or two sentences, for the index and for search engines. */
    summary: z.string().min(20).max(200),
    topic: z.string().refine((topic): topic is HandbookTopic => keys.some((key) => key === topic), 'No topic of the handbook.'),
    /** Place among the pages of its topic. */
    order: z.number().int().min(1),
    /** What its numbers rest on, in words. */
    sources: z.array(z.string().min(10)).default([]),
  })
  .strict();
export type HandbookHead = z.output<typeof HandbookHead>;
