/**
 * Whether a request that changes something comes from our own pages. Browsers say so in Sec-Fetch-Site; older ones in
 * Origin. A request with neither is no browser's form and is refused, but for routes that carry a proof of their own.
 */
const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/** `ownOrigins`: scheme, host and port of every address at which these pages answer. */
export function comesFromOwnPages(method: string, headers: Headers, ownOrigins: readonly string[]): boolean {
  if (SAFE.has(method)) return true;
  const site = headers.get('sec-fetch-site');
  if (site !== null) return site === 'same-origin' || site === 'none';
  const origin = headers.get('origin');
  return origin !== null && ownOrigins.includes(origin);
}

/** The public address, and in the demo the two names of this machine. */
export function ownOrigins(publicUrl: string, demo: boolean): string[] {
  const own = new URL(publicUrl);
  const port = own.port === '' ? '' : `:${own.port}`;
  return demo ? [own.origin, `http://127.0.0.1${port}`, `http://localhost${port}`] : [own.origin];
}
