/**
 * Pages of a student's own that her device keeps, so that she can follow without a connection: what server, page and
 * service worker have to agree on.
 */

/** On every page made for somebody or nobody: whose it is, by public id. */
export const PAGE_OF_HEADER = 'x-fellmark-page-of';
/** Its value where nobody is signed in. */
export const NOBODY = 'nobody';
/** On a page with words that are said once: it is not kept. */
export const SAID_ONCE_HEADER = 'x-fellmark-said-once';
/** Asked by the service worker for its own sake: nobody reads this page now. */
export const TO_KEEP_HEADER = 'x-fellmark-to-keep';

/** The answer of `GET /api/kept-pages`. Whatever is not named here may not lie on the device. */
export interface PagesToKeep {
  /** Public id of who asks; null where nobody is signed in. */
  readonly person: string | null;
  /** Pages of no single series: her loom. */
  readonly pages: readonly string[];
  readonly series: readonly { readonly slug: string; readonly pages: readonly string[] }[];
}

/** What a page tells the service worker. */
export type ToWorker =
  /** This page was opened before the worker was there. */
  | { readonly kind: 'opened'; readonly address: string }
  /** Keep all open pages of a series, now and as more open. */
  | { readonly kind: 'keep-series'; readonly slug: string }
  | { readonly kind: 'drop-series'; readonly slug: string }
  | { readonly kind: 'what-is-kept' };

/** The answer to all of them but `opened`, through the port that came along. */
export interface KeptSeries {
  /** Series whose pages were asked to be kept. */
  readonly slugs: readonly string[];
  /** Pages that could not be fetched just now. */
  readonly missing: number;
}
