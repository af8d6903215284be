/** The request that opens a pay page for an order: made once, kept with the order, and sent as it was kept. */
import type { KeptCheckout } from '#contracts/checkout.ts';
import { config } from '#server/config.ts';
import type { Order } from '#server/models/index.ts';
import { checkoutExpiry, type CheckoutRequest } from '#server/payments/payment-service.ts';
import type { Currency } from '#core/money/currency.ts';

export interface RequestFacts {
  readonly orderId: string;
  readonly attempt: number;
  readonly amountMinor: number;
  readonly currency: Currency;
  readonly series: { readonly slug: string; readonly title: string };
  readonly buyerAddress: string;
}

/** Where a buyer comes back to, paid or not. */
export function seatPage(slug: string): string {
  return `${config().publicUrl}/series/${slug}/seat`;
}

/** A request as of `now`. Its end is reckoned here and never again for the same attempt. */
export function newRequest({ orderId, attempt, amountMinor, currency, series, buyerAddress }: RequestFacts, now: Date): KeptCheckout {
  return {
    orderId,
    attempt,
    currency,
    lines: [{ name: series.title, description: 'A seat in the series', amountMinor, quantity: 1 }],
    buyerAddress,
    successUrl: `${seatPage(series.slug)}?checkout={CHECKOUT_SESSION_ID}`,
    cancelUrl: `${config().publicUrl}/series/${series.slug}?paying=stopped#take`,
    expiresAt: checkoutExpiry(now).toISOString(),
  };
}

/** The request exactly as it was kept. */
export function keptRequest(order: Order): CheckoutRequest {
  return { ...order.checkoutParameters, expiresAt: new Date(order.checkoutParameters.expiresAt) };
}
