/** The piece a page reckons with: the student's own where she has one that can be woven, else the pattern. */
import type { Piece, Plan } from '#core/craft/crafts.ts';
import { fitPiece, type MyPiece } from '#core/craft/fit.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { Problem } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export interface MadeFor {
  readonly piece: Piece;
  readonly plan: Plan;
  /** Whose: her own, or the pattern's. */
  readonly isOwn: boolean;
  readonly warnings: readonly Problem[];
  /** Why her own could not be taken: the teacher changed the pattern since. Empty otherwise. */
  readonly problems: readonly Problem[];
}

/** Null for a series whose pattern is missing or cannot be woven. */
export function madeFor(pattern: Piece | null, mine: MyPiece, units: Units): MadeFor | null {
  if (pattern === null) return null;
  const problems: Problem[] = [];
  if (Object.keys(mine).length > 0) {
    const fitted = fitPiece(pattern, mine, units);
    if (fitted.ok) return { piece: fitted.value.piece, plan: fitted.value.plan, isOwn: true, warnings: fitted.warnings, problems };
    problems.push(...fitted.problems);
  }
  const planned = planPiece(pattern, units);
  return planned.ok ? { piece: pattern, plan: planned.value, isOwn: false, warnings: planned.warnings, problems } : null;
}
