/** Warp yarn on a nailed frame: it always spans the whole height, used or not, and longer where it bends in the cloth. */

export interface WarpRun {
  readonly ends: number;
  /** From nail to nail. */
  readonly frameHeightMm: number;
  readonly nailDiameterMm: number;
  readonly warpDiameterMm: number;
  /** At the first and the last nail, each. */
  readonly tieMm: number;
  /** Height of the cloth on the loom. */
  readonly wovenMm: number;
  /** What an end is longer than the cloth it runs through, as a share; 0 where it is straight. */
  readonly crimp: number;
}

/** Straight along the frame. */
export function warpStraight({ ends, frameHeightMm }: Pick<WarpRun, 'ends' | 'frameHeightMm'>): number {
  return ends * frameHeightMm;
}

/** Half a turn round a nail between every two ends. */
export function warpRoundNails({ ends, nailDiameterMm, warpDiameterMm }: Pick<WarpRun, 'ends' | 'nailDiameterMm' | 'warpDiameterMm'>): number {
  return ((ends - 1) * Math.PI * (nailDiameterMm + warpDiameterMm)) / 2;
}

/** What bending takes beyond the straight way: cloth L high takes L(1 + c) of an end. */
export function warpTakenUp({ ends, wovenMm, crimp }: WarpRun): number {
  return ends * wovenMm * crimp;
}

export function warpLength(run: WarpRun): number {
  return warpStraight(run) + warpTakenUp(run) + warpRoundNails(run) + 2 * run.tieMm;
}
