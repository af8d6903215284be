/** The four figures under a series' title. */
import { lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import { craftOf, type Piece, type Plan } from '#core/craft/crafts.ts';
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
  const { words } = craftOf(made.piece);
  return [
    count,
    { label: capital(words.hours), value: likelyHours(figures.hours), was: hoursRange(figures.hours) },
    { label: `${words.material}, about`, value: formatAmount(massOf(figures.yarnGrams), units) },
    ...(figures.loomInsideMm === undefined ? [] : [{ label: `${words.needs} from`, value: formatAmount(lengthOf(figures.loomInsideMm, 'least'), units), unit: 'inside' }]),
  ];
}

const capital = (words: string): string => `${words.charAt(0).toUpperCase()}${words.slice(1)}`;
