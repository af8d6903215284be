/** The piece the handbook takes its examples from, with its plan. */
import described from '../../../content/series/low-tide/piece.json';
import type { Piece } from '#core/craft/piece.ts';
import { planPiece, type Plan } from '#core/craft/plan.ts';

export interface Pattern {
  readonly piece: Piece;
  readonly plan: Plan;
}

function reckon(data: unknown): Pattern {
  const plan = planPiece(data);
  if (!plan.ok) throw new Error(plan.problems.map(({ path, message }) => `${path}: ${message}`).join(' '));
  // Reckoned without a problem, so it has the shape of a piece.
  return { piece: data as Piece, plan: plan.value };
}

export const LOW_TIDE: Pattern = reckon(described);
