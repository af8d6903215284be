import type { Currency } from './currency.ts';

/** An amount of one currency in whole minor units (cents), negative for money given back. */
export interface Money {
  readonly amountMinor: number;
  readonly currency: Currency;
}

/**
 * @throws {RangeError} when `amountMinor` is not a whole number that a double holds exactly.
 */
export function money(amountMinor: number, currency: Currency): Money {
  if (!Number.isSafeInteger(amountMinor)) throw new RangeError(`${amountMinor} is not a whole number of minor units`);
  // Negative zero would print with a minus sign.
  return { amountMinor: amountMinor === 0 ? 0 : amountMinor, currency };
}

/**
 * @throws {TypeError} when the currencies differ: there is no rate of exchange in this house.
 * @throws {RangeError} when the sum leaves the range of exact whole numbers.
 */
export function addMoney(first: Money, ...others: readonly Money[]): Money {
  let sum = first.amountMinor;
  for (const other of others) {
    mustMatch(first, other);
    sum += other.amountMinor;
    if (!Number.isSafeInteger(sum)) throw new RangeError('The sum is too large to be counted exactly');
  }
  return money(sum, first.currency);
}

/** `first − second`. Throws as {@link addMoney}. */
export function subtractMoney(first: Money, second: Money): Money {
  return addMoney(first, negateMoney(second));
}

export function negateMoney(amount: Money): Money {
  return money(-amount.amountMinor, amount.currency);
}

/**
 * `amount` taken `count` times.
 * @throws {RangeError} when `count` is not a whole number or the product is too large.
 */
export function multiplyMoney(amount: Money, count: number): Money {
  if (!Number.isSafeInteger(count)) throw new RangeError(`${count} is not a whole number of times`);
  return money(amount.amountMinor * count, amount.currency);
}

export function sameMoney(first: Money, second: Money): boolean {
  return first.currency === second.currency && first.amountMinor === second.amountMinor;
}

function mustMatch(first: Money, second: Money): void {
  if (first.currency !== second.currency) throw new TypeError(`${first.currency} and ${second.currency} cannot be added`);
}
