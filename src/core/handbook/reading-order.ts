/** The handbook as one reads it: topic by topic, and from page to page within and across them. */

/** In the order they are read. */
export const HANDBOOK_TOPICS = [
  { key: 'planning', title: 'Before you begin', says: 'Choosing, reading, reckoning: what is settled before the first end is wound.' },
  { key: 'loom', title: 'The loom and its warp', says: 'Frame, nails, heddle, spacing, and the warp that is wound on them.' },
  { key: 'yarn', title: 'Yarn and fibre', says: 'How thick a yarn is, how to tell, what it is made of, and how to look after it.' },
  { key: 'techniques', title: 'Weaving', says: 'What the weft can do, from the plainest row to pile and ridge.' },
  { key: 'shapes', title: 'Colour and shape', says: 'Several colours in one row: what comes first, and how they meet.' },
  { key: 'knots', title: 'Knotting', says: 'The few knots of macramé, and how much cord they take.' },
  { key: 'finishing', title: 'Finishing', says: 'Off the loom, and up on the wall: edges, fringe, washing, rod and label.' },
  { key: 'mending', title: 'Mending', says: 'What you see, what it means, and what to do about it.' },
  { key: 'safety', title: 'Safety', says: 'What can hurt, and whom to ask.' },
  { key: 'looking-up', title: 'To look up', says: 'Words of the trade, and measures turned into each other.' },
] as const;

export type HandbookTopic = (typeof HANDBOOK_TOPICS)[number]['key'];

export function isHandbookTopic(name: string): name is HandbookTopic {
  return HANDBOOK_TOPICS.some(({ key }) => key === name);
}

/** What the order of reading depends on; pages know more of themselves. */
export interface HandbookPlace {
  readonly id: string;
  readonly data: { readonly title: string; readonly topic: HandbookTopic; readonly order: number };
}

export interface TopicPages<Page extends HandbookPlace> {
  readonly key: HandbookTopic;
  readonly title: string;
  readonly says: string;
  readonly pages: readonly Page[];
}

/** All topics that have pages, each with its pages in order. */
export function pagesByTopic<Page extends HandbookPlace>(pages: readonly Page[]): TopicPages<Page>[] {
  return HANDBOOK_TOPICS.map((topic) => ({
    ...topic,
    pages: pages.filter(({ data }) => data.topic === topic.key).sort((a, b) => a.data.order - b.data.order || (a.id < b.id ? -1 : 1)),
  })).filter((topic) => topic.pages.length > 0);
}

/** The pages before and after one, across topics; undefined before the first and after the last. */
export function neighboursOf<Page extends HandbookPlace>(pages: readonly Page[], id: string): { readonly before: Page | undefined; readonly after: Page | undefined } {
  const inOrder = pagesByTopic(pages).flatMap((topic) => topic.pages);
  const index = inOrder.findIndex((page) => page.id === id);
  return { before: index > 0 ? inOrder[index - 1] : undefined, after: index < 0 ? undefined : inOrder[index + 1] };
}

/** Signs of a search that are read. */
export const LONGEST_SEARCH = 100;
