// Which addresses a link in a lesson may have: pages of this site, places in the same lesson, pages elsewhere over
// https, and mail addresses. Judged after the parser has decoded entities, so no spelling of `javascript:` passes.

import { isLoneHalf } from './characters.ts';

const HTTPS = /^https:\/\/[a-z0-9](?:[a-z0-9.-]{0,253})(?::[0-9]{1,5})?(?:[/?#]|$)/i;
const MAIL = /^mailto:[a-z0-9.!#$&'*+/=?^_`{|}~-]{1,64}@[a-z0-9][a-z0-9.-]{0,253}$/i;

export type LinkAddress = { ok: true; url: string; external: boolean } | { ok: false; reason: string };

const HOW = 'A link begins with https:// for another site, / for a page of this site, # for a place in this lesson, or mailto: for an address.';

/** Whether `url`, as decoded by the parser, may stand in a link; `limit` is its greatest length. */
export function checkLinkAddress(url: string, limit: number): LinkAddress {
  if (url === '') return { ok: false, reason: `The link has no address. ${HOW}` };
  if (url.length > limit) return { ok: false, reason: `The address is longer than ${String(limit)} characters. Look for a shorter one for the same page.` };
  for (let index = 0; index < url.length; index += 1) {
    const code = url.charCodeAt(index);
    if (isRefusedInAddress(code) || isLoneHalf(url, index, code)) return { ok: false, reason: `The address holds a space, a backslash or a hidden character. ${HOW}` };
  }
  if (url.startsWith('//')) return { ok: false, reason: 'An address cannot begin with //. Write https:// before the name of the site.' };
  if (url.startsWith('/') || url.startsWith('#')) return { ok: true, url, external: false };
  if (HTTPS.test(url)) return { ok: true, url, external: true };
  if (MAIL.test(url)) return { ok: true, url, external: true };
  if (/^http:/i.test(url)) return { ok: false, reason: 'The address begins with http://. Write https://, so that the way there is safe.' };
  if (/^mailto:/i.test(url)) return { ok: false, reason: 'After mailto: comes one mail address and nothing else, such as mailto:ilse@saltmarsh.example.' };
  return { ok: false, reason: HOW };
}

/** Space and control codes, backslash, and marks that turn the writing direction. */
function isRefusedInAddress(code: number): boolean {
  if (code <= 0x20 || code === 0x5c) return true;
  if (code < 0x7f) return false;
  return code <= 0x9f || (code >= 0x200b && code <= 0x200f) || (code >= 0x2028 && code <= 0x202e) || (code >= 0x2066 && code <= 0x2069) || code === 0xfeff;
}
