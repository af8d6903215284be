/**
 * What the state of a checkout means for its order. Pure, and the same whatever told us to look: a webhook, a repeated
 * one, one out of order, the buyer coming back, or the daily round.
 */
/** `expired`: nobody paid in time. `refused`: the bank said no after a while. `review`: a person has to look at it. */
export type OrderState = 'pending' | 'paid' | 'expired' | 'refused' | 'review';

export interface OrderFacts {
  readonly state: OrderState;
  readonly orderId: string;
  /** The checkout its pay page belongs to, or by which it was paid. */
  readonly checkoutId: string | null;
  readonly amountMinor: number;
  readonly currency: string;
  /** Whether this house takes real money. */
  readonly live: boolean;
}

export interface CheckoutFacts {
  readonly id: string;
  readonly orderId: string | undefined;
  readonly status: 'open' | 'complete' | 'expired';
  readonly payment: 'unpaid' | 'paid' | 'nothing-to-pay' | 'refused';
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
  /** The bank said no after the buyer had left the page. */
  | { readonly act: 'refuse' }
  /** Something does not agree: no seat, a person looks at it. */
  | { readonly act: 'review'; readonly reason: string }
  /** The seat was there already: it stays, and a person gives the second payment back. */
  | { readonly act: 'paid-twice' };

export function settlementOf(order: OrderFacts, checkout: CheckoutFacts): Settlement {
  const isPaid = checkout.status === 'complete' && (checkout.payment === 'paid' || checkout.payment === 'nothing-to-pay');
  if (order.state === 'review') return { act: 'none' };
  if (order.state === 'paid') return isPaid && checkout.id !== order.checkoutId ? { act: 'paid-twice' } : { act: 'none' };
  if (isPaid) {
    const reason = disagreement(order, checkout);
    return reason === null ? { act: 'seat' } : { act: 'review', reason };
  }
  // An earlier page of the same order may end while its buyer stands at a later one.
  if (order.state !== 'pending' || (order.checkoutId !== null && checkout.id !== order.checkoutId)) return { act: 'none' };
  if (checkout.status === 'expired') return { act: 'release' };
  return checkout.status === 'complete' && checkout.payment === 'refused' ? { act: 'refuse' } : { act: 'none' };
}

function disagreement(order: OrderFacts, checkout: CheckoutFacts): string | null {
  if (checkout.orderId !== order.orderId) return 'The payment names another order.';
  if (checkout.live !== order.live) return 'Test money was sent to a house that takes real money, or the other way round.';
  if (checkout.currency.toUpperCase() !== order.currency) return `Paid in ${checkout.currency.toUpperCase()}, asked in ${order.currency}.`;
  if (checkout.totalMinor !== order.amountMinor) return `Paid ${checkout.totalMinor}, asked ${order.amountMinor} (minor units).`;
  return null;
}
