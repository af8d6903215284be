/** Buying a seat. */
import { z } from 'astro/zod';
import type { Currency } from '#core/money/currency.ts';
import { typedLoomOf, type TypedLoom } from '#core/trial/typed-loom.ts';

/** A box of a form: there when ticked. */
const ticked = z.string().optional().transform((value) => value !== undefined);
const loomField = z.string().max(200).optional();

export const CheckoutForm = z
  .object({
    series: z.string().regex(/^[a-z0-9-]{1,64}$/),
    startAtOnce: ticked,
    withdrawalGivenUp: ticked,
    inside: loomField,
    spacing: loomField,
    ends: loomField,
    units: loomField,
    wide: loomField,
  })
  .transform(({ series, startAtOnce, withdrawalGivenUp, ...loom }): CheckoutInput => ({
    series, startAtOnce, withdrawalGivenUp, loom: typedLoomOf((name) => Object.entries(loom).find(([field]) => field === name)?.[1]),
  }));

export interface CheckoutInput {
  readonly series: string;
  readonly startAtOnce: boolean;
  readonly withdrawalGivenUp: boolean;
  /** The loom she tried the piece on before she took the seat, if any. */
  readonly loom: TypedLoom | null;
}

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

/** A request for a page to pay on, as it is kept with its order: to the letter what the payment service is asked. */
export interface KeptCheckout {
  readonly orderId: string;
  readonly attempt: number;
  readonly currency: Currency;
  readonly lines: readonly { readonly name: string; readonly description?: string; readonly amountMinor: number; readonly quantity: number }[];
  readonly buyerAddress?: string;
  readonly successUrl: string;
  readonly cancelUrl: string;
  /** ISO 8601. */
  readonly expiresAt: string;
}

/** What a person who came back from the pay page is told; nothing of it is decided by her coming back. */
export type SeatStanding = 'yours' | 'waits' | 'refused' | 'ended' | 'looked-at' | 'unknown';
