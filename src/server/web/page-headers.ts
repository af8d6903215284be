/** Headers of pages and answers that Astro does not set by itself. The front server adds what every response carries. */

/** Sources besides the hashes that the build puts in: written where the pay page's address is known, at run time. */
export function completePolicy(policy: string | null, payOrigin: string | null): string | null {
  if (policy === null) return null;
  const formTargets = payOrigin === null ? "'self'" : `'self' ${payOrigin}`;
  return `${policy.replace(/;?\s*$/, '')}; form-action ${formTargets}; frame-ancestors 'none';`;
}

/** Pages shown to a signed-in person are nobody else's, nor any cache's. */
export function cacheRule(signedIn: boolean): string {
  return signedIn ? 'private, no-store' : 'private, no-cache';
}

/** For a page whose address is a secret: it is told to nobody it links to, and kept by nobody. */
export function keepTokenHere(headers: Headers): void {
  headers.set('Referrer-Policy', 'no-referrer');
  headers.set('Cache-Control', 'private, no-store');
}
