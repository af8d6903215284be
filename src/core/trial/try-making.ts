/** A pattern on somebody's loom, as her own making has it: what it becomes there, or why it does not fit and what would. */
import type { FittedPiece, MyPiece } from '#core/craft/fit.ts';
import { waysToFit, type WayId } from '#core/craft/fitting/ways-to-fit.ts';
import { fitWoven } from '#core/craft/frame-loom/fit-woven.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { Problem } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';

export type MakingTried =
  | { readonly fits: true; readonly fitted: FittedPiece<FrameLoomPiece>; readonly warnings: readonly Problem[] }
  | { readonly fits: false; readonly problems: readonly Problem[]; readonly wouldFit: readonly WayThatFits[] };

export interface WayThatFits {
  readonly id: WayId;
  readonly fitted: FittedPiece<FrameLoomPiece>;
}

const once = (problems: readonly Problem[]): readonly Problem[] => [...new Map(problems.map((problem) => [problem.message, problem])).values()];

/** Every sentence once, in `units`. */
export function tryMaking(pattern: FrameLoomPiece, mine: MyPiece, units: Units): MakingTried {
  const fit = fitWoven(pattern, mine, units);
  if (fit.ok) return { fits: true, fitted: fit.value, warnings: once(fit.warnings) };
  const ways = waysToFit(pattern, mine, units).flatMap(({ id, outcome }): WayThatFits[] => (outcome.ok ? [{ id, fitted: outcome.value }] : []));
  return { fits: false, problems: once(fit.problems), wouldFit: ways };
}
