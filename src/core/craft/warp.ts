/** Warp yarn on a nailed frame: it always spans the whole height, used or not. */

export interface WarpRun {
  readonly ends: number;
  /** From nail to nail. */
  readonly frameHeightMm: number;
  readonly nailDiameterMm: number;
  readonly warpDiameterMm: number;
  /** At the first and the last nail, each. */
  readonly tieMm: number;
}

/** Straight along the frame. */
export function warpStraight({ ends, frameHeightMm }: WarpRun): number {
  return ends * frameHeightMm;
}

/** Half a turn round a nail between every two ends. */
export function warpRoundNails({ ends, nailDiameterMm, warpDiameterMm }: WarpRun): number {
  return ((ends - 1) * Math.PI * (nailDiameterMm + warpDiameterMm)) / 2;
}

export function warpLength(run: WarpRun): number {
  return warpStraight(run) + warpRoundNails(run) + 2 * run.tieMm;
}
