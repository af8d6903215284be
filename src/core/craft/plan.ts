/** The plan: every number reckoned from a piece, whatever craft it is made in. */
import type { Piece, Plan, PlanFor } from '#core/craft/crafts.ts';
import { PLANNED_CRAFTS, PLANNERS } from '#core/craft/planners.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import type { Outcome } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

/** Reckons the piece in these fields; undefined, with a problem among their findings, if it cannot be made. */
export function planInFields(fields: Fields): Plan | undefined {
  const { findings } = fields;
  if (findings.count > 0) return undefined;
  const craft = findings.soundly(() => fields.choice('craft', 'Craft', PLANNED_CRAFTS));
  const reckoned = craft && PLANNERS[craft](fields);
  return reckoned && { ...reckoned, warnings: findings.warnings };
}

/**
 * Reckons the plan of a piece. Never throws for what a person may send: whatever is
 * wrong comes back as problems, all of them at once, one for each refused value.
 * `units` are those in which messages name lengths.
 */
export function planPiece<P extends Piece>(piece: P, units?: Units): Outcome<PlanFor<P>>;
export function planPiece(piece: unknown, units?: Units): Outcome<Plan>;
export function planPiece(piece: unknown, units: Units = 'cm'): Outcome<Plan> {
  const findings = Findings.in(units);
  return findings.outcome(planInFields(Fields.of(piece, '', 'A piece', findings)));
}
