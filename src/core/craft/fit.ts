/** A pattern piece recomputed for a student's own loom, width and yarns. */
import { changePiece, unknownRoles } from '#core/craft/fitting/change-piece.ts';
import type { MyPiece } from '#core/craft/fitting/my-piece.ts';
import { tellChanges } from '#core/craft/fitting/tell-changes.ts';
import { largestHeight, largestWidth } from '#core/craft/frame-loom/room.ts';
import { settingsOf } from '#core/craft/frame-loom/settings.ts';
import type { Piece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { Plan } from '#core/craft/plan-types.ts';
import { succeed, type Outcome, type Problem } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export type { MyPiece } from '#core/craft/fitting/my-piece.ts';

export interface FittedPiece {
  readonly piece: Piece;
  readonly plan: Plan;
  /** What differs from the pattern, in words, in the student's units. */
  readonly changes: readonly string[];
}

/** A yarn kept for a role the teacher has since taken out of the pattern does no harm. */
function warnOfLostRoles(pattern: Piece, mine: MyPiece): readonly Problem[] {
  return unknownRoles(pattern, mine).map((role) => ({
    code: 'W_UNUSED',
    path: `/yarns/${role}`,
    message: `The pattern has no yarn in the role “${role}” any more.`,
  }));
}

/**
 * Puts a student's loom, width and yarns into the pattern and reckons it. Nails twice as
 * close as the pattern's are used every second one, and so on; shapes keep their share of
 * the width. Problems point into the changed piece (`/loom/insideWidthMm`, `/size/widthMm`,
 * `/warp/endsTogether`, `/yarns/<role>/…`) and, where the loom is too small, name the
 * largest size that fits.
 */
export function fitPiece(pattern: Piece, mine: MyPiece, units: Units = 'cm'): Outcome<FittedPiece> {
  const piece = changePiece(pattern, mine);
  const planned = planPiece(piece, units);
  if (!planned.ok) return planned;
  const before = planPiece(pattern, units);
  const changes = before.ok ? tellChanges({ piece: pattern, plan: before.value }, { piece, plan: planned.value }, units) : [];
  return succeed({ piece, plan: planned.value, changes }, [...planned.warnings, ...warnOfLostRoles(pattern, mine)]);
}

/** The largest finished size the piece's loom holds at its spacing; the width only if the loom tells its own. */
export function roomOnLoom(piece: Piece): { readonly widthMm?: number; readonly heightMm: number } {
  const settings = settingsOf(piece.allowances ?? {}, piece.mode ?? 'straight-warp', piece.beat);
  const widthMm = largestWidth(piece.loom, piece.warp, settings);
  const heightMm = largestHeight(piece.loom, piece.dowel, settings);
  return widthMm === undefined ? { heightMm } : { widthMm, heightMm };
}
