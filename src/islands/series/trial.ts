/** What the page of a series hands its islands, and what they make of it. The same on the server and in the browser. */
import { fitPiece, type FittedPiece } from '#core/craft/fit.ts';
import type { Piece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { Plan } from '#core/craft/plan-types.ts';
import { loomTexts, type TypedLoom } from '#core/trial/typed-loom.ts';
import type { Trial } from '#core/trial/try-on-loom.ts';
import type { Units } from '#core/units/units.ts';

export interface Made {
  readonly piece: Piece;
  readonly plan: Plan;
}

/** The pattern as its teacher weaves it; null when it cannot be reckoned. */
export function madeAsPattern(pattern: Piece): Made | null {
  const plan = planPiece(pattern);
  return plan.ok ? { piece: pattern, plan: plan.value } : null;
}

/** The teacher's own loom, typed: what the form holds before a visitor types hers. */
export function loomOfPattern({ piece, plan }: Made, units: Units): TypedLoom {
  const loom = { insideWidthMm: piece.loom.insideWidthMm ?? plan.loom.insideWidthNeededMm, nailPitchMm: piece.loom.nailPitchMm };
  return { ...loomTexts(loom, units), ends: piece.warp.endsTogether ?? 1, units, narrower: false };
}

/** What a trial ends in: the piece on her loom, or, where none fits, nothing. */
export function fittedBy(trial: Trial): FittedPiece | null {
  return trial.ok && trial.fits ? trial.fitted : null;
}

/** A student's own piece made anew; the pattern where hers cannot be woven. */
export function madeAsMine(pattern: Piece, mine: Parameters<typeof fitPiece>[1]): Made | null {
  const fit = fitPiece(pattern, mine);
  return fit.ok ? fit.value : madeAsPattern(pattern);
}

export interface LoomWidths {
  readonly patternPx: number;
  readonly loomPx: number;
}

/** Shares of the drawing that are not cloth: air beside a hanging piece, rails of a frame. */
const HANGING_CLOTH = 0.94;
const FRAME_INSIDE = 0.9;
const LEAST_PX = 24;

/** Widths at which a hanging piece and a frame stand at one scale and fill `roomPx` together. */
export function atOneScale(pieceMm: number, insideMm: number, roomPx: number): LoomWidths {
  const scale = roomPx / (pieceMm / HANGING_CLOTH + insideMm / FRAME_INSIDE);
  return { patternPx: Math.max(LEAST_PX, (pieceMm / HANGING_CLOTH) * scale), loomPx: Math.max(LEAST_PX, (insideMm / FRAME_INSIDE) * scale) };
}
