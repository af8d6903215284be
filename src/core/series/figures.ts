/** What a person weighs before she buys: how long, how much yarn, how wide a loom. All from the plan. */
import type { Piece } from '#core/craft/piece.ts';
import type { Plan } from '#core/craft/plan-types.ts';
import { gramsInHand } from '#core/gathering/yarn-table.ts';

export interface SeriesFigures {
  readonly hours: Plan['hours'];
  /** Warp and all weft yarns to have in hand, margins included. */
  readonly yarnGrams: number;
  readonly warpMm: number;
  readonly weftGrams: number;
  readonly ends: number;
  readonly endsTogether: 1 | 2;
  /** Inside width of the narrowest frame that holds it. */
  readonly loomInsideMm: number;
  readonly loomHeightMm: number;
}

export function seriesFigures(piece: Piece, plan: Plan): SeriesFigures {
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
