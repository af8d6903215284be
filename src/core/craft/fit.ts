/** A pattern piece of any craft recomputed for a student's own making. */
import { CRAFT_NAMES, craftOf, type Piece, type Plan, type PlanFor } from '#core/craft/crafts.ts';
import { fitIn, type Fitted } from '#core/craft/fit-in.ts';
import { checkMine, type MyPiece } from '#core/craft/fitting/my-piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import type { Outcome } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export type { MyPiece } from '#core/craft/fitting/my-piece.ts';
export type { FitWay } from '#core/craft/fitting/way.ts';

export type FittedPiece<P extends Piece = Piece> = Fitted<P, PlanFor<P>>;

/** As `fitIn`, by the craft of the pattern. */
export function fitPiece<P extends Piece>(pattern: P, mine: MyPiece, units: Units = 'cm'): Outcome<FittedPiece<P>> {
  const findings = Findings.in(units);
  findings.soundly(() => Fields.of(pattern, '', 'A piece', findings).choice('craft', 'Craft', CRAFT_NAMES));
  if (findings.count > 0) checkMine(mine, findings);
  const known = findings.outcome(true);
  if (!known.ok) return known;
  // A craft changes a piece of its own into another of its own.
  return fitIn<Piece, Plan>(craftOf(pattern), planPiece, pattern, mine, units) as Outcome<FittedPiece<P>>;
}
