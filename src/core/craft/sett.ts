/** How closely warp ends may stand, and what weft suits a spacing. */
import { TIGHTNESS } from '#core/craft/defaults.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';

const MM_PER_INCH = 25.4;

/** Ends and intersections in one repeat of a weave. */
export const WEAVES = {
  plain: { ends: 2, intersections: 2 },
  'twill-2-1': { ends: 3, intersections: 2 },
  'twill-2-2': { ends: 4, intersections: 2 },
  'basket-2-2': { ends: 4, intersections: 2 },
  'satin-5': { ends: 5, intersections: 2 },
  'satin-8': { ends: 8, intersections: 2 },
} as const;

/**
 * The most ends an inch takes: each intersection needs the room of one more thread
 * (Ashenhurst). Needs 1 ≤ intersections ≤ ends. `WORKING_SHARE` of it is a working sett.
 */
export function ashenhurstMaximum(ashenhurstNumber: number, weave: { readonly ends: number; readonly intersections: number }): number {
  return (ashenhurstNumber * weave.ends) / (weave.ends + weave.intersections);
}

/** The most ends an inch takes in plain weave with a weft of another thickness. */
export function plainMaximum(warpDiameterMm: number, weftDiameterMm: number): number {
  return MM_PER_INCH / (warpDiameterMm + weftDiameterMm);
}

/** Peirce's limit of a square cloth of equal yarns: A/(2 sin 60°), a little closer than Ashenhurst's A/2. */
export function squareMaximum(ashenhurstNumber: number): number {
  return ashenhurstNumber / (2 * Math.sin(Math.PI / 3));
}

/** The hand weaver's rule for balanced cloth: half the wraps for plain weave, two thirds for 2/2 twill. */
export function balancedSett(wrapsPerInch: number, weave: 'plain' | 'twill-2-2'): number {
  return weave === 'plain' ? wrapsPerInch / 2 : (wrapsPerInch * 2) / 3;
}

/** Share of the room between two ends' middles that warp and weft fill. */
export function tightness(warpDiameterMm: number, weftDiameterMm: number, spacingMm: number): number {
  return (warpDiameterMm + weftDiameterMm) / spacingMm;
}

/**
 * Strands of weft to take together so that weft-faced cloth comes out at the wished
 * tightness; at least 1. Undefined where the warp alone fills it.
 */
export function strandsFor(spacingMm: number, warpDiameterMm: number, strandDiameterMm: number, target: number = TIGHTNESS.target): number | undefined {
  const room = target * spacingMm - warpDiameterMm;
  if (room <= 0) return undefined;
  return Math.max(1, roundHalfUp((room / strandDiameterMm) ** 2));
}

/** F: the share of the most ends that weaves well. */
export const WORKING_SHARE = 0.75;

/** Loft tightness up to which a weft still beats down well; the canon of tapestry is 1, hangings lie near a half. */
const THICK_FROM = 0.65;

export type SpacingAdvice = 'too-thick' | 'suits' | 'too-thin';

/** The narrowest room between ends in which a yarn of this loft beats down well. */
export function spacingThatSuits(warpDiameterMm: number, weftLoftMm: number): number {
  return (warpDiameterMm + weftLoftMm) / THICK_FROM;
}

/**
 * A weaver's advice by the yarn as it lies free: ends a quarter of an inch apart suit
 * fine and light yarn, half an inch suits bulky yarn and roving. Coarser than
 * tightness, and asked before there is a plan.
 */
export function adviseSpacing(spacingMm: number, warpDiameterMm: number, weftLoftMm: number): SpacingAdvice {
  const filled = tightness(warpDiameterMm, weftLoftMm, spacingMm);
  if (filled > THICK_FROM) return 'too-thick';
  return filled < TIGHTNESS.loose ? 'too-thin' : 'suits';
}
