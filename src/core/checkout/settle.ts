/**
 * What the state of a checkout means for its order. Pure, and the same whatever told us to look: a webhook, a repeated
 * one, one out of order, the buyer coming back, or the daily round.
 */
export interface OrderFacts {
  readonly state: 'pending' | 'paid' | 'expired' | 'review';
  readonly orderId: string;
  readonly amountMinor: number;
  readonly currency: string;
  /** Whether this house takes real money. */
  readonly live: boolean;
}

export interface CheckoutFacts {
  readonly orderId: string | undefined;
  readonly status: 'open' | 'complete' | 'expired';
  readonly payment: 'unpaid' | 'paid' | 'nothing-to-pay';
  readonly currency: string;
  readonly totalMinor: number;
  readonly live: boolean;
}

export type Settlement =
  | { readonly act: 'none' }
  /** The buyer gets her seat. */
  | { readonly act: 'seat' }
  /** Nobody can pay this any more. */
  | { readonly act: 'release' }
  /** Something does not agree: no seat, a person looks at it. */
  | { readonly act: 'review'; readonly reason: string };

export function settlementOf(order: OrderFacts, checkout: CheckoutFacts): Settlement {
  if (order.state === 'paid' || order.state === 'review') return { act: 'none' };
  if (checkout.status === 'expired') return order.state === 'pending' ? { act: 'release' } : { act: 'none' };
  if (checkout.status === 'open' || checkout.payment === 'unpaid') return { act: 'none' };
  const reason = disagreement(order, checkout);
  return reason === null ? { act: 'seat' } : { act: 'review', reason };
}

function disagreement(order: OrderFacts, checkout: CheckoutFacts): string | null {
  if (checkout.orderId !== order.orderId) return 'The payment names another order.';
  if (checkout.live !== order.live) return 'Test money was sent to a house that takes real money, or the other way round.';
  if (checkout.currency.toUpperCase() !== order.currency) return `Paid in ${checkout.currency.toUpperCase()}, asked in ${order.currency}.`;
  if (checkout.totalMinor !== order.amountMinor) return `Paid ${checkout.totalMinor}, asked ${order.amountMinor} (minor units).`;
  return null;
}
