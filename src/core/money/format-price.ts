import { currencySign, minorDigits, minorPerMajor } from './currency.ts';
import type { Money } from './money.ts';

const MINUS = '\u2212';
/** Between groups of three digits: a narrow space that does not break. */
const GROUP = '\u202f';
const NO_BREAK_SPACE = '\u00a0';

/**
 * An amount as it is shown: `€68.00`, `−€4.50`, `€1 234.00`, `CHF 68.00`, `JPY 6 800`. The sign stands before the number,
 * a code with a space that does not break; the minus is U+2212; thousands are parted by a narrow space.
 */
export function formatPrice({ amountMinor, currency }: Money): string {
  const sign = currencySign(currency);
  const gap = /[A-Z]$/.test(sign) ? NO_BREAK_SPACE : '';
  return `${amountMinor < 0 ? MINUS : ''}${sign}${gap}${plainDigits(Math.abs(amountMinor), currency, GROUP)}`;
}

/** The same number as it stands in a form field, ready to be typed over: `68.00`, `1234.50`, `6800`. */
export function priceFieldText({ amountMinor, currency }: Money): string {
  return `${amountMinor < 0 ? '-' : ''}${plainDigits(Math.abs(amountMinor), currency, '')}`;
}

function plainDigits(sizeMinor: number, currency: Money['currency'], group: string): string {
  const perMajor = minorPerMajor(currency);
  const major = String(Math.floor(sizeMinor / perMajor)).replace(/\B(?=(\d{3})+$)/g, group);
  const digits = minorDigits(currency);
  return digits === 0 ? major : `${major}.${String(sizeMinor % perMajor).padStart(digits, '0')}`;
}
