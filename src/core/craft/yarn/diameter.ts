/**
 * Two diameters of one yarn, never mixed: *compressed*, where it is beaten or under
 * tension (warp, tabby picks), and *loft*, where it is wrapped or lies free (soumak,
 * rya, hem-stitch, twining).
 */
import { LOFT_RATIO } from '#core/craft/defaults.ts';
import { texFromYardsPerPound, yardsPerPoundFromTex } from '#core/craft/yarn/count.ts';

const MM_PER_INCH = 25.4;

/**
 * Diameter in mm of a round yarn of specific volume `v` (cm³/g, 0.7 to 60): the circle
 * whose area is tex·v. Peirce's cotton has v = 1.1.
 */
export function diameterFromVolume(tex: number, v: number): number {
  return 10 * Math.sqrt((4e-5 * v * tex) / Math.PI);
}

/** Specific volume in cm³/g of fibre of this density (g/cm³) filling this share of the yarn. */
export function specificVolume(densityGPerCm3: number, packing: number): number {
  return 1 / (packing * densityGPerCm3);
}

/** Threads that lie side by side in an inch: K·√(yards per pound), by Ashenhurst. */
export function ashenhurstNumber(tex: number, k: number): number {
  return k * Math.sqrt(yardsPerPoundFromTex(tex));
}

/** Compressed diameter in mm. */
export function compressedDiameter(tex: number, k: number): number {
  return MM_PER_INCH / ashenhurstNumber(tex, k);
}

/** The specific volume (cm³/g) at which a round yarn has the diameter Ashenhurst's K gives it. */
export function volumeOfAshenhurst(k: number): number {
  const diameterMm = compressedDiameter(1, k);
  return (Math.PI * (diameterMm / 10) ** 2) / 4e-5;
}

/** Loft diameter in mm from wraps counted in an inch. */
export function loftFromWraps(wrapsPerInch: number): number {
  return MM_PER_INCH / wrapsPerInch;
}

/** Wraps in an inch from a count over any stretch; at least 50 mm is worth counting. */
export function wrapsPerInch(wraps: number, overMm: number): number {
  return wraps / (overMm / MM_PER_INCH);
}

/** Loft diameter in mm when only the compressed one is known. */
export function loftFromCompressed(compressedMm: number): number {
  return LOFT_RATIO * compressedMm;
}

/** Compressed diameter in mm when only wraps are known. */
export function compressedFromLoft(loftMm: number): number {
  return loftMm / LOFT_RATIO;
}

/** The tex a yarn has, roughly, whose wraps are all that is known. */
export function texFromWraps(wraps: number, k: number): number {
  const perInch = MM_PER_INCH / compressedFromLoft(loftFromWraps(wraps));
  return texFromYardsPerPound((perInch / k) ** 2);
}

/** Diameter of strands lying together as one thread, equally packed. */
export function diameterTogether(strandMm: number, strands: number): number {
  return Math.sqrt(strands) * strandMm;
}

/** Diameter of unlike strands lying together. */
export function diameterOfMixed(strandsMm: readonly number[]): number {
  return Math.sqrt(strandsMm.reduce((sum, d) => sum + d * d, 0));
}
