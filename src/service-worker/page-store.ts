/**
 * The pages of one person that this device keeps. What may lie here is decided by the server alone (`/api/kept-pages`),
 * asked anew with each of her pages that comes from it: whatever it does not name any more is taken away, and all of it
 * as soon as a page was made for nobody or for somebody else.
 */
import { NOBODY, PAGE_OF_HEADER, SAID_ONCE_HEADER, TO_KEEP_HEADER, type KeptSeries, type PagesToKeep } from '#contracts/kept-pages.ts';
import { filesIn, picturesIn } from './files-in.ts';
import { titleIn, type KeptPage } from './told-page.ts';

export const PAGES = 'fellmark-pages-1';
export const FILES = 'fellmark-files-1';
export const OFFLINE_PAGE = '/offline';

const STATE = '/kept-state';
const KEPT_AT = 'x-fellmark-kept-at';
const TITLE = 'x-fellmark-title';
const PICTURES = 'x-fellmark-pictures';
/** Pages only opened, not asked to be kept: so many of the newest stay. */
const MOST_OPENED = 40;
/** A page asked to be kept is fetched again when it is older. */
const FRESH_MS = 12 * 3_600_000;

interface State {
  readonly person: string;
  /** Slugs of series she asked to keep. */
  readonly asked: readonly string[];
}

interface Surroundings {
  readonly caches: Pick<CacheStorage, 'open' | 'delete' | 'keys'>;
  readonly fetch: (address: string, init?: RequestInit) => Promise<Response>;
  readonly now: () => Date;
}

export interface KeptCopy {
  readonly html: string;
  readonly headers: Headers;
  readonly keptAt: Date;
}

const pathOf = ({ url }: Request): string => {
  const { pathname, search } = new URL(url);
  return pathname + search;
};

export class PageStore {
  /** One act after another: each begins with what the one before left. */
  private turn: Promise<unknown> = Promise.resolve();

  constructor(private readonly around: Surroundings) {}

  /** A kept page by its address; one with another question (`?part=3`) stands in for what is not here. */
  async copyOf(address: string): Promise<KeptCopy | null> {
    const pages = await this.around.caches.open(PAGES);
    const page = (await pages.match(address)) ?? (await pages.match(address, { ignoreSearch: true }));
    const keptAt = page?.headers.get(KEPT_AT) ?? null;
    return page === undefined || keptAt === null ? null : { html: await page.text(), headers: page.headers, keptAt: new Date(keptAt) };
  }

  /** A kept picture or file of the build. */
  async fileOf(address: string): Promise<Response | undefined> {
    return (await (await this.around.caches.open(FILES)).match(address)) ?? (await (await this.around.caches.open(PAGES)).match(address));
  }

  /** What can be read without a connection: pages without a question in their address. */
  async list(): Promise<KeptPage[]> {
    const pages = await this.keptPages();
    return pages.filter(({ address }) => !address.includes('?')).map(({ address, headers }) => ({ address, title: decodeURIComponent(headers.get(TITLE) ?? '') }));
  }

  /** A page that has come from the server. Its body is read only when the page is kept. */
  seen(address: string, response: Response): Promise<void> {
    return this.inTurn(async () => {
      const person = response.headers.get(PAGE_OF_HEADER);
      // Made for everybody alike, or no page: says nothing of who is signed in.
      if (person === null) return;
      const before = await this.state();
      if (before !== null && before.person !== person) await this.wipe();
      if (person === NOBODY || (before?.person !== person && !/^\/(?:loom|series)\b/.test(address))) return;
      const may = await this.askWhatMayBeKept(person);
      if (may === null) return;
      const saysOnce = response.headers.has(SAID_ONCE_HEADER);
      if (response.status === 200 && !saysOnce && namedIn(may).has(address)) await this.keep(address, response, person);
      await this.fetchAsked(may);
      await this.dropOldest(may);
    });
  }

