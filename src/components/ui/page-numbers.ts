/**
 * The numbers to show of `total` pages: the first, the last, and those within one of `current`; runs left out become
 * one `gap`, unless a single number would fill it.
 */
export function pageNumbers(current: number, total: number): (number | 'gap')[] {
  const near = new Set([1, total, current - 1, current, current + 1]);
  const shown = Array.from({ length: total }, (_, index) => index + 1).filter((n) => near.has(n) || (near.has(n - 1) && near.has(n + 1)));
  return shown.flatMap((n, index) => (index > 0 && n - (shown[index - 1] ?? n) > 1 ? ['gap' as const, n] : [n]));
}
