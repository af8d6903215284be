/** A pattern piece recomputed for a student, by a craft that is handed over: who has pieces of one craft only loads no other. */
import type { Craft, PieceCore, PlanCore } from '#core/craft/craft.ts';
import { checkMine, type MyPiece } from '#core/craft/fitting/my-piece.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { fail, succeed, type Outcome, type Problem } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export interface Fitted<P, L> {
  readonly piece: P;
  readonly plan: L;
  /** What differs from the pattern, in words, in the student's units. */
  readonly changes: readonly string[];
}

/** A yarn kept for a role the teacher has since taken out of the pattern does no harm. */
function warnOfLostRoles<P extends PieceCore>(craft: Craft<P>, pattern: P, mine: MyPiece): readonly Problem[] {
  const known = craft.ownNames(pattern)['role'] ?? [];
  return [...Object.keys(mine.yarns ?? {}), ...Object.keys(mine.cords ?? {})].filter((role) => !known.includes(role)).map((role) => ({
    code: 'W_UNUSED',
    path: `/yarns/${role}`,
    message: `The pattern has no yarn in the role “${role}” any more.`,
  }));
}

/** A yarn that only bands she leaves out were woven with is told among the changes. */
const isNews = (before: Outcome<PlanCore>) => ({ code, path }: Problem): boolean =>
  code !== 'W_UNUSED' || !before.ok || before.warnings.some((warning) => warning.code === code && warning.path === path);

/** What is wrong with either before they can be put together at all; whether the pattern can be made is not asked. */
function checkBoth({ read }: Pick<Craft, 'read'>, pattern: unknown, mine: unknown, units: Units): readonly Problem[] {
  const findings = Findings.in(units);
  read(Fields.of(pattern, '', 'A piece', findings));
  checkMine(mine, findings);
  const outcome = findings.outcome(true);
  return outcome.ok ? [] : outcome.problems;
}

/**
 * Puts a student's loom, width and yarns into the pattern and reckons it. Nails twice as
 * close as the pattern's are used every second one, and so on; shapes keep their share of
 * the width; the way she chose to fit it comes last. Never throws for what a person may send. Problems point into the changed piece (`/loom/insideWidthMm`, `/size/widthMm`,
 * `/warp/endsTogether`, `/yarns/<role>/…`) and, where the loom is too small, name the
 * largest size that fits.
 * @param plan reckons a piece of that craft
 */
export function fitIn<P extends PieceCore, L extends PlanCore>(craft: Craft<P, L>, plan: (piece: P, units: Units) => Outcome<L>, pattern: P, mine: MyPiece, units: Units): Outcome<Fitted<P, L>> {
  const refused = checkBoth(craft, pattern, mine, units);
  if (refused.length > 0) return fail(refused);
  const piece = craft.change(pattern, mine);
  const planned = plan(piece, units);
  if (!planned.ok) return planned;
  const before = plan(pattern, units);
  const changes = before.ok ? craft.tellChanges({ piece: pattern, plan: before.value }, { piece, plan: planned.value }, units, mine) : [];
  return succeed({ piece, plan: planned.value, changes }, [...planned.warnings.filter(isNews(before)), ...warnOfLostRoles(craft, pattern, mine)]);
}
