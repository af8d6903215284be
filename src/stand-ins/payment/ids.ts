import { randomBytes } from 'node:crypto';

const SIGNS = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';

/** Prefixes by which the service's ids tell what they name. */
export type IdPrefix = 'cs_test' | 'pi' | 'ch' | 'py' | 're' | 'pyr' | 'txn' | 'evt' | 'req' | 'li' | 'price' | 'prod' | 'pm';

const LENGTHS: Partial<Record<IdPrefix, number>> = { cs_test: 58, req: 14 };

/** A fresh id of the service's form: its prefix, then letters and digits of both cases. */
export function newId(prefix: IdPrefix): string {
  return `${prefix}_${randomSigns(LENGTHS[prefix] ?? 24)}`;
}

export function randomSigns(count: number): string {
  // 248 is the largest multiple of 62 within an octet: higher ones would make some signs more likely.
  let text = '';
  while (text.length < count) {
    for (const octet of randomBytes(count)) {
      if (octet < 248 && text.length < count) text += SIGNS.charAt(octet % SIGNS.length);
    }
  }
  return text;
}
