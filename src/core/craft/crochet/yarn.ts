/** Yarn in crochet: what a swatch held when it was unravelled, over its area. */
export function yarnPerArea(unravelledMm: number, swatchMm2: number): number {
  return unravelledMm / swatchMm2;
}
