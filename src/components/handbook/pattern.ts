/** The piece the handbook takes its examples from, with its plan. */
import described from '../../../content/series/low-tide/piece.json';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';

export interface Pattern {
  readonly piece: FrameLoomPiece;
  readonly plan: FrameLoomPlan;
}

function reckon(data: unknown): Pattern {
  // Our own file, and planning it tells whether it can be woven.
  const piece = data as FrameLoomPiece;
  const plan = planPiece(piece);
  if (!plan.ok) throw new Error(plan.problems.map(({ path, message }) => `${path}: ${message}`).join(' '));
  return { piece, plan: plan.value };
}

export const LOW_TIDE: Pattern = reckon(described);
