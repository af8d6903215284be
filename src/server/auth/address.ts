/** The one form in which addresses are compared. */
import { domainToASCII } from 'node:url';

/**
 * Local part as written but lower case, domain in lower case and punycode; null when it is no address that we could
 * write to (one @, no blanks, quotes, brackets or lists; RFC 5321 lengths).
 */
export function addressKey(typed: string): string | null {
  const match = /^([^\s@,:;<>"()[\]\\\p{C}]{1,64})@([^\s@,:;<>"()[\]\\\p{C}]{1,253})$/u.exec(typed.trim());
  const [, local, domain] = match ?? [];
  if (local === undefined || domain === undefined) return null;
  const ascii = domainToASCII(domain.toLowerCase());
  if (!/^[a-z0-9-]+(\.[a-z0-9-]+)+$/.test(ascii) || !/^[\x21-\x7e]+$/.test(local)) return null;
  return `${local.toLowerCase()}@${ascii}`;
}
