/** Cord for knotted hangings. Rules of practice unless a line says otherwise; measure ten knots. */

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

/** What a working cord takes in one square knot, in cord diameters; 11.5 to 20 have been measured. */
const SQUARE_KNOT = 16;
/** How high a square knot stands, in cord diameters. */
const SQUARE_KNOT_RISE = 3.5;

export function squareKnotCord(cordMm: number): number {
  return SQUARE_KNOT * cordMm;
}

export function squareKnotsIn(heightMm: number, cordMm: number): number {
  return Math.floor(heightMm / (SQUARE_KNOT_RISE * cordMm) + 0.5 + 1e-9);
}
