import type { Buyer } from './payment-state.ts';
import { digitsOf, hasCheckDigit, TEST_ACCOUNTS, TEST_CARDS } from './test-cards.ts';

/** What was typed on the pay page, by the names of its fields. */
export interface Typed {
  readonly email: string;
  readonly number: string;
  readonly expiry: string;
  readonly cvc: string;
  readonly name: string;
  readonly country: string;
  readonly account: string;
}

export type TypedField = keyof Typed;
export type Wrong = Partial<Record<TypedField, string>>;

export const COUNTRIES: readonly (readonly [string, string])[] = [
  ['AT', 'Austria'],
  ['BE', 'Belgium'],
  ['CA', 'Canada'],
  ['CH', 'Switzerland'],
  ['DE', 'Germany'],
  ['DK', 'Denmark'],
  ['FR', 'France'],
  ['GB', 'United Kingdom'],
  ['IE', 'Ireland'],
  ['JP', 'Japan'],
  ['NL', 'Netherlands'],
  ['NO', 'Norway'],
  ['NZ', 'New Zealand'],
  ['PL', 'Poland'],
  ['SE', 'Sweden'],
  ['US', 'United States'],
];

export function readTyped(form: URLSearchParams): Typed {
  const field = (name: string) => (form.get(name) ?? '').trim().slice(0, 200);
  return {
    email: field('email'),
    number: field('number'),
    expiry: field('expiry'),
    cvc: field('cvc'),
    name: field('name'),
    country: field('country'),
    account: field('account'),
  };
}

export function emptyTyped(email: string): Typed {
  return { email, number: '', expiry: '', cvc: '', name: '', country: 'DE', account: TEST_ACCOUNTS[0].number };
}

/** The form filled in with a test card; what else was typed stays. */
export function filledWith(typed: Typed, number: string, thisYear: number): Typed {
  const known = TEST_CARDS.some((card) => card.number === number);
  if (!known) return typed;
  return { ...typed, number: grouped(number), expiry: `12/${String(thisYear + 3).slice(-2)}`, cvc: cvcLength(number) === 4 ? '1234' : '123' };
}

export function grouped(number: string): string {
  return digitsOf(number).replace(/(.{4})(?=.)/g, '$1 ');
}

/** American cards carry four digits on their front, others three on their back. */
function cvcLength(number: string): 3 | 4 {
  return /^3[47]/.test(digitsOf(number)) ? 4 : 3;
}

export function buyerIn(typed: Typed): Buyer {
  return { email: typed.email, name: typed.name, country: COUNTRIES.some(([code]) => code === typed.country) ? typed.country : 'DE' };
}

export type CardReading = { readonly ok: true; readonly number: string; readonly expMonth: number; readonly expYear: number } | { readonly ok: false; readonly wrong: Wrong };

/** Checks what a card payment needs, as any till does before it asks a bank. */
export function readCard(typed: Typed, now: Date): CardReading {
  const wrong: Wrong = { ...wrongAddress(typed) };
  const number = digitsOf(typed.number);
  if (number === '') wrong.number = 'The card number is missing. Take one from the list below.';
  else if (!/^\d{12,19}$/.test(number)) wrong.number = 'A card number has 12 to 19 digits and nothing else.';
  else if (!hasCheckDigit(number)) wrong.number = 'This is not a card number: its last digit does not fit the others.';
  const expiry = /^(\d{1,2})\s*[/\-. ]?\s*(\d{2}|\d{4})$/.exec(typed.expiry);
  const expMonth = Number(expiry?.[1]);
  const expYear = Number(expiry?.[2]) % 2000 % 100 + 2000;
  if (typed.expiry === '') wrong.expiry = 'The expiry is missing. Any month to come works, 12/34 for instance.';
  else if (!expiry || expMonth < 1 || expMonth > 12) wrong.expiry = 'Type month and year like 12/34.';
  else if (expYear * 12 + expMonth < now.getUTCFullYear() * 12 + now.getUTCMonth() + 1) wrong.expiry = 'This month is over. Any month to come works.';
  if (!/^\d+$/.test(typed.cvc) || typed.cvc.length !== cvcLength(number)) wrong.cvc = `The security code has ${cvcLength(number) === 4 ? 'four' : 'three'} digits; any will do.`;
  return Object.keys(wrong).length > 0 ? { ok: false, wrong } : { ok: true, number, expMonth, expYear };
}

export type AccountReading = { readonly ok: true; readonly iban: string; readonly paid: boolean } | { readonly ok: false; readonly wrong: Wrong };

export function readAccount(typed: Typed): AccountReading {
  const wrong: Wrong = { ...wrongAddress(typed) };
  const account = TEST_ACCOUNTS.find(({ number }) => number === digitsOf(typed.account).toUpperCase());
  if (!account) wrong.account = 'Only the accounts of this list are known here.';
  return account && wrong.email === undefined ? { ok: true, iban: account.number, paid: account.paid } : { ok: false, wrong };
}

export function wrongAddress(typed: Typed): Wrong {
  if (typed.email === '') return { email: 'The mail address is missing. Write it like name@saltmarsh.example.' };
  return /^[^\s@<>,;]+@[^\s@<>,;]+\.[^\s@<>,;]+$/.test(typed.email) ? {} : { email: 'This is not a mail address. Write it like name@saltmarsh.example.' };
}
