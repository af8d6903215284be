/** What a person may do by being who she is. */
import type { Actor } from '#server/context.ts';

/** Receipts and answers go by mail, so the address must be hers. */
export function mayBuy(actor: Actor | null): boolean {
  return actor !== null && actor.addressConfirmed;
}
