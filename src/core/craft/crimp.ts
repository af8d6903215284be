/**
 * How much longer a yarn is than the straight line it covers, by Peirce's geometry of
 * plain weave (J. Text. Inst. 28, 1937, T45): round, incompressible yarns that run
 * straight between crossings and in arcs round each other.
 *
 * p spacing of the crossing yarns, D sum of both diameters, h height of the yarn's wave.
 */

/** A yarn between two crossings. */
export interface Wave {
  /** Along the yarn's axis, mm. */
  readonly lengthMm: number;
  /** Steepest angle to the plane of the cloth, radians. */
  readonly angleRad: number;
  /** Length over spacing, less one. */
  readonly crimp: number;
}

/** Rounding may leave a jammed geometry this far (relative) on the wrong side. */
const HAIR = 1e-9;

/** Length of the straight part between two arcs, L = √(p² + h² − 2Dh); undefined where the yarns jam. */
export function straightPart(p: number, D: number, h: number): number | undefined {
  const square = p * p + h * h - 2 * D * h;
  return square < -HAIR * D * D ? undefined : Math.sqrt(Math.max(0, square));
}

/**
 * Peirce's equations p = (l − Dθ)cos θ + D sin θ and h = (l − Dθ)sin θ + D(1 − cos θ),
 * solved without iteration: with the straight part L = l − Dθ they are the two halves of
 * p + i(D − h) = (L + iD)·e^(−iθ).
 *
 * Needs p > 0, D > 0 and 0 ≤ h ≤ D. Undefined where the yarns jam.
 */
export function waveOf(p: number, D: number, h: number): Wave | undefined {
  const straight = straightPart(p, D, h);
  if (straight === undefined) return undefined;
  const angleRad = Math.max(0, Math.atan2(D, straight) - Math.atan2(D - h, p));
  const lengthMm = straight + D * angleRad;
  return { lengthMm, angleRad, crimp: lengthMm / p - 1 };
}

export interface WaveRange {
  readonly min: number;
  readonly max: number;
}

/**
 * The heights the weft's wave can take: both waves together are D high, and neither yarn
 * may jam between its neighbours. Undefined where no height works, which is Peirce's
 * jamming condition √(1 − (p₁/D)²) + √(1 − (p₂/D)²) > 1.
 */
export function weftWaveRange(D: number, warpSpacing: number, weftSpacing: number): WaveRange | undefined {
  const min = Math.sqrt(Math.max(0, D * D - weftSpacing * weftSpacing));
  const max = D - Math.sqrt(Math.max(0, D * D - warpSpacing * warpSpacing));
  if (min > max + HAIR * D) return undefined;
  return { min, max: Math.max(min, max) };
}

/** Peirce's jamming sum; above 1 the cloth cannot be woven. */
export function jammingSum(D: number, warpSpacing: number, weftSpacing: number): number {
  const share = (p: number): number => Math.sqrt(Math.max(0, 1 - (p / D) ** 2));
  return share(warpSpacing) + share(weftSpacing);
}

/**
 * Crimp of weft on straight warps (h = D) from tightness r = D/p, 0 < r ≤ 1:
 * √(1 − r²) + r·asin r − 1.
 */
export function weftFacedCrimp(r: number): number {
  return Math.sqrt(1 - r * r) + r * Math.asin(r) - 1;
}
