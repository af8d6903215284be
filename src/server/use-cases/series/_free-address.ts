import { plainSlug } from '#core/lesson-text/slugs.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { Series } from '#server/models/index.ts';

/** Pages of the workroom that stand where a series would. */
const TAKEN_BY_PAGES = new Set(['new', 'bring-in']);

/** An address for a new series, made of its title; one that is taken gets a few letters more. */
export async function freeAddress(title: string): Promise<string> {
  const base = plainSlug(title, 50, 'series');
  const isTaken = TAKEN_BY_PAGES.has(base) || (await Series.count({ where: { slug: base } })) > 0;
  return isTaken ? `${base}-${newPublicId().slice(-5)}` : base;
}
