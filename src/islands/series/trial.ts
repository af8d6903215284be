/** What the page of a series hands its islands, and what they make of it. The same on the server and in the browser. */
import type { MadeOf } from '#core/craft/craft.ts';
import type { Made, Piece, PlanFor } from '#core/craft/crafts.ts';
import { fitPiece, type FittedPiece, type MyPiece } from '#core/craft/fit.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { loomTexts, type TypedLoom } from '#core/trial/typed-loom.ts';
import type { Trial } from '#core/trial/try-on-loom.ts';
import type { Units } from '#core/units/units.ts';

/** On a frame, where a visitor may try it on her own. */
export type MadeOnLoom = Made<FrameLoomPiece>;

/** The pattern as its teacher makes it; null when it cannot be reckoned. */
export function madeAsPattern<P extends Piece>(pattern: P): MadeOf<P, PlanFor<P>> | null {
  const plan = planPiece(pattern);
  return plan.ok ? { piece: pattern, plan: plan.value } : null;
}

/** The teacher's own loom, typed: what the form holds before a visitor types hers. */
export function loomOfPattern({ piece, plan }: MadeOnLoom, units: Units): TypedLoom {
  const loom = { insideWidthMm: piece.loom.insideWidthMm ?? plan.loom.insideWidthNeededMm, nailPitchMm: piece.loom.nailPitchMm };
  return { ...loomTexts(loom, units), ends: piece.warp.endsTogether ?? 1, units, narrower: false };
}

/** What a trial ends in: the piece on her loom, or, where none fits, nothing. */
export function fittedBy(trial: Trial): FittedPiece<FrameLoomPiece> | null {
  return trial.ok && trial.fits ? trial.fitted : null;
}

/** A student's own piece made anew; the pattern where hers cannot be made. */
export function madeAsMine<P extends Piece>(pattern: P, mine: MyPiece): MadeOf<P, PlanFor<P>> | null {
  const fit = fitPiece(pattern, mine);
  return fit.ok ? fit.value : madeAsPattern(pattern);
}
