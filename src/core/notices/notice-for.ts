/** A notice as one person gets it, with the amounts of her own loom. */
import type { Piece } from '#core/craft/crafts.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import { madeFor } from '#core/craft/made-for.ts';
import { amountFor } from '#core/craft/rest/amount-for.ts';
import { NOTHING_WOVEN, type WovenSoFar } from '#core/craft/rest/woven-so-far.ts';
import type { LessonTree } from '#core/lesson-text/tree.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { sayNotice } from './notice-text.ts';
import type { SaidBlock } from './said.ts';

export interface Reader {
  /** Empty: as the pattern. */
  readonly mine: MyPiece;
  readonly units: Units;
  readonly woven?: WovenSoFar;
}

export function noticeFor(tree: LessonTree, pattern: Piece | null, { mine, units, woven = NOTHING_WOVEN }: Reader): SaidBlock[] {
  const made = madeFor(pattern, mine, units, woven);
  return sayNotice(tree, (key) => {
    const amount = made === null ? null : amountFor(key, made);
    return amount?.ok === true ? amountText(amount.value, units) : '(not in this plan)';
  });
}
