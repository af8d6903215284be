/** What is told to programs: feeds held against the musts of RFC 4287, the sitemap, robots.txt, and data in the words of schema.org. */
import { JSDOM } from 'jsdom';
import { beforeEach, describe, expect, test } from 'vitest';
import { jsonForPage } from '#components/site/json-for-page.ts';
import { giftCardOf } from '#contracts/gift.ts';
import { LessonVersion, Review, Series } from '#server/models/index.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { openParts, openSeries } from '#server/queries/shop/open-series.ts';
import { teacherNamed, teacherPage } from '#server/queries/shop/teacher-page.ts';
import { oneSeries } from '#server/queries/shop/shop-series.ts';
import { taughtTechniques, techniquePage } from '#server/queries/shop/technique-page.ts';
import { atomFeed } from '#server/web/atom-feed.ts';
import { robotsText } from '#server/web/robots.ts';
import { placesOf, sitemap } from '#server/web/sitemap.ts';
import { courseOf, crumbsOf, personOf } from '#server/web/structured-data.ts';
import { sendDocument, xmlText } from '#server/web/xml.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

const NOW = new Date('2026-12-01T10:00:00Z');
const FEED = { id: 'tag:fellmark.example,2026:feed:series', title: 'New series', subtitle: 'All & each', self: '/series/feed.atom', page: '/series' };
const ATOM = 'http://www.w3.org/2005/Atom';
/** RFC 3339, as RFC 4287 section 3.3 asks for it: capital T, and Z or an offset. */
const DATE = /^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d(?:\.\d+)?(?:Z|[+-]\d\d:\d\d)$/;

const xml = (text: string): Document => new JSDOM(text, { contentType: 'application/xml' }).window.document;
const children = (of: Element, name: string): Element[] => [...of.children].filter((child) => child.localName === name && child.namespaceURI === ATOM);
const textOf = (of: Element | undefined, name: string): string => (of === undefined ? '' : (children(of, name)[0]?.textContent ?? ''));
const links = (of: Element, rel: string): (string | null)[] => children(of, 'link').filter((link) => link.getAttribute('rel') === rel).map((link) => link.getAttribute('href'));

/** One open series with a free second part, one of another teacher, and a draft that nobody may learn of. */
async function shore(): Promise<void> {
  const ilse = await buildWorkroom({ ownerId: (await buildUser({ name: 'Ilse <Marrow>' })).id, handle: 'saltmarsh', name: 'Saltmarsh & Sons', about: 'At a marsh. </script><script>alert(1)</script>' });
  const tide = await buildSeries({ workroomId: ilse.id, slug: 'low-tide', title: 'Low Tide: a "wall" & more', summary: 'Sea \u0007 & <shore>', techniques: ['soumak', 'Square knots'], priceMinor: 6_850, currency: 'EUR', level: 'some-practice', publishedAt: new Date('2026-11-03T00:00:00Z') });
  await buildLesson({ seriesId: tide.id, title: 'Not out', publishedVersionId: null, isPreview: true });
  await buildLesson({ seriesId: tide.id, title: 'First' });
  await buildLesson({ seriesId: tide.id, title: 'Second', isPreview: true });
  await buildSeries({ slug: 'yen', title: 'Cords', priceMinor: 2_500, currency: 'JPY', techniques: ['square knot'], publishedAt: new Date('2026-11-01T00:00:00Z') });
  const secret = await buildSeries({ workroomId: ilse.id, slug: 'secret', title: 'Secret', techniques: ['felting'], state: 'draft' });
  await buildLesson({ seriesId: secret.id, isPreview: true });
}

beforeEach(shore);

