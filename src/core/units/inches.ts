/** Inches as makers write them: a whole number and a reduced fraction with a denominator that halves. */
import { ceilSafe, roundHalfUp } from '#core/craft/rounding.ts';

export const MM_PER_INCH = 25.4;

export interface Inches {
  readonly whole: number;
  /** Reduced; missing when the inches come out whole. */
  readonly fraction?: { readonly numerator: number; readonly denominator: number };
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}

/** `inches` ≥ 0, in parts of `denominator` (8, 16 …); halves go up, `up` never comes out short. */
export function toInches(inches: number, denominator: number, round: 'nearest' | 'up'): Inches {
  const parts = round === 'up' ? ceilSafe(inches * denominator) : roundHalfUp(inches * denominator);
  const whole = Math.floor(parts / denominator);
  const rest = parts - whole * denominator;
  if (rest === 0) return { whole };
  const divisor = greatestCommonDivisor(rest, denominator);
  return { whole, fraction: { numerator: rest / divisor, denominator: denominator / divisor } };
}

/** Plain text such as `5 7/16`, without unit. */
export function inchesText({ whole, fraction }: Inches): string {
  if (fraction === undefined) return String(whole);
  const part = `${String(fraction.numerator)}/${String(fraction.denominator)}`;
  return whole === 0 ? part : `${String(whole)} ${part}`;
}
