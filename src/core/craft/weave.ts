/** How warp and weft share the bending of a cloth, and the numbers a person may give for it. */

/**
 * The weft alone round a straight warp; both as alike as they can; as high a wave of the weft as is given; or not
 * modelled at all, but measured.
 */
export type WeaveMode = 'straight-warp' | 'balanced' | 'given' | 'measured';

/** As they stand in a piece. */
export interface WeaveNumbers {
  /** `straight-warp` when missing. */
  readonly mode?: WeaveMode;
  /** Of `given`: height of the weft’s wave, from the lowest place of its axis to the highest. */
  readonly weftWaveMm?: number;
  /** Of `measured`: what a pick drawn out straight is longer than its cloth, as a share; ten per cent when missing. */
  readonly takeUp?: number;
  /** Of `measured`: the same of the warp; 0, a straight warp, when missing beside a take-up. */
  readonly warpTakeUp?: number;
}

/** Take-ups as a person measured them, as shares; what is not known is missing. */
export interface MeasuredWeave {
  readonly mode: 'measured';
  readonly takeUp?: number;
  readonly warpTakeUp?: number;
}

/** A mode with the numbers it has. */
export type Weave =
  | { readonly mode: 'straight-warp' | 'balanced' }
  | { readonly mode: 'given'; readonly weftWaveMm: number }
  | MeasuredWeave;
