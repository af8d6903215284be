import type Stripe from 'stripe';
import { newId } from './ids.ts';
import type { EventRecord, PaymentState } from './payment-state.ts';
import type { ServiceClock } from './service-clock.ts';

/** The version the stand-in speaks, and writes into its events. */
export const SERVICE_VERSION = '2026-10-28.endive';

/** What happened, with the thing it happened to: the events of taking and giving back money. */
export type Happening =
  | {
      readonly type: 'checkout.session.completed' | 'checkout.session.expired' | 'checkout.session.async_payment_succeeded' | 'checkout.session.async_payment_failed';
      readonly object: Stripe.Checkout.Session;
    }
  | {
      readonly type:
        | 'payment_intent.created'
        | 'payment_intent.requires_action'
        | 'payment_intent.processing'
        | 'payment_intent.succeeded'
        | 'payment_intent.payment_failed'
        | 'payment_intent.canceled';
      readonly object: Stripe.PaymentIntent;
    }
  | { readonly type: 'charge.pending' | 'charge.succeeded' | 'charge.failed' | 'charge.refunded'; readonly object: Stripe.Charge }
  | { readonly type: 'refund.created' | 'refund.updated' | 'refund.failed' | 'charge.refund.updated'; readonly object: Stripe.Refund };

/** The request that caused an event; nothing when a buyer or the clock did. */
export interface Cause {
  readonly requestId: string;
  readonly idempotencyKey: string | null;
}

/** Writes down what happens and tells who listens. Each event keeps its thing as it was at that moment. */
export class EventLog {
  readonly #state: PaymentState;
  readonly #clock: ServiceClock;
  readonly #tell: (event: EventRecord) => void;

  constructor(state: PaymentState, clock: ServiceClock, tell: (event: EventRecord) => void) {
    this.#state = state;
    this.#clock = clock;
    this.#tell = tell;
  }

  happened({ type, object }: Happening, cause?: Cause): void {
    const event = {
      id: newId('evt'),
      object: 'event',
      api_version: SERVICE_VERSION,
      created: this.#clock.now(),
      data: { object: structuredClone(object) },
      livemode: false,
      pending_webhooks: 1,
      request: { id: cause?.requestId ?? null, idempotency_key: cause?.idempotencyKey ?? null },
      type,
    } satisfies Stripe.EventBase;
    this.#state.events.put(event);
    this.#tell(event);
  }
}
