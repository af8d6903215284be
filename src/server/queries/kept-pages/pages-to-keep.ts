/** Which pages a person's device may keep: of her own seats, what is open to her at this moment. */
import { QueryTypes } from 'sequelize';
import type { PagesToKeep } from '#contracts/kept-pages.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { followedSeries, type FollowedSeries } from '#server/queries/following/followed-series.ts';

/**
 * My loom, and of each active seat its gathering lists, its open parts and their steps at the loom side. Whoever looks
 * after a series sees drafts on the same addresses: of those nothing is kept.
 */
export async function pagesToKeep(actor: Actor | null, now: Date): Promise<PagesToKeep> {
  if (actor === null) return { person: null, pages: [], series: [] };
  const seats = await sequelize.query<{ slug: string }>(
    `SELECT s.slug FROM enrolments e JOIN series s ON s.id = e.series_id WHERE e.user_id = ? AND e.state = 'active' ORDER BY e.id`,
    { replacements: [actor.userId], type: QueryTypes.SELECT },
  );
  const followed = await Promise.all(seats.map(({ slug }) => followedSeries(actor, slug, now)));
  const series = followed.flatMap((one) => (one === null || one.series.seat === null ? [] : [{ slug: one.series.slug, pages: pagesOf(one) }])).filter(({ pages }) => pages.length > 0);
  return { person: actor.publicId, pages: series.length === 0 ? [] : ['/loom'], series };
}

function pagesOf({ series, progress }: FollowedSeries): string[] {
  const address = `/series/${series.slug}`;
  if (series.parts.some(({ access }) => access.may === 'look-after')) return [];
  const open = series.parts.filter(({ access, publishedVersionId }) => access.may === 'follow' && publishedVersionId !== null);
  const lists = [`${address}/gather`, ...series.parts.map(({ number }) => `${address}/gather?part=${number}`)];
  return [...lists, ...open.flatMap(({ number }) => {
    const hasSteps = (progress.find((part) => part.number === number)?.steps ?? []).length > 0;
    // One page holds every step.
    return [`${address}/${number}`, ...(hasSteps ? [`${address}/${number}/loomside`] : [])];
  })];
}