  keepSeries(slug: string): Promise<KeptSeries> {
    return this.inTurn(async () => {
      const may = await this.askWhatMayBeKept(null);
      if (may?.person == null) return { slugs: (await this.state())?.asked ?? [], missing: 1 };
      const asked = (await this.state())?.asked ?? [];
      await this.remember({ person: may.person, asked: [...new Set([...asked, slug])] });
      return { slugs: [...new Set([...asked, slug])], missing: await this.fetchAsked(may) };
    });
  }

  dropSeries(slug: string): Promise<KeptSeries> {
    return this.inTurn(async () => {
      const state = await this.state();
      const slugs = (state?.asked ?? []).filter((one) => one !== slug);
      if (state !== null) await this.remember({ ...state, asked: slugs });
      await this.remove((address) => address.startsWith(`/series/${slug}/`));
      return { slugs, missing: 0 };
    });
  }

  async whatIsKept(): Promise<KeptSeries> {
    return { slugs: (await this.state())?.asked ?? [], missing: 0 };
  }

  /** The page for all that is not kept, with its files. Throws without a connection. */
  async keepOfflinePage(): Promise<void> {
    const response = await this.around.fetch(OFFLINE_PAGE);
    if (!response.ok) throw new Error('The page for being without a connection was not to be had.');
    await this.keepFiles(await response.clone().text());
    await (await this.around.caches.open(FILES)).put(OFFLINE_PAGE, response);
  }

  /** After a new build: what no kept page needs any more goes, and stores of another form. */
  async sweep(): Promise<void> {
    for (const name of await this.around.caches.keys()) if (name.startsWith('fellmark-') && name !== PAGES && name !== FILES) await this.around.caches.delete(name);
    const files = await this.around.caches.open(FILES);
    const pages = await this.keptPages();
    const texts = await Promise.all(pages.map(async ({ address }) => (await this.copyOf(address))?.html ?? ''));
    const offline = await files.match(OFFLINE_PAGE);
    const needed = new Set([OFFLINE_PAGE]);
    const look = async (text: string): Promise<void> => {
      for (const name of filesIn(text)) {
        if (needed.has(name)) continue;
        needed.add(name);
        if (/\.(?:js|css)$/.test(name)) await look((await (await files.match(name))?.text()) ?? '');
      }
    };
    for (const text of [...texts, (await offline?.text()) ?? '']) await look(text);
    for (const request of await files.keys()) if (!needed.has(pathOf(request))) await files.delete(request);
  }

  private inTurn<T>(act: () => Promise<T>): Promise<T> {
    const done = this.turn.then(act);
    this.turn = done.catch(() => undefined);
    return done;
  }

  /** Asks the server, and at once takes away what it does not name. Null when there is no answer, or one for somebody else. */
  private async askWhatMayBeKept(person: string | null): Promise<PagesToKeep | null> {
    const answer = await this.around.fetch('/api/kept-pages', { headers: { accept: 'application/json' } }).catch(() => null);
    if (answer?.ok !== true) return null;
    const may = (await answer.json()) as PagesToKeep;
    if (person !== null && may.person !== person) return null;
    const named = namedIn(may);
    await this.remove((address) => !named.has(address));
    const state = await this.state();
    if (state !== null) await this.remember({ ...state, asked: state.asked.filter((slug) => may.series.some((one) => one.slug === slug)) });
    return may;
  }

  /** @returns how many could not be had. */
  private async fetchAsked(may: PagesToKeep): Promise<number> {
    const state = await this.state();
    if (state === null || state.asked.length === 0) return 0;
    const here = new Map((await this.keptPages()).map(({ address, keptAt }) => [address, keptAt]));
    const freshSince = this.around.now().getTime() - FRESH_MS;
    const wanted = [...may.pages, ...may.series.filter(({ slug }) => state.asked.includes(slug)).flatMap(({ pages }) => pages)];
    let missing = 0;
    for (const address of wanted) {
      if ((here.get(address)?.getTime() ?? 0) > freshSince) continue;
      const response = await this.around.fetch(address, { headers: { [TO_KEEP_HEADER]: 'yes', accept: 'text/html' }, redirect: 'manual' }).catch(() => null);
      if (response?.status === 200 && response.headers.get(PAGE_OF_HEADER) === state.person) await this.keep(address, response, state.person);
      else missing += 1;
    }
    return missing;
  }

