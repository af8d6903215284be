/**
 * What the house asks of a payment service. Amounts are whole minor units of one currency; ids are the service's own.
 * Nothing here is called inside a database transaction, and nothing is believed that was not read back from the service.
 */
import type { Currency } from '#core/money/currency.ts';

/** One line of what is bought. */
export interface CheckoutLine {
  readonly name: string;
  readonly description?: string;
  readonly amountMinor: number;
  readonly quantity: number;
}

/**
 * A request for a page to pay on. The caller keeps it, whole, before the first try: the same order and attempt must always
 * come with the same request, or the service refuses it as a different one. Any change takes a new attempt number.
 */
export interface CheckoutRequest {
  /** Our public id of the order; it comes back with every answer. */
  readonly orderId: string;
  /** From 1. */
  readonly attempt: number;
  readonly currency: Currency;
  readonly lines: readonly CheckoutLine[];
  /** Filled in on the page, where the buyer's address is known. */
  readonly buyerAddress?: string;
  /** Holds `{CHECKOUT_SESSION_ID}`, which the service replaces. */
  readonly successUrl: string;
  readonly cancelUrl: string;
  /** See `checkoutExpiry`: reckoned once and kept, never reckoned again for the same attempt. */
  readonly expiresAt: Date;
}

export interface Checkout {
  readonly id: string;
  readonly orderId: string | undefined;
  /** `expired` is final: nobody can pay any more. */
  readonly status: 'open' | 'complete' | 'expired';
  /** A complete checkout that is `unpaid` waits for a slow way of paying; `refused` when that came to nothing. */
  readonly payment: 'unpaid' | 'paid' | 'nothing-to-pay' | 'refused';
  /** Where to send the buyer; only while open. */
  readonly url: string | undefined;
  readonly currency: string;
  readonly subtotalMinor: number;
  readonly discountMinor: number;
  readonly taxMinor: number;
  readonly shippingMinor: number;
  readonly totalMinor: number;
  /** Real money, not the service's test side. */
  readonly live: boolean;
  readonly paymentId: string | undefined;
  readonly createdAt: Date;
  readonly expiresAt: Date;
}

export interface RefundRequest {
  /** Our public id of the refund: asking twice with the same id gives money back once. */
  readonly refundId: string;
  readonly paymentId: string;
  /** All that is left when left out. */
  readonly amountMinor?: number;
}

export interface Refund {
  readonly id: string;
  /** Our public id, when the refund was asked for by us. */
  readonly refundId: string | undefined;
  readonly paymentId: string | undefined;
  readonly status: 'pending' | 'succeeded' | 'failed' | 'canceled';
  readonly failureReason: string | undefined;
  readonly amountMinor: number;
  readonly currency: string;
  readonly createdAt: Date;
}

export type PaymentFailure =
  /** No answer, or a sign of overload, after all tries. The request may or may not have been carried out: ask again with the same ids. */
  | { readonly kind: 'unreachable'; readonly message: string }
  | { readonly kind: 'not-found'; readonly message: string }
  /** The thing is not in a state for this: a checkout that is not open, more money back than was paid. */
  | { readonly kind: 'not-possible'; readonly code: string; readonly message: string }
  /** The same ids came before with another request. */
  | { readonly kind: 'reused-id'; readonly message: string }
  /** Our key or our request is wrong: nothing a buyer or a retry can mend. */
  | { readonly kind: 'misconfigured'; readonly code: string; readonly message: string };

export type PaymentAnswer<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly failure: PaymentFailure };

/** News from the service, its sender proven. Only ids are taken from it: the things themselves are read back. */
export interface PaymentEvent {
  readonly id: string;
  /** The service's own word, `checkout.session.completed` for instance. */
  readonly type: string;
  readonly createdAt: Date;
  readonly live: boolean;
  /** Made with another version of the service's interface than ours: read things back, do not trust their shape. */
  readonly foreignVersion: boolean;
  readonly about: {
    /** The service's word for the kind of thing: `checkout.session`, `refund`, `charge` … */
    readonly kind: string;
    readonly id: string;
    readonly paymentId: string | undefined;
    readonly orderId: string | undefined;
  };
}

export type EventRefusal = 'unsigned' | 'malformed-signature' | 'wrong-signature' | 'too-old' | 'from-the-future' | 'unreadable';

export type EventVerdict =
  | {
      readonly ok: true;
      readonly event: PaymentEvent;
      /** Which of our secrets matched, 0 for the newest. */
      readonly secretIndex: number;
      /** Their clock minus ours; worth an alarm beyond a minute. */
      readonly clockSkewSeconds: number;
    }
  | { readonly ok: false; readonly reason: EventRefusal };

export interface PaymentService {
  createCheckout(request: CheckoutRequest): Promise<PaymentAnswer<Checkout>>;
  readCheckout(checkoutId: string): Promise<PaymentAnswer<Checkout>>;
  /** The newest checkout of an order made since `since`, for when the answer to `createCheckout` was lost for long. */
  findCheckout(orderId: string, since: Date): Promise<PaymentAnswer<Checkout | undefined>>;
  /** Closes the page to pay on. `not-possible` when it was paid or had ended; read it back to know which. */
  expireCheckout(checkoutId: string): Promise<PaymentAnswer<Checkout>>;
  /** Gives money back. Where all of it was given back already, answers the refund that did it. */
  refund(request: RefundRequest): Promise<PaymentAnswer<Refund>>;
  readRefund(id: string): Promise<PaymentAnswer<Refund>>;
  /** @param rawBody exactly as it arrived, before any parsing. */
  verifyEvent(rawBody: string, signatureHeader: string | null | undefined, now: Date): EventVerdict;
}

/** The service takes 30 minutes at least by its own clock; a little more leaves room for clocks that differ. */
const CHECKOUT_MINUTES = 35;

/** When a checkout begun at `now` ends. Whole seconds, as the service counts. */
export function checkoutExpiry(now: Date): Date {
  return new Date((Math.floor(now.getTime() / 1000) + CHECKOUT_MINUTES * 60) * 1000);
}
