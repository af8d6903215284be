import type { Amount } from '#core/craft/amounts/amount-types.ts';
import type { Craft, MadeOf, PieceCore, PlanCore } from '#core/craft/craft.ts';
import { fail, succeed, type Outcome } from '#core/outcome.ts';

/**
 * The amount a key names for this piece and its plan. Lengths and masses of yarn are
 * those to have in hand, with margin. A key this piece does not tell is `E_ENUM`, with
 * the reason.
 */
export function askAmount<P extends PieceCore, L extends PlanCore>(craft: Craft<P, L>, key: string, made: MadeOf<P, L>): Outcome<Amount> {
  const reckoned = craft.amount(key, made);
  if (typeof reckoned === 'string') return fail([{ code: 'E_ENUM', path: '', message: reckoned }]);
  return succeed({ key, label: reckoned.label, ...reckoned.quantity, howReckoned: reckoned.how });
}
