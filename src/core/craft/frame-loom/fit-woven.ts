/** What `fit.ts` and `amounts.ts` do, for who has pieces woven on a frame only: the engines of the other crafts stay where they are. */
import type { Amount } from '#core/craft/amounts/amount-types.ts';
import { askAmount } from '#core/craft/amounts/ask-amount.ts';
import { fitIn, type Fitted } from '#core/craft/fit-in.ts';
import type { MyPiece } from '#core/craft/fitting/my-piece.ts';
import { FRAME_LOOM } from '#core/craft/frame-loom/craft.ts';
import { planWoven } from '#core/craft/frame-loom/plan-woven.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import type { Outcome } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export function fitWoven(pattern: FrameLoomPiece, mine: MyPiece, units: Units = 'cm'): Outcome<Fitted<FrameLoomPiece, FrameLoomPlan>> {
  return fitIn(FRAME_LOOM, planWoven, pattern, mine, units);
}

export function amountOfWoven(key: string, piece: FrameLoomPiece, plan: FrameLoomPlan): Outcome<Amount> {
  return askAmount(FRAME_LOOM, key, { piece, plan });
}
