import { beforeEach, describe, expect, test } from 'vitest';
import { NOBODY, PAGE_OF_HEADER, SAID_ONCE_HEADER, type PagesToKeep } from '#contracts/kept-pages.ts';
import { FILES, PAGES, PageStore } from '../../../src/service-worker/page-store.ts';
import { FakeCaches } from '../../support/fake-caches.ts';

const MAUD: PagesToKeep = { person: 'maud', pages: ['/loom'], series: [{ slug: 'low-tide', pages: ['/series/low-tide/gather', '/series/low-tide/gather?part=2', '/series/low-tide/2'] }] };
const GATHER = '/series/low-tide/gather';

let caches: FakeCaches;
let may: PagesToKeep | 'away';
let now: Date;
let asked: string[];
let store: PageStore;

const page = (person: string, html = '<title>My loom | Fellmark</title><main id="main">', headers: Record<string, string> = {}): Response =>
  new Response(html, { headers: { 'content-type': 'text/html', [PAGE_OF_HEADER]: person, ...headers } });

beforeEach(() => {
  caches = new FakeCaches();
  may = MAUD;
  now = new Date('2026-12-01T13:05:00Z');
  asked = [];
  store = new PageStore({
    caches,
    now: () => now,
    fetch: async (address) => {
      asked.push(address);
      if (may === 'away') throw new TypeError('no connection');
      if (address === '/api/kept-pages') return Response.json(may);
      if (address === '/_astro/client.js') return new Response('import "./deep.js"; import "./client.js"');
      if (address.startsWith('/_astro/') || address.startsWith('/media/')) return new Response('bytes');
      return page('maud', `<title>${address} | Fellmark</title>`);
    },
  });
});

const keptPages = (): string[] => caches.in(PAGES).filter((address) => address !== '/kept-state');

describe('a page that was opened', () => {
  test('is kept with its files and pictures, and read again with its moment', async () => {
    await store.seen(GATHER, page('maud', '<title>Gather | Fellmark</title><link href="/_astro/page.css"><astro-island component-url="/_astro/client.js"></astro-island><img class="a" src="/media/abc/small?v=1&amp;w=2">'));
    expect(keptPages()).toEqual(['/media/abc/small?v=1&w=2', GATHER].sort());
    expect(caches.in(FILES)).toEqual(['/_astro/client.js', '/_astro/deep.js', '/_astro/page.css']);
    expect(await store.copyOf(GATHER)).toMatchObject({ keptAt: now });
    expect(await store.list()).toEqual([{ address: GATHER, title: 'Gather' }]);
  });

  test.each([
    ['is not named by the house', '/series/low-tide/3', page('maud')],
    ['is an answer of another kind', GATHER, new Response('none', { status: 404, headers: { [PAGE_OF_HEADER]: 'maud' } })],
    ['says what is said once', GATHER, page('maud', '', { [SAID_ONCE_HEADER]: 'yes' })],
    ['is of somebody else than the house says', GATHER, page('jonas')],
    ['was made for everybody alike', GATHER, new Response('<main>')],
  ])('is not kept when it %s', async (_why, address, response) => {
    await store.seen(address, response);
    expect(keptPages()).toEqual([]);
  });

  test('of another part of the list stands in for one that is not here', async () => {
    await store.seen(GATHER, page('maud', 'whole list'));
    expect((await store.copyOf(`${GATHER}?part=2`))?.html).toBe('whole list');
    expect(await store.copyOf('/series/low-tide/2')).toBeNull();
  });

  test('of the workroom or the office asks nothing while nothing is kept', async () => {
    await store.seen('/workroom/bench', page('ilse'));
    expect(asked).toEqual([]);
  });

  test('takes the place of an older one: forty of the newest stay', async () => {
    may = { ...MAUD, series: [{ slug: 'low-tide', pages: Array.from({ length: 60 }, (_one, index) => `/series/low-tide/${index}`) }] };
    for (let index = 0; index < 45; index += 1) {
      now = new Date(now.getTime() + 1_000);
      await store.seen(`/series/low-tide/${index}`, page('maud'));
    }
    expect(keptPages()).toHaveLength(40);
    expect(await store.copyOf('/series/low-tide/0')).toBeNull();
  });
});

describe('nothing stays', () => {
  beforeEach(async () => {
    await store.seen('/loom', page('maud'));
    await store.seen(GATHER, page('maud', '<img src="/media/abc/small">'));
    expect(keptPages()).toHaveLength(3);
  });

  test('after she has signed out: the next page is made for nobody', async () => {
    await store.seen('/sign-in', page(NOBODY));
    expect(caches.in(PAGES)).toEqual([]);
  });

  test('once somebody else has signed in', async () => {
    may = { person: 'pell', pages: [], series: [] };
    await store.seen('/office', page('pell'));
    expect(caches.in(PAGES)).toEqual([]);
  });

  test('of a series whose seat has ended, whichever page she opens next', async () => {
    may = { person: 'maud', pages: [], series: [] };
    await store.seen('/account', page('maud'));
    expect(keptPages()).toEqual([]);
  });

  test('of a part that closed again, with its pictures; the rest does', async () => {
    may = { ...MAUD, series: [] };
    await store.seen('/account', page('maud'));
    expect(keptPages()).toEqual(['/loom']);
  });

  test('but without an answer of the house all of it does', async () => {
    may = 'away';
    await store.seen('/account', page('maud'));
    expect(keptPages()).toHaveLength(3);
  });
});

describe('a series she asked to keep', () => {
  test('is fetched whole, and again what is older than half a day', async () => {
    expect(await store.keepSeries('low-tide')).toEqual({ slugs: ['low-tide'], missing: 0 });
    expect(keptPages()).toEqual(['/loom', '/series/low-tide/2', GATHER, `${GATHER}?part=2`]);
    asked = [];
    await store.seen('/account', page('maud'));
    expect(asked).toEqual(['/api/kept-pages']);
    now = new Date('2026-12-02T13:05:00Z');
    await store.seen('/account', page('maud'));
    expect(asked.filter((address) => address.startsWith('/series/'))).toHaveLength(3);
  });

  test('gains a part as it opens', async () => {
    await store.keepSeries('low-tide');
    may = { ...MAUD, series: [{ slug: 'low-tide', pages: ['/series/low-tide/2', '/series/low-tide/3'] }] };
    await store.seen('/account', page('maud'));
    expect(keptPages()).toEqual(['/loom', '/series/low-tide/2', '/series/low-tide/3']);
  });

  test('is told as missing without a connection', async () => {
    may = 'away';
    expect(await store.keepSeries('low-tide')).toEqual({ slugs: [], missing: 1 });
  });

  test('goes when she asks', async () => {
    await store.keepSeries('low-tide');
    expect(await store.dropSeries('low-tide')).toEqual({ slugs: [], missing: 0 });
    expect(keptPages()).toEqual(['/loom']);
  });
});

test('after a new build only files of kept pages and of the page for being without a connection stay', async () => {
  await store.keepOfflinePage();
  await store.seen(GATHER, page('maud', '<script src="/_astro/client.js">'));
  const files = await caches.open(FILES);
  await files.put('/_astro/of-an-older-build.js', new Response(''));
  await caches.open('fellmark-pages-0');
  await store.sweep();
  expect(caches.in(FILES)).toEqual(['/_astro/client.js', '/_astro/deep.js', '/offline']);
  expect(await caches.keys()).toEqual([FILES, PAGES]);
});
