import { expect } from 'vitest';

/** Equal within a relative tolerance. */
export function expectClose(actual: number, expected: number, relative = 1e-6): void {
  expect(Math.abs(actual - expected), `${String(actual)} is not ${String(expected)}`).toBeLessThanOrEqual(relative * Math.max(1e-300, Math.abs(expected)));
}

/** Equal to every digit that is printed: within half a unit of the last place. */
export function expectPrinted(actual: number, printed: string): void {
  const plain = printed.replace(/e.*$/u, '');
  const decimals = plain.includes('.') ? plain.length - plain.indexOf('.') - 1 : 0;
  expect(Math.abs(actual - Number(printed)), `${String(actual)} is not printed ${printed}`).toBeLessThanOrEqual(0.5 * 10 ** -decimals * (1 + 1e-6));
}
