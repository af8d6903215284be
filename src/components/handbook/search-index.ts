/** The handbook read once for searching: its pages are part of the program and stay as they are until the next build. */
import { getCollection } from 'astro:content';
import { indexPages, type HandbookIndex } from '#core/handbook/find-pages.ts';
import { sectionsOf } from '#core/handbook/page-text.ts';

let index: HandbookIndex | undefined;

export async function handbookIndex(): Promise<HandbookIndex> {
  // While one writes, pages change under a running site.
  if (index !== undefined && !import.meta.env.DEV) return index;
  const entries = await getCollection('handbook');
  index = indexPages(entries.map(({ id, data, body }) => ({ id, title: data.title, summary: data.summary, sections: sectionsOf(body ?? '') })));
  return index;
}
