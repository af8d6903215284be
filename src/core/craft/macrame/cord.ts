/** Cord for knotted hangings. Rules of practice unless a line says otherwise; measure ten knots. */

import { roundHalfUp } from '#core/craft/rounding.ts';
import { diameterFromVolume } from '#core/craft/yarn/diameter.ts';

/** Each hanging cord is four times as long as the finished piece; cut and folded at its middle it is two of them. */
const CORD_OVER_FINISHED = 4;

/** To cut, folded in half over the rod. */
export function foldedCordLength(finishedMm: number): number {
  return 2 * CORD_OVER_FINISHED * finishedMm;
}

/** To cut for a piece that is knotted over one stretch and hangs plain over another. */
export function sectionedCordLength(knottedMm: number, plainMm: number): number {
  return 2 * (CORD_OVER_FINISHED * knottedMm + plainMm);
}

/**
 * The least cord one working end of a square knot round two fillers can take, derived
 * from its path: twice half the girth of two cords side by side and one interlock.
 */
export function leastSquareKnot(cordMm: number): number {
  return 2 * (1 + (3 * Math.PI) / 2) * cordMm;
}

/** What knots take, in cord diameters. */
export const KNOT_TAKES = {
  /** A working end, in one square knot; 11.5 to 20 have been measured. */
  squareKnot: 16,
  /** How high a square knot stands. */
  squareRise: 3.5,
  /** A working end, in one double half hitch; two tight turns are 4π. */
  doubleHalfHitch: 15,
} as const;

/** How high a row of double half hitches stands, in cord diameters: the held cord and two turns round it. */
export const HITCH_ROW = 2.5;

export function squareKnotCord(cordMm: number, takes: number = KNOT_TAKES.squareKnot): number {
  return takes * cordMm;
}

/** Square knots in a height, with `gapMm` of bare cord between two. */
export function squareKnotsIn(heightMm: number, cordMm: number, rise: number = KNOT_TAKES.squareRise, gapMm = 0): number {
  return roundHalfUp((heightMm + gapMm) / (rise * cordMm + gapMm));
}

/** Cord one turn of a half hitch takes when it is drawn tight: once round a cord as thick as itself. */
export function leastHalfHitch(cordMm: number): number {
  return 2 * Math.PI * cordMm;
}

/** What a lark's head takes of a folded cord, at most: both halves round rod and cord. */
export function larksHead(rodMm: number, cordMm: number): number {
  return 2 * Math.PI * (rodMm + 2 * cordMm);
}

/**
 * Cord to cut for a gathering knot: so many turns round the bundle, once down and up again inside them, and two tails.
 * From its path; try one.
 */
export function gatheringCord(wraps: number, bundleMm: number, cordMm: number, tailMm: number): number {
  return wraps * Math.PI * (bundleMm + cordMm) + 2 * wraps * cordMm + 2 * tailMm;
}

/** Specific volume in cm³/g of twisted cotton cord: 4 mm weighs about 9 g a metre. */
export const CORD_VOLUME = 1.4;

/** The tex of a cord of which only the thickness is known: the circle of its section over its specific volume. */
export function texFromDiameter(cordMm: number): number {
  return (cordMm / diameterFromVolume(1, CORD_VOLUME)) ** 2;
}
