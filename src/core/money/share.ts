/**
 * Dividing whole minor units so that nothing is lost or invented: parts of a total by the largest remainder, a share of an
 * amount rounded to a whole unit once. All arithmetic is exact (big integers), so there is no rounding but the one asked for.
 */

/**
 * Parts of `totalMinor` in proportion to `weights`, by the largest remainder (Hamilton's method): every part gets its whole
 * share, the units left over go one each to the largest remainders, earlier parts first when remainders are equal.
 * The parts always add up to the total; a part of weight 0 gets nothing. A negative total gives negative parts.
 * @param weights whole numbers from 0; at least one above 0 unless the total is 0.
 * @throws {RangeError} when there is nothing to divide by.
 */
export function splitAmount(totalMinor: number, weights: readonly number[]): number[] {
  if (!Number.isSafeInteger(totalMinor)) throw new RangeError(`${totalMinor} is not a whole number of minor units`);
  const shares = weights.map((weight) => {
    if (!Number.isSafeInteger(weight) || weight < 0) throw new RangeError(`${weight} is not a weight`);
    return BigInt(weight);
  });
  const sum = shares.reduce((a, b) => a + b, 0n);
  if (sum === 0n) {
    if (totalMinor !== 0) throw new RangeError('There is no part to give the amount to');
    return weights.map(() => 0);
  }
  const total = BigInt(Math.abs(totalMinor));
  const parts = shares.map((share, index) => ({ index, whole: (total * share) / sum, rest: (total * share) % sum }));
  let left = total - parts.reduce((a, part) => a + part.whole, 0n);
  const byRemainder = parts.toSorted((a, b) => (a.rest === b.rest ? a.index - b.index : a.rest > b.rest ? -1 : 1));
  const extra = new Set<number>();
  for (const part of byRemainder) {
    if (left === 0n) break;
    extra.add(part.index);
    left -= 1n;
  }
  const sign = totalMinor < 0 ? -1 : 1;
  return parts.map(({ index, whole }) => withoutNegativeZero(sign * (Number(whole) + (extra.has(index) ? 1 : 0))));
}

/** One hundredth of a per cent: 10 000 is the whole. */
export type BasisPoints = number;

/**
 * The house's fee on an amount, rounded down, so that it never takes more than was agreed.
 * @param amountMinor from 0.
 * @param basisPoints whole, 0 to 10 000 (1250 is 12.5 %).
 */
export function feeOf(amountMinor: number, basisPoints: BasisPoints): number {
  if (amountMinor < 0) throw new RangeError('A fee is taken of an amount that was paid');
  return Number((BigInt(amountMinor) * checkedBasisPoints(basisPoints)) / 10_000n);
}

/** A share of an amount (a discount, a tax), rounded half away from zero. */
export function shareOf(amountMinor: number, basisPoints: BasisPoints): number {
  return roundedQuotient(BigInt(amountMinor) * checkedBasisPoints(basisPoints), 10_000n);
}

/**
 * The tax contained in a price that includes it, rounded half away from zero: `price · rate / (1 + rate)`.
 * @param basisPoints of the rate: 1900 for 19 %.
 */
export function taxWithin(amountMinor: number, basisPoints: BasisPoints): number {
  const rate = checkedBasisPoints(basisPoints);
  return roundedQuotient(BigInt(amountMinor) * rate, 10_000n + rate);
}

function roundedQuotient(numerator: bigint, denominator: bigint): number {
  const size = numerator < 0n ? -numerator : numerator;
  const rounded = Number((2n * size + denominator) / (2n * denominator));
  return withoutNegativeZero(numerator < 0n ? -rounded : rounded);
}

function checkedBasisPoints(basisPoints: number): bigint {
  if (!Number.isSafeInteger(basisPoints) || basisPoints < 0 || basisPoints > 10_000) {
    throw new RangeError(`${basisPoints} is not a share: whole hundredths of a per cent, 0 to 10 000`);
  }
  return BigInt(basisPoints);
}

function withoutNegativeZero(value: number): number {
  return value === 0 ? 0 : value;
}
