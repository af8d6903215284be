import { fail, succeed, type Outcome } from '#core/outcome.ts';
import { currencySign, minorDigits, minorPerMajor, type Currency } from './currency.ts';
import { formatPrice } from './format-price.ts';
import { money, type Money } from './money.ts';

export interface PriceRange {
  readonly leastMinor: number;
  readonly mostMinor: number;
}

/** Widest range a price may have here: nothing up to 99 999.99 in a currency with two digits. */
const ANY_PRICE: PriceRange = { leastMinor: 0, mostMinor: 9_999_999 };

const LONGEST_TEXT = 40;

/**
 * A price as people type it: `68`, `68,00`, `68.00`, `€ 68`, `68 EUR`, `1 234,50`, `1.234,50`, `1,234.50`.
 * A single point or comma before one or two digits parts the minor units; before exactly three digits it parts thousands
 * only where the same text cannot mean anything else, so `1.234` is refused with both readings told.
 * @param range in minor units, both ends included.
 */
export function parsePrice(text: string, currency: Currency, range: PriceRange = ANY_PRICE): Outcome<Money> {
  const bare = withoutCurrency(text, currency);
  if (bare === '') return refuse('E_PRICE_MISSING', `The price is missing. Type it like ${example(currency)}.`);
  if (bare === undefined || text.length > LONGEST_TEXT) {
    return refuse('E_PRICE_UNREADABLE', `This is not a price in ${currency}. Type it like ${example(currency)}.`);
  }
  const parts = readNumber(bare, minorDigits(currency));
  if (!parts.ok) return refuse(parts.code, explain(parts, currency));
  const amountMinor = Number(parts.major) * minorPerMajor(currency) + Number(parts.minor);
  if (!Number.isSafeInteger(amountMinor) || amountMinor < range.leastMinor || amountMinor > range.mostMinor) {
    const least = formatPrice(money(range.leastMinor, currency));
    const most = formatPrice(money(range.mostMinor, currency));
    return refuse('E_PRICE_RANGE', `Between ${least} and ${most} works.`);
  }
  return succeed(money(amountMinor, currency));
}

type NumberParts =
  | { readonly ok: true; readonly major: string; readonly minor: string }
  | { readonly ok: false; readonly code: 'E_PRICE_UNREADABLE' | 'E_PRICE_NEGATIVE' | 'E_PRICE_TOO_FINE' | 'E_PRICE_AMBIGUOUS'; readonly digits: string };

function readNumber(text: string, digits: 0 | 2): NumberParts {
  if (/^[-\u2212\u2013]/.test(text)) return { ok: false, code: 'E_PRICE_NEGATIVE', digits: '' };
  const grouped = /^(\d{1,3}(?:([ '\u2019\u00a0\u202f\u2009]|[.,])\d{3})(?:\2\d{3})*)(?:([.,])(\d*))?$/.exec(text);
  if (grouped) return readGrouped(grouped, digits);
  const plain = /^(\d+)(?:[.,](\d*))?$/.exec(text) ?? /^()[.,](\d+)$/.exec(text);
  if (!plain) return { ok: false, code: 'E_PRICE_UNREADABLE', digits: '' };
  return finish(plain[1] ?? '', plain[2] ?? '', digits);
}

function readGrouped(match: RegExpExecArray, digits: 0 | 2): NumberParts {
  const [, whole = '', separator = '', point, minor = ''] = match;
  const sameSign = point !== undefined && point === separator;
  if (sameSign) return { ok: false, code: 'E_PRICE_UNREADABLE', digits: '' };
  const groups = whole.split(separator);
  // One point or comma and three digits after it: thousands in one country, a tenth of a cent in the other.
  if (point === undefined && /[.,]/.test(separator) && groups.length === 2 && digits > 0) {
    if (whole.startsWith('0')) return finish(groups[0] ?? '', groups[1] ?? '', digits);
    return { ok: false, code: 'E_PRICE_AMBIGUOUS', digits: groups.join('') };
  }
  return finish(groups.join(''), minor, digits);
}

function finish(major: string, minor: string, digits: 0 | 2): NumberParts {
  if (minor.length > digits && /[1-9]/.test(minor.slice(digits))) return { ok: false, code: 'E_PRICE_TOO_FINE', digits: '' };
  return { ok: true, major: major === '' ? '0' : major, minor: minor.slice(0, digits).padEnd(digits, '0') || '0' };
}

/** The text without the currency's sign or code; `undefined` when something else than a number is left. */
function withoutCurrency(text: string, currency: Currency): string | undefined {
  const sign = currencySign(currency);
  // Where dollars are the money of the land, nobody types whose dollars they are.
  const marks = sign.endsWith('$') ? [sign, currency, '$'] : [sign, currency];
  let bare = text.trim();
  for (const mark of marks) {
    if (bare.toUpperCase().startsWith(mark)) bare = bare.slice(mark.length).trim();
    else if (bare.toUpperCase().endsWith(mark)) bare = bare.slice(0, -mark.length).trim();
  }
  return /^[\d.,'\u2019\u00a0\u202f\u2009 \u2212\u2013-]*$/.test(bare) ? bare : undefined;
}

function explain(refusal: { readonly code: string; readonly digits: string }, currency: Currency): string {
  switch (refusal.code) {
    case 'E_PRICE_NEGATIVE':
      return 'A price cannot be less than nothing.';
    case 'E_PRICE_TOO_FINE':
      return minorDigits(currency) === 0
        ? `${currency} has no smaller coin. Type a whole number.`
        : `Two digits after the point are the most. Type it like ${example(currency)}.`;
    case 'E_PRICE_AMBIGUOUS': {
      const thousands = refusal.digits;
      const first = thousands.slice(0, -3);
      return `This can be read in two ways. Type ${thousands} for the larger price, or ${first}.${thousands.slice(-3, -1)} for the smaller.`;
    }
    default:
      return `This is not a price in ${currency}. Type it like ${example(currency)}.`;
  }
}

function example(currency: Currency): string {
  return minorDigits(currency) === 0 ? '6800' : '68 or 68.00';
}

function refuse(code: string, message: string): Outcome<Money> {
  return fail([{ code, path: '', message }]);
}
