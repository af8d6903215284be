/** Height on the loom, from the finished height to the frame. */
import { DEFAULT_ALLOWANCES, HANGING, TOP_FOR_TYING_MM } from '#core/craft/defaults.ts';
import type { Dowel } from '#core/craft/piece.ts';

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

/** Unwoven warp that holds the cloth to its dowel: loops go over it or are tied to it; a lashing goes through the cloth. */
export function topForHanging(dowel: Pick<Dowel, 'diameterMm' | 'fixing'> | undefined): number {
  if (dowel === undefined) return 0;
  switch (dowel.fixing ?? 'slipped') {
    case 'slipped':
      return topForDowel(dowel.diameterMm);
    case 'tied':
      return Math.max(TOP_FOR_TYING_MM, topForDowel(dowel.diameterMm));
    case 'lashed':
      return 0;
  }
}

/** Unwoven warp at the top: what was asked, what the dowel takes, and room for the last shed. */
export function topAllowance(askedMm: number, dowel: Pick<Dowel, 'diameterMm' | 'fixing'> | undefined, leastMm: number = DEFAULT_ALLOWANCES.topMm): number {
  return Math.max(askedMm, topForHanging(dowel), leastMm);
}

/** Unwoven warp at the bottom: what was asked, what the finish takes, and enough for any hand. */
export function bottomAllowance(askedMm: number, finishMm = 0, leastMm: number = DEFAULT_ALLOWANCES.bottomMm): number {
  return Math.max(askedMm, finishMm, leastMm);
}
