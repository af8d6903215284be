/** The four figures under a series' title. */
import { lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import type { Plan } from '#core/craft/plan-types.ts';
import type { Piece } from '#core/craft/piece.ts';
import { seriesFigures } from '#core/series/figures.ts';
import { hoursRange, likelyHours } from '#core/series/hours-words.ts';
import { formatAmount, type AmountPart } from '#core/units/format-amount.ts';
import type { Units } from '#core/units/units.ts';

export interface ShownFigure {
  readonly label: string;
  readonly value: string | readonly AmountPart[];
  readonly unit?: string;
  readonly was?: string;
}

export function seriesFiguresShown(made: { readonly piece: Piece; readonly plan: Plan } | null, parts: readonly unknown[], units: Units): readonly ShownFigure[] {
  const count = { label: 'Parts', value: String(parts.length) };
  if (made === null) return [count];
  const figures = seriesFigures(made.piece, made.plan);
  return [
    count,
    { label: 'At the loom', value: likelyHours(figures.hours), was: hoursRange(figures.hours) },
    { label: 'Yarn, about', value: formatAmount(massOf(figures.yarnGrams), units) },
    { label: 'Frame loom from', value: formatAmount(lengthOf(figures.loomInsideMm, 'least'), units), unit: 'inside' },
  ];
}
