/**
 * The currencies a series can be sold in. Each has a fixed number of minor digits (ISO 4217); an amount is always a whole
 * number of minor units with its currency beside it. Currencies whose payment rules differ from their ISO digits are left out.
 */
const CURRENCY_FACTS = {
  EUR: { digits: 2, sign: '€' },
  USD: { digits: 2, sign: '$' },
  GBP: { digits: 2, sign: '£' },
  CHF: { digits: 2, sign: 'CHF' },
  SEK: { digits: 2, sign: 'SEK' },
  NOK: { digits: 2, sign: 'NOK' },
  DKK: { digits: 2, sign: 'DKK' },
  PLN: { digits: 2, sign: 'PLN' },
  CZK: { digits: 2, sign: 'CZK' },
  CAD: { digits: 2, sign: 'CA$' },
  AUD: { digits: 2, sign: 'A$' },
  NZD: { digits: 2, sign: 'NZ$' },
  JPY: { digits: 0, sign: 'JPY' },
} as const satisfies Record<string, { digits: 0 | 2; sign: string }>;

export type Currency = keyof typeof CURRENCY_FACTS;

function listCurrencies(): readonly Currency[] {
  return Object.keys(CURRENCY_FACTS).filter(isCurrency);
}

/** Upper-case code, as ISO 4217 writes it. */
export function isCurrency(code: string): code is Currency {
  return Object.hasOwn(CURRENCY_FACTS, code);
}

export const CURRENCIES: readonly Currency[] = listCurrencies();

/** How many digits stand after the point: 2 for EUR, 0 for JPY. */
export function minorDigits(currency: Currency): 0 | 2 {
  return CURRENCY_FACTS[currency].digits;
}

/** Minor units in one major unit: 100 for EUR, 1 for JPY. */
export function minorPerMajor(currency: Currency): 1 | 100 {
  return CURRENCY_FACTS[currency].digits === 2 ? 100 : 1;
}

/** The sign written before an amount: `€`, or the code where a sign would be mistaken for another currency's. */
export function currencySign(currency: Currency): string {
  return CURRENCY_FACTS[currency].sign;
}
