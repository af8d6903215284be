/** What a person weighs before she buys: how long, how much yarn, how wide a loom. All from the plan. */
import { craftOf, type Piece, type Plan } from '#core/craft/crafts.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan, Hours } from '#core/craft/plan-types.ts';
import { gramsInHand } from '#core/craft/purchase.ts';

/** Of a piece of any craft. */
export interface SeriesFigures {
  readonly hours: Hours;
  /** All yarn, cord or fibre to have in hand, margins included. */
  readonly yarnGrams: number;
  /** Inside width of the narrowest frame that holds it; undefined where none is needed. */
  readonly loomInsideMm: number | undefined;
}

export function seriesFigures(piece: Piece, plan: Plan): SeriesFigures {
  const craft = craftOf(piece);
  const made = { piece, plan };
  return { hours: plan.hours, yarnGrams: craft.materials(made).reduce((sum, { grams }) => sum + grams, 0), loomInsideMm: craft.leastInsideMm(made) };
}

/** What somebody compares who tries a woven piece on her own loom. */
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
