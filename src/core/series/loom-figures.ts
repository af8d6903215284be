/** What somebody compares who tries a woven piece on her own loom. */
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan, Hours } from '#core/craft/plan-types.ts';
import { gramsInHand } from '#core/craft/purchase.ts';

export interface LoomFigures {
  readonly hours: Hours;
  readonly yarnGrams: number;
  readonly warpMm: number;
  readonly weftGrams: number;
  readonly ends: number;
  readonly endsTogether: 1 | 2;
  /** Inside width of the narrowest frame that holds it. */
  readonly loomInsideMm: number;
  readonly loomHeightMm: number;
}

export function loomFigures(piece: FrameLoomPiece, plan: FrameLoomPlan): LoomFigures {
  const weftGrams = Object.values(plan.yarns).reduce((sum, yarn) => sum + gramsInHand(yarn), 0);
  return {
    hours: plan.hours,
    yarnGrams: gramsInHand(plan.warp) + weftGrams,
    warpMm: plan.warp.withMarginMm,
    weftGrams,
    ends: plan.ends.count,
    endsTogether: piece.warp.endsTogether ?? 1,
    loomInsideMm: plan.loom.insideWidthNeededMm,
    loomHeightMm: plan.loom.heightNeededMm,
  };
}