describe('a feed of new series', () => {
  test('holds every must of RFC 4287 for a feed', async () => {
    const { documentElement: feed } = xml(atomFeed(FEED, await openSeries({ limit: 50 })));
    expect([feed.localName, feed.namespaceURI]).toEqual(['feed', ATOM]);
    for (const name of ['id', 'title', 'updated']) expect(children(feed, name), name).toHaveLength(1);
    expect(() => new URL(textOf(feed, 'id'))).not.toThrow();
    expect(textOf(feed, 'updated')).toMatch(DATE);
    expect(links(feed, 'self')).toHaveLength(1);
    expect(links(feed, 'alternate')).toHaveLength(1);
    expect(children(feed, 'entry').length).toBe(2);
  });

  test('holds every must of RFC 4287 for its entries', async () => {
    const { documentElement: feed } = xml(atomFeed(FEED, await openSeries({ limit: 50 })));
    const entries = children(feed, 'entry');
    for (const entry of entries) {
      for (const name of ['id', 'title', 'updated', 'published', 'summary']) expect(children(entry, name), name).toHaveLength(1);
      expect(textOf(entry, 'updated')).toMatch(DATE);
      expect(textOf(entry, 'published')).toMatch(DATE);
      expect(Date.parse(textOf(entry, 'updated'))).toBeGreaterThanOrEqual(Date.parse(textOf(entry, 'published')));
      // Without content an entry must have an alternate link; without a feed's author, an author with a name.
      expect(links(entry, 'alternate')).toHaveLength(1);
      const [author] = children(entry, 'author');
      expect(textOf(author, 'name')).not.toBe('');
      for (const category of children(entry, 'category')) expect(category.getAttribute('term')).not.toBe('');
    }
    expect(new Set(entries.map((entry) => textOf(entry, 'id'))).size).toBe(entries.length);
  });

  test('says what a teacher wrote, whatever signs are in it, newest first and without drafts', async () => {
    const text = atomFeed(FEED, await openSeries({ limit: 50 }));
    const entries = children(xml(text).documentElement, 'entry');
    expect(entries.map((entry) => textOf(entry, 'title'))).toEqual(['Low Tide. A "wall" & more', 'Cords']);
    expect(textOf(entries[0], 'summary')).toBe('Sea  & <shore>');
    expect(entries[0]?.querySelector('author > name')?.textContent).toBe('Ilse <Marrow>');
    expect(text).not.toMatch(/secret/i);
  });

  test('of one teacher holds hers only; an empty one is a feed still', async () => {
    expect((await openSeries({ handle: 'saltmarsh', limit: 50 })).map(({ slug }) => slug)).toEqual(['low-tide']);
    expect((await openSeries({ limit: 1 })).map(({ slug }) => slug)).toEqual(['low-tide']);
    expect(await teacherNamed('nobody')).toBeNull();
    const { documentElement: feed } = xml(atomFeed(FEED, []));
    expect(textOf(feed, 'updated')).toMatch(DATE);
  });

  test('has a date that follows what went out, and not what is drafted', async () => {
    const changed = async (): Promise<number> => Number((await openSeries({ handle: 'saltmarsh', limit: 1 }))[0]?.changedAt);
    await Series.update({ summary: 'New words' }, { where: { slug: 'low-tide' } });
    const before = await changed();
    const tide = await Series.findOne({ where: { slug: 'low-tide' }, rejectOnEmpty: true });
    const lesson = await buildLesson({ seriesId: tide.id, publishedVersionId: null });
    await lesson.update({ draftSource: 'A draft', draftRevision: 9 });
    expect(await changed()).toBe(before);
    const version = await LessonVersion.create({ lessonId: lesson.id, number: 1, source: 'Out', tree: { children: [] } as never, facts: {} as never });
    await lesson.update({ publishedVersionId: version.id });
    expect(await changed()).toBeGreaterThanOrEqual(before);
    expect(await changed()).toBeGreaterThanOrEqual(Number(version.createdAt));
  });
});

describe('the sitemap', () => {
  test('names series, their free parts by the numbers visitors know, and teachers; nothing of a draft', async () => {
    const places = placesOf(await openSeries({ limit: 50 }), await openParts(50));
    expect(places.map(({ path }) => path)).toEqual(['/series/low-tide', '/series/yen', '/series/low-tide/2', '/teachers/saltmarsh', expect.stringMatching(/^\/teachers\/handle-/)]);
    expect(places.every(({ changedAt }) => changedAt instanceof Date && !Number.isNaN(Number(changedAt)))).toBe(true);
  });

  test('is XML with absolute addresses; where no date is known, none is said', () => {
    const { documentElement } = xml(sitemap([{ path: '/series?q=a&b', changedAt: NOW }, { path: '/' }]));
    expect(documentElement.namespaceURI).toBe('http://www.sitemaps.org/schemas/sitemap/0.9');
    const [first, second] = [...documentElement.children];
    expect(new URL(first?.children[0]?.textContent ?? '').search).toBe('?q=a&b');
    expect(first?.children[1]?.textContent).toBe('2026-12-01T10:00:00.000Z');
    expect(second?.children).toHaveLength(1);
  });

  test('is named in robots.txt, which keeps walkers out of what is one person’s', () => {
    const lines = robotsText().split('\n');
    expect(lines[0]).toBe('User-agent: *');
    expect(lines.some((line) => /^Sitemap: https?:\/\/.+\/sitemap\.xml$/.test(line))).toBe(true);
    for (const path of ['/account', '/loom', '/workroom', '/office', '/series?']) expect(lines).toContain(`Disallow: ${path}`);
    expect(lines.filter((line) => line === 'Disallow: /' || line === 'Disallow:')).toEqual([]);
  });
});

