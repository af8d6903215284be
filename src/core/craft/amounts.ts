/** Amounts a text or a gathering list can ask of a plan by name, each with the way it was got. */
import type { Amount } from '#core/craft/amounts/amount-types.ts';
import { askAmount } from '#core/craft/amounts/ask-amount.ts';
import { craftOf, CRAFT_NAMES, CRAFTS, type Piece, type Plan } from '#core/craft/crafts.ts';
import type { Outcome } from '#core/outcome.ts';

export type * from '#core/craft/amounts/amount-types.ts';

const keysOf = (groups: readonly { readonly keys: readonly string[] }[]): string[] => groups.flatMap(({ keys }) => keys);

/** Every key any craft has, with `<role>`, `<name>` and the like standing for names a piece gives. */
export const AMOUNT_KEYS: readonly string[] = [...new Set(CRAFT_NAMES.flatMap((name) => keysOf(CRAFTS[name].amounts)))];

/** As `askAmount`, by the craft of the piece. */
export function amountOf(key: string, piece: Piece, plan: Plan): Outcome<Amount> {
  return askAmount(craftOf(piece), key, { piece, plan });
}

const PLACE = /<([a-z]+)>/;

/** Every key of these this piece tells, written out with its own names. */
export function keysTold(keys: readonly string[], piece: Piece, plan: Plan): string[] {
  const own = craftOf(piece).ownNames(piece);
  const written = keys.flatMap((key) => {
    const place = PLACE.exec(key)?.[1];
    return place === undefined ? [key] : (own[place] ?? []).map((name) => key.replace(`<${place}>`, name));
  });
  return written.filter((key) => amountOf(key, piece, plan).ok);
}

/** Every key this piece tells, in the order in which its craft groups them. */
export function amountKeysOf(piece: Piece, plan: Plan): readonly string[] {
  return keysTold(keysOf(craftOf(piece).amounts), piece, plan);
}
