import { describe, expect, test } from 'vitest';
import { CURRENCIES, isCurrency, minorDigits, minorPerMajor } from '#core/money/currency.ts';
import { addMoney, money, multiplyMoney, negateMoney, sameMoney, subtractMoney } from '#core/money/money.ts';

describe('currencies', () => {
  test('are those that are paid as their minor digits say', () => {
    expect([...CURRENCIES].sort()).toEqual(['AUD', 'CAD', 'CHF', 'CZK', 'DKK', 'EUR', 'GBP', 'JPY', 'NOK', 'NZD', 'PLN', 'SEK', 'USD']);
    for (const special of ['ISK', 'UGX', 'HUF', 'TWD', 'eur', '', 'toString', '__proto__']) expect(isCurrency(special)).toBe(false);
  });

  test.each(CURRENCIES.map((currency) => [currency]))('%s has the minor digits that the standard data of the platform gives it', (currency) => {
    const { maximumFractionDigits } = new Intl.NumberFormat('en', { style: 'currency', currency }).resolvedOptions();
    expect(minorDigits(currency)).toBe(maximumFractionDigits);
    expect(minorPerMajor(currency)).toBe(10 ** (maximumFractionDigits ?? 0));
  });
});

describe('amounts', () => {
  test('are added within one currency only', () => {
    expect(addMoney(money(6800, 'EUR'), money(-450, 'EUR'), money(1, 'EUR'))).toEqual(money(6351, 'EUR'));
    expect(subtractMoney(money(100, 'EUR'), money(130, 'EUR'))).toEqual(money(-30, 'EUR'));
    expect(() => addMoney(money(1, 'EUR'), money(1, 'USD'))).toThrow(TypeError);
  });

  test('are whole and exact, or refused', () => {
    expect(() => money(0.1, 'EUR')).toThrow(RangeError);
    expect(() => money(2 ** 53, 'EUR')).toThrow(RangeError);
    expect(() => addMoney(money(2 ** 53 - 1, 'EUR'), money(1, 'EUR'))).toThrow(RangeError);
    expect(() => multiplyMoney(money(2 ** 52, 'EUR'), 4)).toThrow(RangeError);
    expect(() => multiplyMoney(money(1, 'EUR'), 0.5)).toThrow(RangeError);
  });

  test('have no negative zero', () => {
    expect(Object.is(negateMoney(money(0, 'EUR')).amountMinor, 0)).toBe(true);
    expect(Object.is(multiplyMoney(money(-5, 'EUR'), 0).amountMinor, 0)).toBe(true);
  });

  test('are the same when number and currency are', () => {
    expect(sameMoney(money(1, 'EUR'), money(1, 'EUR'))).toBe(true);
    expect(sameMoney(money(1, 'EUR'), money(1, 'USD'))).toBe(false);
  });
});
