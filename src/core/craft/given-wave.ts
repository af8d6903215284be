/** A wave of the weft that a person gives: inside what the yarns allow, or refused in words. */
import { weftWaveRange } from '#core/craft/crimp.ts';
import { isInRange } from '#core/craft/picks.ts';
import type { Findings } from '#core/craft/reading/findings.ts';

interface Crossed {
  /** Warp and weft together. */
  readonly diameterSumMm: number;
  readonly warpSpacingMm: number;
  readonly weftSpacingMm: number;
}

/**
 * True if the wave can be; else it is refused at `path`, as out of range above both yarns together, as jammed where
 * the yarns leave no room for it. Yarns that jam at any wave are left to the caller.
 */
export function admitsWave(heightMm: number, { diameterSumMm, warpSpacingMm, weftSpacingMm }: Crossed, path: string, findings: Findings): boolean {
  const range = weftWaveRange(diameterSumMm, warpSpacingMm, weftSpacingMm);
  if (range === undefined || isInRange(heightMm, range, diameterSumMm)) return true;
  if (heightMm > diameterSumMm) {
    findings.reject('E_RANGE', path, `A wave is at most as high as both yarns together: up to ${findings.length(diameterSumMm)} works.`);
  } else {
    findings.reject('E_JAM', path, `The yarns jam at that wave. Between ${findings.length(range.min)} and ${findings.length(range.max)} works.`);
  }
  return false;
}
