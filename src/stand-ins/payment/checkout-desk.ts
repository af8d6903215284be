import type Stripe from 'stripe';
import { ApiError, badParameter } from './api-error.ts';
import type { CreateCheckoutParameters } from './checkout-parameters.ts';
import type { Cause, EventLog } from './event-log.ts';
import { newId, randomSigns } from './ids.ts';
import { newIntent } from './payment-objects.ts';
import type { CheckoutRecord, PaymentState } from './payment-state.ts';
import type { ServiceClock } from './service-clock.ts';
import { newLineItem, newSession } from './session-object.ts';

const SHORTEST_SECONDS = 30 * 60;
const LONGEST_SECONDS = 24 * 60 * 60;
/** Below this the service takes no payment: the costs would eat it. */
const LEAST_TOTAL = 50;

/** Opens and closes checkouts. */
export class CheckoutDesk {
  readonly #state: PaymentState;
  readonly #clock: ServiceClock;
  readonly #log: EventLog;
  readonly #payPage: () => string;

  /** @param payPage where pay pages are: the address before the checkout's id. */
  constructor(state: PaymentState, clock: ServiceClock, log: EventLog, payPage: () => string) {
    this.#state = state;
    this.#clock = clock;
    this.#log = log;
    this.#payPage = payPage;
  }

  create(asked: CreateCheckoutParameters): CheckoutRecord {
    const created = this.#clock.now();
    const currency = oneCurrency(asked);
    const lineItems = asked.line_items.map((line) =>
      newLineItem({
        id: newId('li'),
        priceId: newId('price'),
        productId: newId('prod'),
        created,
        currency,
        name: line.price_data.product_data.name,
        unitAmount: line.price_data.unit_amount,
        quantity: line.quantity,
        taxBehavior: line.price_data.tax_behavior ?? 'unspecified',
      }),
    );
    const total = lineItems.reduce((sum, line) => sum + line.amount_total, 0);
    if (total > 0 && total < LEAST_TOTAL) {
      throw new ApiError(400, `The Checkout Session's total amount due must add up to at least ${LEAST_TOTAL} minor units`, { code: 'amount_too_small', beforeTrying: true });
    }
    const id = newId('cs_test');
    const session = newSession({
      id,
      created,
      expiresAt: expiryOf(asked, created),
      currency,
      total,
      url: `${this.#payPage()}${id}`,
      successUrl: asked.success_url,
      cancelUrl: asked.cancel_url ?? null,
      clientReferenceId: asked.client_reference_id ?? null,
      customerEmail: asked.customer_email ?? null,
      metadata: asked.metadata ?? {},
      locale: asked.locale ?? null,
      paymentMethodTypes: asked.payment_method_types ?? ['card', 'sepa_debit'],
      submitMessage: asked.custom_text?.submit?.message ?? null,
      adaptivePricing: asked.adaptive_pricing?.enabled ?? true,
    });
    return this.#state.checkouts.put({
      id,
      session,
      lineItems,
      intentMetadata: asked.payment_intent_data?.metadata ?? {},
      description: asked.payment_intent_data?.description ?? null,
      statementSuffix: asked.payment_intent_data?.statement_descriptor_suffix ?? null,
      challenge: null,
      settling: null,
    });
  }

  /** Ends an open checkout, asked by the shop or by the clock. */
  expire(record: CheckoutRecord, cause?: Cause): CheckoutRecord {
    const { session } = record;
    if (session.status !== 'open') {
      const message = `Only Checkout Sessions with a status in ["open"] can be expired. This Checkout Session has a status of "${session.status ?? ''}".`;
      throw new ApiError(400, message);
    }
    const intent = typeof session.payment_intent === 'string' ? this.#state.intents.get(session.payment_intent) : undefined;
    if (intent) {
      const canceled = this.#state.intents.put({ ...intent, status: 'canceled', canceled_at: this.#clock.now(), cancellation_reason: 'expired', next_action: null });
      this.#log.happened({ type: 'payment_intent.canceled', object: canceled }, cause);
    }
    const expired = this.#state.checkouts.put({ ...record, session: { ...session, status: 'expired', url: null }, challenge: null });
    this.#log.happened({ type: 'checkout.session.expired', object: expired.session }, cause);
    return expired;
  }

  /** Ends what is past its time. */
  expireDue(): void {
    for (const record of this.#state.checkouts.oldestFirst()) {
      if (record.session.status === 'open' && record.session.expires_at <= this.#clock.now()) this.expire(record);
    }
  }

  /** The payment behind a checkout, made when the buyer first tries to pay. */
  intentOf(record: CheckoutRecord): { record: CheckoutRecord; intent: Stripe.PaymentIntent } {
    const { session } = record;
    const present = typeof session.payment_intent === 'string' ? this.#state.intents.get(session.payment_intent) : undefined;
    if (present) return { record, intent: present };
    const id = newId('pi');
    const intent = this.#state.intents.put(
      newIntent({
        id,
        secret: `${id}_secret_${randomSigns(24)}`,
        created: this.#clock.now(),
        amount: session.amount_total ?? 0,
        currency: session.currency ?? '',
        description: record.description,
        metadata: record.intentMetadata,
        methodTypes: session.payment_method_types,
        statementSuffix: record.statementSuffix,
      }),
    );
    this.#log.happened({ type: 'payment_intent.created', object: intent });
    return { record: this.#state.checkouts.put({ ...record, session: { ...session, payment_intent: id } }), intent };
  }
}

function oneCurrency(asked: CreateCheckoutParameters): string {
  const currencies = new Set(asked.line_items.map((line) => line.price_data.currency));
  const [currency = ''] = currencies;
  if (currencies.size > 1) throw badParameter('line_items', 'All prices on a Checkout Session must have the same currency.', 'currency_mismatch');
  return currency;
}

function expiryOf(asked: CreateCheckoutParameters, created: number): number {
  const expiresAt = asked.expires_at ?? created + LONGEST_SECONDS;
  if (expiresAt < created + SHORTEST_SECONDS) {
    throw badParameter('expires_at', 'The `expires_at` timestamp must be at least 30 minutes from Checkout Session creation.');
  }
  if (expiresAt > created + LONGEST_SECONDS) {
    throw badParameter('expires_at', 'The `expires_at` timestamp must be less than 24 hours from Checkout Session creation.');
  }
  return expiresAt;
}
