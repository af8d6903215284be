/** The plan: every number reckoned from a piece. */
import { planFrameLoom } from '#core/craft/frame-loom/plan-frame-loom.ts';
import type { Plan } from '#core/craft/plan-types.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import type { Outcome } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export type * from '#core/craft/plan-types.ts';

/** Each craft a piece can be made in, with what reads and reckons it. */
const CRAFTS = { 'frame-loom': planFrameLoom } as const;
const CRAFT_NAMES = ['frame-loom'] as const satisfies readonly (keyof typeof CRAFTS)[];

/** Reckons the piece in these fields; undefined, with a problem among their findings, if it cannot be woven. */
export function planInFields(fields: Fields): Plan | undefined {
  const { findings } = fields;
  if (findings.count > 0) return undefined;
  const craft = findings.soundly(() => fields.choice('craft', 'Craft', CRAFT_NAMES));
  const reckoned = craft && CRAFTS[craft](fields);
  return reckoned && { ...reckoned, warnings: findings.warnings };
}

/**
 * Reckons the plan of a piece. Never throws for what a person may send: whatever is
 * wrong comes back as problems, all of them at once, one for each refused value.
 * `units` are those in which messages name lengths.
 */
export function planPiece(piece: unknown, units: Units = 'cm'): Outcome<Plan> {
  const findings = Findings.in(units);
  return findings.outcome(planInFields(Fields.of(piece, '', 'A piece', findings)));
}
