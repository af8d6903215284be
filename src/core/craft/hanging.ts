/** Taking the piece off and hanging it: knots, fringe, dowel, cord. */
import { HANGING } from '#core/craft/defaults.ts';

const GRAVITY = 9.80665;

/** Diameter in mm of a bundle of ends that lie free. */
export function bundleDiameter(ends: number, loftMm: number): number {
  return Math.sqrt(ends) * loftMm;
}

/** Warp a tight overhand knot swallows: ten bundle diameters (after the tight open trefoil, 10.1). Measure one. */
export function overhandKnot(bundleMm: number): number {
  return 10 * bundleMm;
}

/** Warp needed below the cloth for a knotted fringe, with room for the hand. */
export function endsForFringe(fringeMm: number, bundleMm: number): number {
  return fringeMm + overhandKnot(bundleMm) + 30;
}

/** Common practice: twisting takes a quarter. */
export function endsForTwistedFringe(fringeMm: number): number {
  return fringeMm * 1.25;
}

export function dowelLength(finishedWidthMm: number): number {
  return finishedWidthMm + 2 * HANGING.overhangMm;
}

/** Between the two places the cord is tied. */
export function cordSpan(dowelLengthMm: number): number {
  return dowelLengthMm - 2 * HANGING.cordInsetMm;
}

/** Cord from two points, up to a nail and tied. */
export function cordLength(spanMm: number, riseMm: number = HANGING.cordRiseMm): number {
  return 2 * Math.hypot(spanMm / 2, riseMm) + 2 * HANGING.cordKnotMm;
}

/** Pull on the cord in newtons; the flatter it runs the more it pulls. */
export function cordTension(massG: number, spanMm: number, riseMm: number = HANGING.cordRiseMm): number {
  const angle = Math.atan2(2 * riseMm, spanMm);
  return ((massG / 1000) * GRAVITY) / (2 * Math.sin(angle));
}

/** Yarn that lashes a cloth to its dowel: so many wraps, so far apart. */
export function lashingLength(wraps: number, pitchMm: number, dowelDiameterMm: number, yarnLoftMm: number): number {
  return wraps * Math.hypot(Math.PI * (dowelDiameterMm + yarnLoftMm), pitchMm);
}

/**
 * The thinnest round dowel that does not sag visibly: from the sag 5mgL³/(384EI) of an
 * evenly loaded beam held at both ends, with I = πd⁴/64.
 */
export function leastDowelDiameter(massG: number, spanMm: number, modulusPa: number = HANGING.modulusPa): number {
  const loadN = (massG / 1000) * GRAVITY;
  const spanM = spanMm / 1000;
  const fourthPower = ((64 / Math.PI) * 5 * loadN * spanM ** 2 * HANGING.sagLimit) / (384 * modulusPa);
  return 1000 * fourthPower ** 0.25;
}
