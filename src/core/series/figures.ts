/** What a person weighs before she buys: how long, how much yarn, how wide a loom. All from the plan. */
import { craftOf, type Piece, type Plan } from '#core/craft/crafts.ts';
import type { Hours } from '#core/craft/plan-types.ts';

/** Of a piece of any craft. */
export interface SeriesFigures {
  readonly hours: Hours;
  /** All yarn, cord or fibre to have in hand, margins included. */
  readonly yarnGrams: number;
  /** Inside width of the narrowest frame that holds it; undefined where none is needed. */
  readonly loomInsideMm: number | undefined;
}

export function seriesFigures(piece: Piece, plan: Plan): SeriesFigures {
  const craft = craftOf(piece);
  const made = { piece, plan };
  return { hours: plan.hours, yarnGrams: craft.materials(made).reduce((sum, { grams }) => sum + grams, 0), loomInsideMm: craft.leastInsideMm(made) };
}
