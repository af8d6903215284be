/** New series as a feed that readers ask again and again: Atom, RFC 4287. */
import { titleHalves } from '#core/series/title.ts';
import type { OpenSeries } from '#server/queries/shop/open-series.ts';
import { publicAddress, tagOf } from '#server/web/public-address.ts';
import { element, xmlText } from '#server/web/xml.ts';

export interface FeedOf {
  readonly id: string;
  readonly title: string;
  readonly subtitle: string;
  /** Path of the feed itself, and of the page that shows the same. */
  readonly self: string;
  readonly page: string;
}

/** So many of the newest stand in a feed. */
export const FEED_LENGTH = 50;
/** Of a feed in which nothing has happened yet: it has to say when. */
const NEVER = new Date(0);

export const FEED_TYPE = 'application/atom+xml; charset=utf-8';

export function atomFeed({ id, title, subtitle, self, page }: FeedOf, series: readonly OpenSeries[]): string {
  const updated = series.reduce((latest, { changedAt }) => (changedAt > latest ? changedAt : latest), NEVER);
  return `<?xml version="1.0" encoding="utf-8"?>\n${element('feed', { xmlns: 'http://www.w3.org/2005/Atom', 'xml:lang': 'en' }, [
    element('id', {}, xmlText(id)),
    element('title', {}, xmlText(title)),
    element('subtitle', {}, xmlText(subtitle)),
    element('updated', {}, updated.toISOString()),
    element('link', { rel: 'self', type: 'application/atom+xml', href: publicAddress(self) }),
    element('link', { rel: 'alternate', type: 'text/html', href: publicAddress(page) }),
    ...series.map(entry),
  ].join('\n'))}\n`;
}

function entry({ publicId, slug, title, summary, techniques, teacherName, handle, publishedAt, changedAt }: OpenSeries): string {
  const { name, rest } = titleHalves(title);
  return element('entry', {}, [
    element('id', {}, xmlText(tagOf('series', publicId))),
    element('title', {}, xmlText(rest === '' ? name : `${name}. ${rest}`)),
    element('link', { rel: 'alternate', type: 'text/html', href: publicAddress(`/series/${slug}`) }),
    element('published', {}, publishedAt.toISOString()),
    element('updated', {}, (changedAt > publishedAt ? changedAt : publishedAt).toISOString()),
    element('author', {}, element('name', {}, xmlText(teacherName)) + element('uri', {}, xmlText(publicAddress(`/teachers/${handle}`)))),
    ...techniques.map((term) => element('category', { term })),
    // Content of its own an entry need not have while it leads to a page.
    element('summary', { type: 'text' }, xmlText(summary === '' ? `A series by ${teacherName}.` : summary)),
  ].join(''));
}
