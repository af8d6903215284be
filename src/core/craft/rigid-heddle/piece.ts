/**
 * A plain cloth woven on a rigid heddle as a person describes it, and the plan that comes of it. Lengths are millimetres,
 * masses grams, shares fractions: 0.08 is eight per cent.
 */
import type { PlanCore } from '#core/craft/craft.ts';
import type { Yarn } from '#core/craft/piece.ts';
import type { WarpPlan } from '#core/craft/plan-types.ts';

export interface HeddlePiece {
  readonly craft: 'rigid-heddle';
  /** Finished: woven, washed, without fringe. */
  readonly size: { readonly widthMm: number; readonly lengthMm: number };
  /** From one end to the next in the heddle; 2.54 is ten to the inch. `widthMm` is what it holds. */
  readonly heddle: { readonly spacingMm: number; readonly widthMm?: number };
  /** By role: `warp` and `weft`. */
  readonly yarns: { readonly warp: Yarn; readonly weft: Yarn };
  /** Rows in a centimetre of the finished cloth. */
  readonly picksPerCm: number;
  /** Woven after each other on one warp, `gapMm` apart; 1 when missing. */
  readonly pieces?: number;
  readonly allowances?: {
    /** 0.08 when missing, below 0.4. */
    readonly drawIn?: number;
    /** Of the width and of the length in washing: 0.1 when missing, up to 0.5. */
    readonly widthShrinkage?: number;
    readonly lengthShrinkage?: number;
    /** 0.1 when missing, up to 0.6. */
    readonly takeUp?: number;
    /** At both ends together; 0 when missing. */
    readonly fringeMm?: number;
    readonly gapMm?: number;
    /** What the loom keeps; 610 when missing. */
    readonly wasteMm?: number;
    readonly margin?: number;
  };
}

export interface HeddlePlan extends PlanCore {
  readonly craft: 'rigid-heddle';
  readonly ends: { readonly count: number; readonly raw: number; readonly widthInHeddleMm: number };
  readonly warpEndMm: number;
  readonly picks: number;
  readonly weft: { readonly crimp: number; readonly stepMm: number; readonly turnMm: number; readonly pickMm: number };
  readonly yarns: { readonly warp: WarpPlan; readonly weft: WarpPlan };
}
