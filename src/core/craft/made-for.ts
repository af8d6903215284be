/** The piece a page reckons with: the student's own where she has one that can be woven, else the pattern. */
import { isMadeIn, type Piece, type Plan } from '#core/craft/crafts.ts';
import { fitPiece, type MyPiece } from '#core/craft/fit.ts';
import { planPiece } from '#core/craft/plan.ts';
import { asItComesOut, type HalfWoven } from '#core/craft/rest/as-it-comes-out.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import type { Problem } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export interface MadeFor {
  readonly piece: Piece;
  /** Half way: what is woven as it was planned, the rest as it is reckoned from there. */
  readonly plan: Plan;
  /** Whose: her own, or the pattern's. */
  readonly isOwn: boolean;
  readonly warnings: readonly Problem[];
  /** Why her own could not be taken: the teacher changed the pattern since. Empty otherwise. */
  readonly problems: readonly Problem[];
  /** How far she has woven it, and what is left; null while nothing is woven. */
  readonly halfway: HalfWoven | null;
  /** Why the rest could not be reckoned from what she said of it. Empty otherwise. */
  readonly restProblems: readonly Problem[];
}

type Whole = Omit<MadeFor, 'halfway' | 'restProblems'>;

function wholeFor(pattern: Piece, mine: MyPiece, units: Units): Whole | null {
  const problems: Problem[] = [];
  if (Object.keys(mine).length > 0) {
    const fitted = fitPiece(pattern, mine, units);
    if (fitted.ok) return { piece: fitted.value.piece, plan: fitted.value.plan, isOwn: true, warnings: fitted.warnings, problems };
    problems.push(...fitted.problems);
  }
  const planned = planPiece(pattern, units);
  return planned.ok ? { piece: pattern, plan: planned.value, isOwn: false, warnings: planned.warnings, problems } : null;
}

/**
 * Null for a series whose pattern is missing or cannot be woven. What is woven counts only for a piece that is woven on
 * a frame, and only for her own where she has one: the pattern that stands in for it is reckoned whole.
 */
export function madeFor(pattern: Piece | null, mine: MyPiece, units: Units, woven: WovenSoFar = NOTHING_WOVEN): MadeFor | null {
  const whole = pattern === null ? null : wholeFor(pattern, mine, units);
  if (whole === null) return null;
  if (!isMadeIn('frame-loom', whole) || whole.problems.length > 0) return { ...whole, halfway: null, restProblems: [] };
  const comes = asItComesOut(whole, woven, units);
  return comes.ok ? { ...whole, ...comes.value, restProblems: [] } : { ...whole, halfway: null, restProblems: comes.problems };
}
