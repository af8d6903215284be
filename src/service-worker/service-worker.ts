/**
 * Stands between the house's pages and the net: the net comes first, and where it does not answer in time, a page kept
 * for the person who is signed in. It touches nothing but pages that are opened, files of the build, and pictures of
 * kept pages.
 */
import { PAGE_OF_HEADER, TO_KEEP_HEADER, type KeptSeries, type ToWorker } from '#contracts/kept-pages.ts';
import { OFFLINE_PAGE, PageStore, type KeptCopy } from './page-store.ts';
import { asOfWords, withAsOf, withKeptList } from './told-page.ts';

// The compiler's library of workers cannot stand beside that of pages; this is all of it that is used here.
interface LastingEvent extends Event { waitUntil(work: Promise<unknown>): void }
interface FetchEvent extends LastingEvent { readonly request: Request; respondWith(answer: Promise<Response>): void }
interface MessageFromPage extends LastingEvent { readonly data: ToWorker; readonly ports: readonly MessagePort[] }
interface Worker {
  readonly location: Location;
  readonly clients: { claim(): Promise<void> };
  skipWaiting(): Promise<void>;
  addEventListener(type: 'install' | 'activate', listener: (event: LastingEvent) => void): void;
  addEventListener(type: 'fetch', listener: (event: FetchEvent) => void): void;
  addEventListener(type: 'message', listener: (event: MessageFromPage) => void): void;
}
const worker = globalThis as unknown as Worker;

/** So long a page waits for the net where there is a copy of it. */
const LATE_MS = 4_000;
/** The house is being mended or started anew. */
const AWAY: ReadonlySet<number> = new Set([502, 503, 504]);

const store = new PageStore({ caches, fetch: (address, init) => fetch(address, init), now: () => new Date() });

worker.addEventListener('install', (event) => {
  event.waitUntil(store.keepOfflinePage().then(() => worker.skipWaiting()));
});

worker.addEventListener('activate', (event) => {
  event.waitUntil(store.sweep().then(() => worker.clients.claim()));
});

worker.addEventListener('fetch', (event) => {
  const { request } = event;
  const { origin, pathname, search } = new URL(request.url);
  if (request.method !== 'GET' || origin !== worker.location.origin) return;
  if (request.mode === 'navigate') openPage(event, pathname + search);
  else if (pathname.startsWith('/_astro/')) event.respondWith(store.fileOf(pathname).then((file) => file ?? fetch(request)));
  else if (request.destination === 'image' && pathname.startsWith('/media/')) {
    event.respondWith(fetch(request).catch(async (error: unknown) => {
      const picture = await store.fileOf(pathname + search);
      if (picture === undefined) throw error;
      return picture;
    }));
  }
});

function openPage(event: FetchEvent, address: string): void {
  const fromNet = fetch(event.request).then((response) => {
    // A film or a folder opened by its address is not held twice.
    const page = response.headers.has(PAGE_OF_HEADER) ? response.clone() : null;
    return { response, page };
  });
  event.waitUntil(fromNet.then(({ page }) => (page === null ? undefined : store.seen(address, page))).catch(() => undefined));
  event.respondWith(firstOf(fromNet.then(({ response }) => response), address));
}

async function firstOf(fromNet: Promise<Response>, address: string): Promise<Response> {
  const late = new Promise<null>((resolve) => { setTimeout(() => { resolve(null); }, LATE_MS); });
  const first = await Promise.race([fromNet.catch(() => null), late]);
  if (first !== null && !AWAY.has(first.status)) return first;
  const copy = await store.copyOf(address);
  if (copy !== null) return keptPage(copy);
  return first ?? fromNet.catch(() => offlinePage());
}

function keptPage({ html, headers, keptAt }: KeptCopy): Response {
  const { timeZone } = new Intl.DateTimeFormat().resolvedOptions();
  return new Response(withAsOf(html, asOfWords(keptAt, new Date(), timeZone)), { headers });
}

async function offlinePage(): Promise<Response> {
  const page = await store.fileOf(OFFLINE_PAGE);
  if (page === undefined) return Response.error();
  const headers = new Headers(page.headers);
  headers.delete('content-encoding');
  return new Response(withKeptList(await page.text(), await store.list()), { status: 503, headers });
}

worker.addEventListener('message', (event) => {
  const [port] = event.ports;
  event.waitUntil(actOn(event.data).then((answer) => port?.postMessage(answer), () => port?.postMessage(null)));
});

async function actOn(said: ToWorker): Promise<KeptSeries | null> {
  switch (said.kind) {
    case 'keep-series':
      return store.keepSeries(said.slug);
    case 'drop-series':
      return store.dropSeries(said.slug);
    case 'what-is-kept':
      return store.whatIsKept();
    case 'opened': {
      // Fetched once more for being kept: the page that is open came before there was a worker.
      const response = await fetch(said.address, { headers: { accept: 'text/html', [TO_KEEP_HEADER]: 'yes' }, redirect: 'manual' });
      await store.seen(said.address, response);
      return null;
    }
  }
}
