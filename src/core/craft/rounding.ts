/**
 * Turning measures into counts. The guard keeps exact ties (12.5 ends) on the same
 * side whatever the last bit of a division says; without it the stepped triangle of
 * the worked piece loses two ends.
 */
const GUARD = 1e-9;

/** The nearest whole number; a half goes up. */
export function roundHalfUp(x: number): number {
  return Math.floor(x + 0.5 + GUARD);
}

/** The next whole number; a hair above one still counts as that one. */
export function ceilSafe(x: number): number {
  return Math.ceil(x - GUARD) + 0;
}

/** The next multiple of `step`, for sizes that must not come out short. */
export function roundUpTo(x: number, step: number): number {
  return ceilSafe(x / step) * step;
}
