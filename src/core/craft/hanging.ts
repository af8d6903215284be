/** Taking the piece off and hanging it: knots, fringe, dowel, cord. */
import { FRINGE_BUNDLE_ENDS, HANDLE_MM, HANGING, KNOT_DIAMETERS, TUCKED_MM, TWIST_RATIO } from '#core/craft/defaults.ts';
import { ceilSafe } from '#core/craft/rounding.ts';
import type { Finish } from '#core/craft/piece.ts';

const GRAVITY = 9.80665;

/** Diameter in mm of a bundle of ends that lie free. */
export function bundleDiameter(ends: number, loftMm: number): number {
  return Math.sqrt(ends) * loftMm;
}

/** Warp a tight overhand knot swallows. */
export function overhandKnot(bundleMm: number): number {
  return KNOT_DIAMETERS * bundleMm;
}

/** Warp needed below the cloth for a knotted fringe, with room for the hand. */
export function endsForFringe(fringeMm: number, bundleMm: number): number {
  return fringeMm + overhandKnot(bundleMm) + HANDLE_MM;
}

/** Twisting two strands round each other shortens them. */
export function endsForTwistedFringe(fringeMm: number): number {
  return fringeMm * TWIST_RATIO;
}

/** Warp a finish needs below the cloth; `loftMm` is one end lying free. */
export function endsForFinish({ bottom, fringeMm = 0, bundleEnds = FRINGE_BUNDLE_ENDS }: Finish, loftMm: number): number {
  switch (bottom) {
    case 'knotted':
      return endsForFringe(fringeMm, bundleDiameter(bundleEnds, loftMm));
    case 'twisted':
      return endsForTwistedFringe(fringeMm);
    case 'tucked':
      return TUCKED_MM;
    case 'plain':
      return fringeMm;
  }
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

/** Wraps that lash a cloth of this width to its dowel, one at each selvedge. */
export function lashingWraps(widthMm: number): number {
  return ceilSafe(widthMm / HANGING.lashingPitchMm) + 1;
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
