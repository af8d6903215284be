/** A notice as one person gets it, with the amounts of her own loom. */
import { amountOf } from '#core/craft/amounts.ts';
import type { Piece } from '#core/craft/crafts.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import { madeFor } from '#core/craft/made-for.ts';
import type { LessonTree } from '#core/lesson-text/tree.ts';
import { amountText } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';
import { sayNotice } from './notice-text.ts';
import type { SaidBlock } from './said.ts';

export interface Reader {
  /** Empty: as the pattern. */
  readonly mine: MyPiece;
  readonly units: Units;
}

export function noticeFor(tree: LessonTree, pattern: Piece | null, { mine, units }: Reader): SaidBlock[] {
  const made = madeFor(pattern, mine, units);
  return sayNotice(tree, (key) => {
    const amount = made === null ? null : amountOf(key, made.piece, made.plan);
    return amount?.ok === true ? amountText(amount.value, units) : '(not in this plan)';
  });
}
