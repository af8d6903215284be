/** A pattern piece recomputed for a student's own loom, width and yarns. */
import { CRAFT_NAMES, CRAFTS, craftOf, type Piece, type Plan, type PlanFor } from '#core/craft/crafts.ts';
import { checkMine, type MyPiece } from '#core/craft/fitting/my-piece.ts';
import { largestHeight, largestWidth } from '#core/craft/frame-loom/room.ts';
import { settingsOf } from '#core/craft/frame-loom/settings.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { fail, succeed, type Outcome, type Problem } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export type { MyPiece } from '#core/craft/fitting/my-piece.ts';
export type { FitWay } from '#core/craft/fitting/way.ts';

export interface FittedPiece<P extends Piece = Piece> {
  readonly piece: P;
  readonly plan: PlanFor<P>;
  /** What differs from the pattern, in words, in the student's units. */
  readonly changes: readonly string[];
}

/** A yarn kept for a role the teacher has since taken out of the pattern does no harm. */
function warnOfLostRoles(pattern: Piece, mine: MyPiece): readonly Problem[] {
  const known = craftOf(pattern).ownNames(pattern)['role'] ?? [];
  return [...Object.keys(mine.yarns ?? {}), ...Object.keys(mine.cords ?? {})].filter((role) => !known.includes(role)).map((role) => ({
    code: 'W_UNUSED',
    path: `/yarns/${role}`,
    message: `The pattern has no yarn in the role “${role}” any more.`,
  }));
}

/** A yarn that only bands she leaves out were woven with is told among the changes. */
const isNews = (before: Outcome<Plan>) => ({ code, path }: Problem): boolean =>
  code !== 'W_UNUSED' || !before.ok || before.warnings.some((warning) => warning.code === code && warning.path === path);

/** What is wrong with either before they can be put together at all; whether the pattern can be made is not asked. */
function checkBoth(pattern: unknown, mine: unknown, units: Units): readonly Problem[] {
  const findings = Findings.in(units);
  const fields = Fields.of(pattern, '', 'A piece', findings);
  const craft = findings.soundly(() => fields.choice('craft', 'Craft', CRAFT_NAMES));
  if (craft !== undefined) CRAFTS[craft].read(fields);
  checkMine(mine, findings);
  const read = findings.outcome(true);
  return read.ok ? [] : read.problems;
}

/**
 * Puts a student's loom, width and yarns into the pattern and reckons it. Nails twice as
 * close as the pattern's are used every second one, and so on; shapes keep their share of
 * the width; the way she chose to fit it comes last. Never throws for what a person may send. Problems point into the changed piece (`/loom/insideWidthMm`, `/size/widthMm`,
 * `/warp/endsTogether`, `/yarns/<role>/…`) and, where the loom is too small, name the
 * largest size that fits.
 */
export function fitPiece<P extends Piece>(pattern: P, mine: MyPiece, units: Units = 'cm'): Outcome<FittedPiece<P>> {
  const refused = checkBoth(pattern, mine, units);
  if (refused.length > 0) return fail(refused);
  const craft = craftOf(pattern);
  // A craft changes a piece of its own into another of its own.
  const piece = craft.change(pattern, mine) as P;
  const planned = planPiece(piece, units);
  if (!planned.ok) return planned;
  const before = planPiece(pattern, units);
  const changes = before.ok ? craft.tellChanges({ piece: pattern, plan: before.value }, { piece, plan: planned.value }, units, mine) : [];
  return succeed({ piece, plan: planned.value, changes }, [...planned.warnings.filter(isNews(before)), ...warnOfLostRoles(pattern, mine)]);
}

/** The largest finished size the piece's loom holds at its spacing; the width only if the loom tells its own. */
export function roomOnLoom(piece: FrameLoomPiece): { readonly widthMm?: number; readonly heightMm: number } {
  const settings = settingsOf(piece.allowances ?? {}, piece.mode ?? 'straight-warp', piece.beat);
  const widthMm = largestWidth(piece.loom, piece.warp, settings);
  const heightMm = largestHeight(piece.loom, piece.warp, piece, settings);
  return widthMm === undefined ? { heightMm } : { widthMm, heightMm };
}
