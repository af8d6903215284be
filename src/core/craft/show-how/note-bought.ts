/** From the yarn or cord a piece takes to what to have in hand, its mass and its balls. */
import type { Yarn } from '#core/craft/piece.ts';
import type { WarpPlan } from '#core/craft/plan-types.ts';
import { from, given, type Notebook } from '#core/craft/show-how/notebook.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';
import { massOf } from '#core/craft/yarn/thread.ts';

export interface Bought {
  /** Of the workings: `warp`, `yarns.main`. */
  readonly id: string;
  /** Where the yarn stands in the piece. */
  readonly path: string;
  readonly ball: Yarn['ball'] | undefined;
  readonly net: Working;
  /** Of one strand as it is bought. */
  readonly tex: Working;
  readonly margin: WorkingInput;
  readonly plan: WarpPlan;
}

/** Length with margin, both masses, balls; answers the working of the net mass. */
export function noteBought(book: Notebook, { id, path, ball, net, tex, margin, plan }: Bought): Working {
  const length = book.note({
    id: `${id}.withMarginMm`, name: 'yarn to have in hand', formula: 'L * (1 + M)', inputs: [from('L', net), margin], value: plan.withMarginMm, unit: 'mm', ...RULES.margins,
  });
  const mass = (key: string, name: string, of: Working, value: number): Working =>
    book.note({ id: `${id}.${key}`, name, formula: 'L / 1e6 * T', inputs: [from('L', of), from('T', tex)], value, unit: 'g', ...RULES.yarnNumbers });
  mass('withMarginG', 'mass of the yarn to have in hand', length, massOf(plan.withMarginMm, tex.value));
  if (plan.balls !== undefined && ball !== undefined) {
    const metres = given({ symbol: 'b', name: 'metres in a ball', value: ball.metres, unit: 'm' }, `${path}/ball/metres`, 'label');
    book.note({ id: `${id}.balls`, name: 'balls to buy', formula: 'ceil(L / (1000 * b) - 1e-9)', inputs: [from('L', length), metres], value: plan.balls, unit: 'count', ...RULES.wholeNumbers });
  }
  return mass('massG', 'mass of the yarn in the piece', net, plan.massG);
}
