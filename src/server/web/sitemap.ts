/** Every page that is for everybody, for search engines: the sitemap protocol 0.9 (sitemaps.org). */
import type { OpenPart, OpenSeries } from '#server/queries/shop/open-series.ts';
import { publicAddress } from '#server/web/public-address.ts';
import { element, xmlText } from '#server/web/xml.ts';

export interface Place {
  readonly path: string;
  /** Absent where nobody has kept when it last changed: no date is better than a wrong one. */
  readonly changedAt?: Date;
}

/** One file may name so many addresses; the house stays far below. */
const MOST = 50_000;


/** A teacher's page changes with her series; who has none open has nothing to be found by. */
export function placesOf(series: readonly OpenSeries[], parts: readonly OpenPart[]): Place[] {
  const teachers = new Map<string, Date>();
  for (const { handle, changedAt } of series) teachers.set(handle, new Date(Math.max(Number(changedAt), Number(teachers.get(handle) ?? 0))));
  return [
    ...series.map(({ slug, changedAt }) => ({ path: `/series/${slug}`, changedAt })),
    ...parts.map(({ slug, number, changedAt }) => ({ path: `/series/${slug}/${number}`, changedAt })),
    ...[...teachers].map(([handle, changedAt]) => ({ path: `/teachers/${handle}`, changedAt })),
  ];
}

export function sitemap(places: readonly Place[]): string {
  const urls = places.slice(0, MOST).map(({ path, changedAt }) =>
    element('url', {}, element('loc', {}, xmlText(publicAddress(path))) + (changedAt === undefined ? '' : element('lastmod', {}, changedAt.toISOString()))));
  return `<?xml version="1.0" encoding="utf-8"?>\n${element('urlset', { xmlns: 'http://www.sitemaps.org/schemas/sitemap/0.9' }, urls.join('\n'))}\n`;
}
