/**
 * One spelling for every address. The router reads `//workroom`, `/\workroom` and `/%77orkroom` as it reads
 * `/workroom`, while a guard in front of it may not: so other spellings never get past the door.
 */
import type { Handler } from '#server/web/front/handler.ts';
import { refuse } from '#server/web/front/refuse.ts';

const UNRESERVED = /%([0-9a-f]{2})/gi;
const PLAIN = /^[A-Za-z0-9\-._~]$/;
const BROKEN_ESCAPE = /%(?![0-9a-f]{2})/i;

/**
 * The canonical form of a request target (path with query), or undefined when there is none: not an absolute path,
 * a broken or NUL escape, a fragment.
 * Follows RFC 3986 section 6.2.2: unreserved characters unescaped (once), dot segments removed; beyond it,
 * backslashes are read as slashes and runs of slashes as one.
 */
export function canonicalTarget(target: string): string | undefined {
  if (!/^[/\\]/.test(target) || target.includes('#')) return undefined;
  const cut = target.indexOf('?');
  const path = cut === -1 ? target : target.slice(0, cut);
  const query = cut === -1 ? '' : target.slice(cut);
  if (BROKEN_ESCAPE.test(path) || path.includes('%00')) return undefined;
  const plain = path
    .replace(UNRESERVED, (escape, hex: string) => {
      const character = String.fromCharCode(Number.parseInt(hex, 16));
      return PLAIN.test(character) ? character : escape.toUpperCase();
    })
    .replace(/\\|%5C/g, '/');
  return withoutDotSegments(plain) + query;
}

function withoutDotSegments(path: string): string {
  const kept: string[] = [];
  const segments = path.split('/').filter((segment) => segment !== '');
  for (const segment of segments) {
    if (segment === '..') kept.pop();
    else if (segment !== '.') kept.push(segment);
  }
  const endsOpen = /\/$|\/\.{1,2}$/.test(path);
  return `/${kept.join('/')}${endsOpen && kept.length > 0 ? '/' : ''}`;
}

/** Sends every other spelling of an address to the one that counts: 308, which keeps method and body. */
export const canonicalPath: Handler = (request, response, next) => {
  const target = request.url ?? '/';
  const canonical = canonicalTarget(target);
  if (canonical === undefined) {
    refuse(request, response, 400, 'This address cannot be read.');
  } else if (canonical === target) {
    next();
  } else {
    response.writeHead(308, { Location: canonical, 'Content-Length': 0, 'Cache-Control': 'no-store' });
    response.end();
  }
};
