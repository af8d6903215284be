/** How a student's piece differs from the pattern, in words. */
import type { Piece } from '#core/craft/piece.ts';
import type { Plan } from '#core/craft/plan-types.ts';
import { lengthOf, type LengthUse } from '#core/craft/amounts/amount-types.ts';
import { amountText } from '#core/units/format-amount.ts';
import { loomKind } from '#core/craft/looms/looms.ts';
import type { Units } from '#core/units/units.ts';

export interface Made {
  readonly piece: Piece;
  readonly plan: Plan;
}

/** A difference that cannot be seen is none. */
const SAME_MM = 0.05;

const ORDINALS = ['second', 'third', 'fourth', 'fifth', 'sixth', 'seventh', 'eighth', 'ninth', 'tenth'];

function nailWords({ loom }: Piece): string {
  const nth = loom.everyNthNail ?? 1;
  const inner = loomKind(loom).rows === 2 && loom.nailRows === 'inner' ? 'inner ' : '';
  const nail = `${inner}${loomKind(loom).holder.one}`;
  return nth === 1 ? `every ${nail}` : `every ${ORDINALS[nth - 2] ?? `${String(nth)}th`} ${nail}`;
}

function picksOf(plan: Plan): number {
  return plan.bands.reduce((sum, { picks }) => sum + (picks ?? 0), 0);
}

function tellYarns(before: Piece, after: Piece): string[] {
  return Object.entries(after.yarns).flatMap(([role, yarn]) =>
    yarn === before.yarns[role] ? [] : [`${yarn.label ?? 'Your own yarn'} is the ${role} yarn.`],
  );
}

/** One sentence for each thing that is not as in the pattern. */
export function tellChanges(before: Made, after: Made, units: Units): readonly string[] {
  const told: string[] = [];
  const length = (mm: number, use: LengthUse): string => amountText(lengthOf(mm, use), units);
  const tellLength = (was: number, is: number, use: LengthUse, words: (is: string, was: string) => string): void => {
    if (Math.abs(is - was) > SAME_MM) told.push(words(length(is, use), length(was, use)));
  };
  tellLength(before.piece.size.widthMm, after.piece.size.widthMm, 'size', (is, was) => `The piece is ${is} wide instead of ${was}.`);
  const [kindBefore, kind] = [loomKind(before.piece.loom), loomKind(after.piece.loom)];
  if (kind !== kindBefore) told.push(kind.dressing);
  if (after.piece.loom.warping !== before.piece.loom.warping) {
    told.push(after.piece.loom.warping === 'zigzag' ? 'The warp goes round every nail in a zigzag.' : 'The warp steps along two nails at a time.');
  }
  if (nailWords(after.piece) !== nailWords(before.piece)) told.push(`The warp goes round ${nailWords(after.piece)}.`);
  if ((after.piece.warp.endsTogether ?? 1) !== (before.piece.warp.endsTogether ?? 1)) {
    told.push(after.piece.warp.endsTogether === 2 ? 'Two ends are worked together as one.' : 'Each end is worked by itself.');
  }
  tellLength(before.plan.ends.spacingMm, after.plan.ends.spacingMm, 'fine', (is, was) => `Ends stand ${is} apart instead of ${was}.`);
  if (after.plan.ends.count !== before.plan.ends.count) {
    told.push(`There are ${String(after.plan.ends.count)} ends instead of ${String(before.plan.ends.count)}.`);
  }
  told.push(...tellYarns(before.piece, after.piece));
  if (picksOf(after.plan) !== picksOf(before.plan)) {
    told.push(`${String(picksOf(before.plan))} rows of tabby become ${String(picksOf(after.plan))}.`);
  }
  return told;
}
