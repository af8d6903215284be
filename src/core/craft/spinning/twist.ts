/** Twist: turns in a length, and how steeply they make the fibres lie. */
import { texFromCount, METRES_PER_YARD } from '#core/craft/yarn/count.ts';

const INCHES_PER_METRE = 1 / (METRES_PER_YARD / 36);

/** Turns in a metre from a twist multiplier, by turns in an inch = TM × √(cotton count). */
export function turnsPerMetre(twistMultiplier: number, tex: number): number {
  return (INCHES_PER_METRE * twistMultiplier * Math.sqrt(texFromCount(1, 'ne-cotton'))) / Math.sqrt(tex);
}

/** Diameter in mm of a yarn from its surface angle and twist: tan α = π·d·t. */
export function diameterFromTwist(angleRad: number, turnsPerMm: number): number {
  return Math.tan(angleRad) / (Math.PI * turnsPerMm);
}
