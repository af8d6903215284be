/** The plan of a piece woven on a frame, without the engines of the other crafts: what the form of such a piece loads. */
import { planFrameLoom } from '#core/craft/frame-loom/plan-frame-loom.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import type { Outcome } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

/** As `planPiece`; a piece of another craft is refused. `units` are those in which messages name lengths. */
export function planWoven(piece: unknown, units: Units = 'cm'): Outcome<FrameLoomPlan> {
  const findings = Findings.in(units);
  const fields = Fields.of(piece, '', 'A piece', findings);
  const craft = findings.count === 0 ? findings.soundly(() => fields.choice('craft', 'Craft', ['frame-loom'])) : undefined;
  const reckoned = craft && planFrameLoom(fields);
  return findings.outcome(reckoned && { ...reckoned, warnings: findings.warnings });
}