  private async keep(address: string, response: Response, person: string): Promise<void> {
    if ((await this.state()) === null) await this.remember({ person, asked: [] });
    const html = await response.text();
    await this.keepFiles(html);
    const pictures = picturesIn(html);
    const pages = await this.around.caches.open(PAGES);
    for (const picture of pictures) {
      if ((await pages.match(picture)) !== undefined) continue;
      const file = await this.around.fetch(picture).catch(() => null);
      if (file?.status === 200) await pages.put(picture, file);
    }
    const headers = new Headers(response.headers);
    for (const name of ['content-length', 'content-encoding', 'set-cookie']) headers.delete(name);
    headers.set(KEPT_AT, this.around.now().toISOString());
    headers.set(TITLE, encodeURIComponent(titleIn(html)));
    headers.set(PICTURES, JSON.stringify(pictures));
    await pages.put(address, new Response(html, { headers }));
  }

  /** Files of the build never change under their name: what is here is not fetched again. */
  private async keepFiles(text: string): Promise<void> {
    const files = await this.around.caches.open(FILES);
    for (const name of filesIn(text)) {
      if ((await files.match(name)) !== undefined) continue;
      const file = await this.around.fetch(name).catch(() => null);
      if (file?.ok !== true) continue;
      // Two files may name each other: this one is here before its own are looked for.
      await files.put(name, file.clone());
      if (/\.(?:js|css)$/.test(name)) await this.keepFiles(await file.text());
    }
  }

  private async dropOldest(may: PagesToKeep): Promise<void> {
    const asked = (await this.state())?.asked ?? [];
    const stay = new Set([...may.pages, ...may.series.filter(({ slug }) => asked.includes(slug)).flatMap(({ pages }) => pages)]);
    const opened = (await this.keptPages()).filter(({ address }) => !stay.has(address)).sort((a, b) => b.keptAt.getTime() - a.keptAt.getTime());
    const old = new Set(opened.slice(MOST_OPENED).map(({ address }) => address));
    if (old.size > 0) await this.remove((address) => old.has(address));
  }

  private async keptPages(): Promise<{ address: string; keptAt: Date; headers: Headers }[]> {
    const pages = await this.around.caches.open(PAGES);
    const found = await Promise.all((await pages.keys()).map(async (request) => ({ address: pathOf(request), headers: (await pages.match(request))?.headers ?? new Headers() })));
    return found.flatMap(({ address, headers }) => {
      const keptAt = headers.get(KEPT_AT);
      return keptAt === null ? [] : [{ address, headers, keptAt: new Date(keptAt) }];
    });
  }

  /** Takes pages away, and pictures that no page left shows. */
  private async remove(isGone: (address: string) => boolean): Promise<void> {
    const kept = await this.keptPages();
    const gone = kept.filter(({ address }) => isGone(address));
    if (gone.length === 0) return;
    const pages = await this.around.caches.open(PAGES);
    for (const { address } of gone) await pages.delete(address);
    const shown = new Set(kept.filter((page) => !gone.includes(page)).flatMap(({ headers }) => JSON.parse(headers.get(PICTURES) ?? '[]') as string[]));
    for (const request of await pages.keys()) {
      const address = pathOf(request);
      if (address.startsWith('/media/') && !shown.has(address)) await pages.delete(request);
    }
  }

  private async wipe(): Promise<void> {
    await this.around.caches.delete(PAGES);
  }

  private async state(): Promise<State | null> {
    const kept = await (await this.around.caches.open(PAGES)).match(STATE);
    return kept === undefined ? null : ((await kept.json()) as State);
  }

  private async remember(state: State): Promise<void> {
    await (await this.around.caches.open(PAGES)).put(STATE, new Response(JSON.stringify(state)));
  }
}

function namedIn({ pages, series }: PagesToKeep): ReadonlySet<string> {
  return new Set([...pages, ...series.flatMap((one) => one.pages)]);
}