describe('what search engines are told of a series', () => {
  const course = async (slug: string, hours: number | null = null) => {
    const series = await seriesFor(null, slug, NOW);
    if (series === null) throw new RangeError(slug);
    return courseOf(series, { hours, picture: null });
  };

  test('is a Course with who gives it, how long it takes and its free part', async () => {
    expect(await course('low-tide', 12.5)).toMatchObject({
      '@context': 'https://schema.org', '@type': 'Course', name: 'Low Tide', educationalLevel: 'Intermediate', teaches: ['soumak', 'Square knots'],
      provider: { '@type': 'Organization', name: 'Saltmarsh & Sons' },
      hasCourseInstance: { '@type': 'CourseInstance', courseMode: 'online', courseWorkload: 'PT12H30M', instructor: { '@type': 'Person', name: 'Ilse <Marrow>' } },
      hasPart: [{ name: 'Second', isAccessibleForFree: true, url: expect.stringMatching(/\/series\/low-tide\/2$/) }],
    });
    expect((await course('low-tide'))['hasCourseInstance']).toMatchObject({ courseWorkload: 'PT1H0M' });
  });

  test('is offered at its price in its own currency, free for nothing, and not at all without a price', async () => {
    expect(await course('low-tide')).toMatchObject({ isAccessibleForFree: false, offers: [{ '@type': 'Offer', price: '68.50', priceCurrency: 'EUR', category: 'Paid' }] });
    expect((await course('yen'))['offers']).toMatchObject([{ price: '2500', priceCurrency: 'JPY' }]);
    await Series.update({ priceMinor: 0 }, { where: { slug: 'low-tide' } });
    expect(await course('low-tide')).toMatchObject({ isAccessibleForFree: true, offers: [{ price: '0.00', category: 'Free' }] });
    await Series.update({ priceMinor: null }, { where: { slug: 'low-tide' } });
    expect(await course('low-tide')).not.toHaveProperty('offers');
  });

  test('can stand in a page whatever a teacher wrote', async () => {
    const page = await teacherPage('saltmarsh');
    if (page === null) throw new RangeError('saltmarsh');
    const json = jsonForPage(personOf(page));
    expect(json).not.toMatch(/[<>&]/);
    expect(JSON.parse(json)).toMatchObject({ '@type': 'Person', description: 'At a marsh. </script><script>alert(1)</script>' });
    expect(crumbsOf([{ path: '/series', name: 'Series' }])).toMatchObject({ itemListElement: [{ position: 1, name: 'Series' }] });
  });
});

describe('a technique', () => {
  test('is found however teachers write it, and drafts teach nothing', async () => {
    expect(await taughtTechniques()).toEqual([{ key: 'soumak', spellings: ['soumak'] }, { key: 'square-knot', spellings: expect.arrayContaining(['Square knots', 'square knot']) }]);
    expect((await techniquePage('square-knot')).series.map(({ slug }) => slug)).toEqual(['low-tide', 'yen']);
    expect(await techniquePage('felting')).toEqual({ spellings: [], series: [] });
  });
});

describe('the page of a teacher', () => {
  test('tells what can be learned from her and what finishers said of what is open, hidden words left out', async () => {
    const tide = await Series.findOne({ where: { slug: 'low-tide' }, rejectOnEmpty: true });
    const secret = await Series.findOne({ where: { slug: 'secret' }, rejectOnEmpty: true });
    for (const [words, seriesId, hiddenAt] of [['Calm work.', tide.id, null], ['Rude.', tide.id, NOW], ['Of a draft.', secret.id, null]] as const) {
      const seat = await buildEnrolment({ seriesId });
      await Review.create({ seriesId, enrolmentId: seat.id, words, shownName: 'Maud', wouldMakeAgain: true, hiddenAt });
    }
    expect(await teacherPage('saltmarsh')).toMatchObject({ techniques: ['soumak', 'Square knots'], said: [{ words: 'Calm work.', name: 'Maud', slug: 'low-tide' }] });
  });
});

describe('a document for programs', () => {
  test('is not sent again to who has it', () => {
    const ask = (headers: Record<string, string> = {}): Response => sendDocument(new Request('https://fellmark.example/', { headers }), 'words', 'text/plain');
    const tag = ask().headers.get('etag') ?? '';
    expect(tag).toMatch(/^"[\w-]+"$/);
    expect(ask({ 'if-none-match': `W/${tag}` }).status).toBe(304);
    expect(ask({ 'if-none-match': '"other"' }).status).toBe(200);
  });

  test('has no sign that XML cannot write', () => {
    expect(xmlText('a\u0000b\ud800c\u{1f9f6}\ufffe<"\'>&')).toBe('abc\u{1f9f6}&#60;&#34;&#39;&#62;&#38;');
  });
});

describe('a gift card', () => {
  test('names an open series only, and takes nonsense for an empty field', async () => {
    expect(await oneSeries('low-tide')).toMatchObject({ slug: 'low-tide', freePart: 2 });
    expect([await oneSeries('secret'), await oneSeries('nothing')]).toEqual([null, null]);
    expect(giftCardOf(new URLSearchParams(`series=../x&to=+Amara+&words=${'a'.repeat(400)}`))).toEqual({ series: undefined, to: 'Amara', from: '', words: 'a'.repeat(300) });
  });
});
