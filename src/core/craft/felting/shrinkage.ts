/** Felting: how large to lay out so that it comes out right. */

/** Layout over finished size, measured on a sample; each direction has its own. */
export function feltingFactor(layoutMm: number, finishedMm: number): number {
  return layoutMm / finishedMm;
}

/** Size to lay out; the shrinkage is divided out, not added. */
export function layoutFor(finishedMm: number, shrinkage: number): number {
  return finishedMm / (1 - shrinkage);
}
