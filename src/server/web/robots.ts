/** What programs that walk from link to link are asked to leave alone (RFC 9309). It keeps nothing secret: policies do. */
import { publicAddress } from '#server/web/public-address.ts';

/** Pages of one person, doors, and the shop's endless ways of asking for the same series. */
const LEAVE_ALONE = [
  '/account', '/api/', '/calendar/', '/confirm/', '/forgotten', '/gifts?', '/helping/', '/leave/', '/loom', '/new-password/', '/notices', '/office', '/prove', '/refused',
  '/series?', '/sign-in', '/sign-out', '/sign-up', '/workroom', '/_actions/',
];

export function robotsText(): string {
  return `User-agent: *\n${LEAVE_ALONE.map((path) => `Disallow: ${path}\n`).join('')}\nSitemap: ${publicAddress('/sitemap.xml')}\n`;
}
