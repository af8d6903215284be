import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { CURRENCIES } from '#core/money/currency.ts';
import { formatPrice, priceFieldText } from '#core/money/format-price.ts';
import { money } from '#core/money/money.ts';
import { parsePrice } from '#core/money/parse-price.ts';

function minorOf(text: string, currency: (typeof CURRENCIES)[number] = 'EUR'): number | string {
  const outcome = parsePrice(text, currency);
  return outcome.ok ? outcome.value.amountMinor : (outcome.problems[0]?.code ?? '');
}

function sentenceFor(text: string, currency: (typeof CURRENCIES)[number] = 'EUR'): string {
  const outcome = parsePrice(text, currency);
  return outcome.ok ? '' : (outcome.problems[0]?.message ?? '');
}

describe('a typed price', () => {
  test.each([
    ['68', 6800],
    ['68,00', 6800],
    ['68.00', 6800],
    ['68.5', 6850],
    ['68,', 6800],
    ['.50', 50],
    ['0', 0],
    ['0068', 6800],
    [' €68 ', 6800],
    ['€ 68,00', 6800],
    ['68 EUR', 6800],
    ['eur 68', 6800],
    ['1 234', 123_400],
    ['1\u202f234,50', 123_450],
    ['1.234,50', 123_450],
    ['1,234.50', 123_450],
    ["1'234.50", 123_450],
    ['12.50', 1250],
    ['12.5000', 1250],
  ])('%s is %d cents', (text, cents) => {
    expect(minorOf(text)).toBe(cents);
  });

  test.each([
    ['', 'E_PRICE_MISSING'],
    ['   ', 'E_PRICE_MISSING'],
    ['€', 'E_PRICE_MISSING'],
    ['sixty', 'E_PRICE_UNREADABLE'],
    ['6 8', 'E_PRICE_UNREADABLE'],
    ['68 USD', 'E_PRICE_UNREADABLE'],
    ['6e3', 'E_PRICE_UNREADABLE'],
    ['0x10', 'E_PRICE_UNREADABLE'],
    ['1.2.3', 'E_PRICE_UNREADABLE'],
    ['1.234.50', 'E_PRICE_UNREADABLE'],
    ['NaN', 'E_PRICE_UNREADABLE'],
    ['68'.padEnd(60, '0'), 'E_PRICE_UNREADABLE'],
    ['-4', 'E_PRICE_NEGATIVE'],
    ['\u22124,50', 'E_PRICE_NEGATIVE'],
    ['68.0005', 'E_PRICE_TOO_FINE'],
    ['0.005', 'E_PRICE_TOO_FINE'],
    ['1.234', 'E_PRICE_AMBIGUOUS'],
    ['12,345', 'E_PRICE_AMBIGUOUS'],
    ['100000', 'E_PRICE_RANGE'],
    ['99999999999999999999', 'E_PRICE_RANGE'],
  ])('%s is refused: %s', (text, code) => {
    expect(minorOf(text)).toBe(code);
  });

  test('says both readings of a price that can be read in two ways', () => {
    expect(sentenceFor('1.234')).toBe('This can be read in two ways. Type 1234 for the larger price, or 1.23 for the smaller.');
  });

  test('says the range in the currency of the price', () => {
    const outcome = parsePrice('0.20', 'EUR', { leastMinor: 50, mostMinor: 500_00 });
    expect(outcome.ok ? '' : outcome.problems[0]?.message).toBe('Between €0.50 and €500.00 works.');
  });

  test('takes no point in a currency without smaller coins, but takes thousands', () => {
    expect(minorOf('6800', 'JPY')).toBe(6800);
    expect(minorOf('6.800', 'JPY')).toBe(6800);
    expect(minorOf('6800.00', 'JPY')).toBe(6800);
    expect(minorOf('68.5', 'JPY')).toBe('E_PRICE_TOO_FINE');
  });

  test('takes a bare dollar sign as the dollars of the price', () => {
    expect(minorOf('$68', 'USD')).toBe(6800);
    expect(minorOf('$68', 'CAD')).toBe(6800);
    expect(minorOf('CA$68', 'CAD')).toBe(6800);
    expect(minorOf('$68', 'EUR')).toBe('E_PRICE_UNREADABLE');
  });

  test('reads back every price that is shown, and every price put into a field', () => {
    fc.assert(
      fc.property(fc.constantFrom(...CURRENCIES), fc.integer({ min: 0, max: 9_999_999 }), (currency, amountMinor) => {
        const amount = money(amountMinor, currency);
        expect(minorOf(formatPrice(amount), currency)).toBe(amountMinor);
        expect(minorOf(priceFieldText(amount), currency)).toBe(amountMinor);
      }),
    );
  });

  test('never throws and never answers a part of a cent, whatever is typed', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.string({ unit: fc.constantFrom(...'0123456789.,\u202f -€') })), fc.constantFrom(...CURRENCIES), (text, currency) => {
        const outcome = parsePrice(text, currency);
        if (outcome.ok) expect(Number.isSafeInteger(outcome.value.amountMinor)).toBe(true);
        else expect(outcome.problems[0]?.message).not.toBe('');
      }),
    );
  });
});

describe('a shown price', () => {
  test.each([
    [6800, 'EUR', '€68.00'],
    [-450, 'EUR', '\u2212€4.50'],
    [5, 'EUR', '€0.05'],
    [123_400, 'EUR', '€1\u202f234.00'],
    [123_456_789, 'USD', '$1\u202f234\u202f567.89'],
    [6800, 'CHF', 'CHF\u00a068.00'],
    [6800, 'JPY', 'JPY\u00a06\u202f800'],
    [6800, 'CAD', 'CA$68.00'],
  ] as const)('%d minor units of %s are shown as %s', (amountMinor, currency, shown) => {
    expect(formatPrice(money(amountMinor, currency))).toBe(shown);
  });
});
