/** Buying a seat. */
import { z } from 'astro/zod';

/** A box of a form: there when ticked. */
const ticked = z.string().optional().transform((value) => value !== undefined);

export const CheckoutForm = z.object({
  series: z.string().regex(/^[a-z0-9-]{1,64}$/),
  startAtOnce: ticked,
  withdrawalGivenUp: ticked,
});
export type CheckoutInput = z.output<typeof CheckoutForm>;

/** What a buyer agreed to before she was sent to the pay page, with the version of the words she read. */
export interface OrderTerms {
  readonly wordsVersion: string;
  /** She asked that the parts open at once. */
  readonly startAtOnce: boolean;
  /** She knows that she gives up the time to withdraw by that. */
  readonly withdrawalGivenUp: boolean;
  readonly agreedAt: string;
}

/** Raised whenever the words at the two boxes change. */
export const TERMS_WORDS_VERSION = '2026-12';
