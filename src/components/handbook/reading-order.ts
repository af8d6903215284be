/** The handbook as one reads it: topic by topic, and from page to page within and across them. */
import { HANDBOOK_TOPICS, type HandbookHead, type HandbookTopic } from '#contracts/handbook.ts';

export interface HandbookEntry {
  readonly id: string;
  readonly data: HandbookHead;
}

export interface TopicPages<Entry extends HandbookEntry> {
  readonly key: HandbookTopic;
  readonly title: string;
  readonly says: string;
  readonly pages: readonly Entry[];
}

/** All topics that have pages, each with its pages in order. */
export function pagesByTopic<Entry extends HandbookEntry>(entries: readonly Entry[]): TopicPages<Entry>[] {
  return HANDBOOK_TOPICS.map((topic) => ({
    ...topic,
    pages: entries.filter(({ data }) => data.topic === topic.key).sort((a, b) => a.data.order - b.data.order || a.id.localeCompare(b.id)),
  })).filter(({ pages }) => pages.length > 0);
}

/** The pages before and after one, across topics; undefined at the first and the last. */
export function neighboursOf<Entry extends HandbookEntry>(entries: readonly Entry[], id: string): { readonly before: Entry | undefined; readonly after: Entry | undefined } {
  const inOrder = pagesByTopic(entries).flatMap(({ pages }) => pages);
  const index = inOrder.findIndex((entry) => entry.id === id);
  return { before: index > 0 ? inOrder[index - 1] : undefined, after: index < 0 ? undefined : inOrder[index + 1] };
}
