/** Height on the loom, from the finished height to the frame. */
import { DEFAULT_ALLOWANCES, HANGING } from '#core/craft/defaults.ts';

/** Height to weave so that the cloth has its finished height when it is off the loom. Shares are divided out. */
export function heightBeforeShrinking(finishedMm: number, relaxation: number, wetShrinkage: number): number {
  return finishedMm / ((1 - relaxation) * (1 - wetShrinkage));
}

/** The finished height that a height on the loom comes to. */
export function heightAfterShrinking(onLoomMm: number, relaxation: number, wetShrinkage: number): number {
  return onLoomMm * (1 - relaxation) * (1 - wetShrinkage);
}

/** Warp that must stay unwoven for its loops to slip on a dowel: half its girth and a seat. */
export function topForDowel(dowelDiameterMm: number): number {
  return (Math.PI / 2) * dowelDiameterMm + HANGING.seatMm;
}

/** Unwoven warp at the top: what was asked, what the dowel takes, and room for the last shed. */
export function topAllowance(askedMm: number, dowelDiameterMm: number | undefined, leastMm: number = DEFAULT_ALLOWANCES.topMm): number {
  const dowelMm = dowelDiameterMm === undefined ? 0 : topForDowel(dowelDiameterMm);
  return Math.max(askedMm, dowelMm, leastMm);
}

/** Unwoven warp at the bottom: what was asked, and enough to knot or tuck the ends. */
export function bottomAllowance(askedMm: number, leastMm: number = DEFAULT_ALLOWANCES.bottomMm): number {
  return Math.max(askedMm, leastMm);
}
