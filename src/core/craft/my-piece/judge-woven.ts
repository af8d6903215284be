/** A student's piece half way: what is still to weave of it, and what of it can no longer change. */
import type { MyPiece } from '#core/craft/fit.ts';
import { fitWoven } from '#core/craft/frame-loom/fit-woven.ts';
import type { Made } from '#core/craft/fitting/tell-changes.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { HalfWoven } from '#core/craft/rest/as-it-comes-out.ts';
import { refuseChanges } from '#core/craft/rest/fixed-on-loom.ts';
import { planRest, type RestPlan } from '#core/craft/rest/plan-rest.ts';
import { isBegun, NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import { fail, succeed, type Outcome, type Problem } from '#core/outcome.ts';
import type { Units } from '#core/units/units.ts';
import { BANDS_DONE, HEIGHT, leftAsked, ROWS } from './asked-of-woven.ts';

/** Her piece as it was kept last. */
export interface KeptPiece {
  readonly mine: MyPiece;
  readonly woven: WovenSoFar;
}

export const NOTHING_KEPT: KeptPiece = { mine: {}, woven: NOTHING_WOVEN };

export interface Halfway extends HalfWoven {
  /** Only those of the rest, with paths in what is woven. */
  readonly warnings: readonly Problem[];
  /** The rest of the piece as it was kept, where that was begun and is changed now; what is woven is the same for both. */
  readonly restAsKept?: RestPlan;
}

/** Whether there is anything to reckon a rest from. */
export const isTold = (woven: WovenSoFar): boolean => isBegun(woven) || woven.leftG !== undefined;

const differs = (a: MyPiece, b: MyPiece): boolean => JSON.stringify(a) !== JSON.stringify(b);

/**
 * `made` is her piece as the form has it now, by `mine`. Problems point into what is woven (`/bandsDone`, `/rows`,
 * `/heightMm`, `/leftG/<role>`), or into the piece where it cannot change any more.
 */
export function judgeWoven(woven: WovenSoFar, mine: MyPiece, made: Made, kept: KeptPiece, pattern: FrameLoomPiece, units: Units): Outcome<Halfway> {
  const before = isBegun(woven) && isBegun(kept.woven) && differs(mine, kept.mine) ? fitWoven(pattern, kept.mine, units) : undefined;
  const refused = before?.ok === true ? refuseChanges(before.value, made, woven) : [];
  const rest = planRest(made.piece, woven, units);
  if (!rest.ok) return fail([...refused, ...rest.problems]);
  if (refused.length > 0) return fail(refused);
  const asKept = before?.ok === true ? planRest(before.value.piece, woven, units) : undefined;
  return succeed({ woven, rest: rest.value, warnings: rest.warnings, ...(asKept?.ok === true ? { restAsKept: asKept.value } : {}) });
}

/** The field a problem with what is woven is about; undefined for one with the piece. */
export function wovenFieldOf(path: string): string | undefined {
  const [, first, role] = path.split('/');
  switch (first) {
    case 'bandsDone':
      return BANDS_DONE.key;
    case 'rows':
      return ROWS.key;
    case 'heightMm':
      return HEIGHT.key;
    case 'leftG':
      return role === undefined ? undefined : leftAsked(role.replaceAll('~1', '/').replaceAll('~0', '~')).key;
    default:
      return undefined;
  }
}
