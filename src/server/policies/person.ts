/** What a person may do by what is known of her address. Letters that matter must reach somebody. */
import type { Actor } from '#server/context.ts';

/** Pay for a seat: the receipt and the news of it go to a confirmed address. */
export function mayBuy(actor: Actor | null): boolean {
  return actor !== null && actor.addressConfirmed;
}

/** Show something to others: a photo, a question, a review. */
export function mayPost(actor: Actor | null): boolean {
  return actor !== null && actor.addressConfirmed;
}
