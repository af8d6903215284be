import Stripe from 'stripe';
import { verifySignature } from './event-signature.ts';
import type { Checkout, CheckoutRequest, PaymentAnswer, PaymentFailure, PaymentService, Refund, RefundRequest } from './payment-service.ts';
import { readEvent } from './read-event.ts';

/** Pinned: the shapes read below are those of this version. The webhook endpoint is registered with the same one. */
export const API_VERSION = '2026-10-28.endive';

const TIMEOUT_MS = 20_000;
const NETWORK_RETRIES = 2;
/** Tries after a 429, which the library leaves to its caller. */
const BUSY_RETRIES = 4;
const BUSY_FIRST_WAIT_MS = 400;
/** Longest time a checkout stays open: it was made no earlier than this before its end. */
const LONGEST_LIFE_MS = 24 * 3_600_000;
/** Of one search for a lost checkout: far more than a day of orders in progress needs. */
const MOST_SEARCHED = 2000;

export interface StripeSettings {
  readonly secretKey: string;
  readonly webhookSecrets: readonly string[];
  /** Another host than the service's own, for the stand-in: `http://127.0.0.1:4322`. */
  readonly url?: string | undefined;
  /** Waits between tries after a 429; given by tests. */
  readonly wait?: (milliseconds: number) => Promise<void>;
}

/** The payment service over its own library. */
export class StripePaymentService implements PaymentService {
  readonly #stripe: Stripe;
  readonly #webhookSecrets: readonly string[];
  readonly #wait: (milliseconds: number) => Promise<void>;

  constructor(settings: StripeSettings) {
    this.#stripe = new Stripe(settings.secretKey, {
      ...(settings.url === undefined ? {} : placeOf(settings.url)),
      apiVersion: API_VERSION,
      maxNetworkRetries: NETWORK_RETRIES,
      timeout: TIMEOUT_MS,
      telemetry: false,
    });
    this.#webhookSecrets = settings.webhookSecrets;
    this.#wait = settings.wait ?? ((milliseconds) => new Promise((resolve) => setTimeout(resolve, milliseconds)));
  }

  async createCheckout(request: CheckoutRequest): Promise<PaymentAnswer<Checkout>> {
    const idempotencyKey = `order:${request.orderId}:checkout:${request.attempt}`;
    const answer = await this.#ask(async () => checkoutOf(await this.#stripe.checkout.sessions.create(sessionParams(request), { idempotencyKey })));
    if (answer.ok || answer.failure.kind !== 'unreachable') return answer;
    // A failure is kept under the key and would be told again for a day, even where the checkout was made: so look for it.
    const made = await this.findCheckout(request.orderId, new Date(request.expiresAt.getTime() - LONGEST_LIFE_MS));
    const same = made.ok && made.value?.expiresAt.getTime() === request.expiresAt.getTime() ? made.value : undefined;
    return same === undefined ? answer : { ok: true, value: same };
  }

  readCheckout(checkoutId: string): Promise<PaymentAnswer<Checkout>> {
    return this.#ask(async () => checkoutOf(await this.#stripe.checkout.sessions.retrieve(checkoutId, { expand: ['payment_intent'] })));
  }

  findCheckout(orderId: string, since: Date): Promise<PaymentAnswer<Checkout | undefined>> {
    return this.#ask(async () => {
      const created = { gte: Math.floor(since.getTime() / 1000) };
      let seen = 0;
      for await (const session of this.#stripe.checkout.sessions.list({ created, limit: 100 })) {
        if (session.client_reference_id === orderId) return checkoutOf(session);
        seen += 1;
        if (seen >= MOST_SEARCHED) break;
      }
      return undefined;
    });
  }

  expireCheckout(checkoutId: string): Promise<PaymentAnswer<Checkout>> {
    return this.#ask(async () => checkoutOf(await this.#stripe.checkout.sessions.expire(checkoutId)));
  }

  async refund(request: RefundRequest): Promise<PaymentAnswer<Refund>> {
    const { refundId, paymentId, amountMinor } = request;
    const answer = await this.#ask(async () => {
      const refund = await this.#stripe.refunds.create(
        {
          payment_intent: paymentId,
          ...(amountMinor === undefined ? {} : { amount: amountMinor }),
          reason: 'requested_by_customer',
          metadata: { refund: refundId },
        },
        { idempotencyKey: `refund:${refundId}` },
      );
      return refundOf(refund);
    });
    if (answer.ok || answer.failure.kind !== 'not-possible' || answer.failure.code !== 'charge_already_refunded') return answer;
    const before = await this.#ask(async () => (await this.#stripe.refunds.list({ payment_intent: paymentId, limit: 100 })).data.map(refundOf));
    if (!before.ok) return before;
    const done = before.value.find((refund) => refund.refundId === refundId) ?? before.value[0];
    return done === undefined ? answer : { ok: true, value: done };
  }

  readRefund(id: string): Promise<PaymentAnswer<Refund>> {
    return this.#ask(async () => refundOf(await this.#stripe.refunds.retrieve(id)));
  }

  verifyEvent(rawBody: string, signatureHeader: string | null | undefined, now: Date): ReturnType<PaymentService['verifyEvent']> {
    const verdict = verifySignature(rawBody, signatureHeader, this.#webhookSecrets, now);
    if (!verdict.ok) return verdict;
    const event = readEvent(rawBody, API_VERSION);
    return event === undefined ? { ok: false, reason: 'unreadable' } : { ...verdict, event };
  }

  /** Calls the service, waits out its 429s, and turns what it throws into words of the port. */
  async #ask<T>(call: () => Promise<T>): Promise<PaymentAnswer<T>> {
    for (let busy = 0; ; busy += 1) {
      try {
        return { ok: true, value: await call() };
      } catch (error) {
        if (!(error instanceof Stripe.errors.StripeError)) throw error;
        if (error instanceof Stripe.errors.StripeRateLimitError && busy < BUSY_RETRIES) {
          await this.#wait(BUSY_FIRST_WAIT_MS * 2 ** busy * (0.5 + Math.random()));
          continue;
        }
        return { ok: false, failure: failureOf(error) };
      }
    }
  }
}

function placeOf(url: string): { host: string; port: number; protocol: 'http' | 'https' } {
  const { hostname, port, protocol } = new URL(url);
  const secure = protocol === 'https:';
  return { host: hostname, port: port === '' ? (secure ? 443 : 80) : Number(port), protocol: secure ? 'https' : 'http' };
}

function sessionParams(request: CheckoutRequest): Stripe.Checkout.SessionCreateParams {
  return {
    mode: 'payment',
    client_reference_id: request.orderId,
    metadata: { order: request.orderId },
    // The payment does not inherit the checkout's metadata.
    payment_intent_data: { metadata: { order: request.orderId } },
    line_items: request.lines.map((line) => ({
      quantity: line.quantity,
      price_data: {
        currency: request.currency.toLowerCase(),
        unit_amount: line.amountMinor,
        tax_behavior: 'inclusive',
        product_data: { name: line.name, ...(line.description === undefined ? {} : { description: line.description }) },
      },
    })),
    // The buyer pays in the currency of the price, so that what comes back can be compared with what was asked.
    adaptive_pricing: { enabled: false },
    expires_at: Math.floor(request.expiresAt.getTime() / 1000),
    success_url: request.successUrl,
    cancel_url: request.cancelUrl,
    ...(request.buyerAddress === undefined ? {} : { customer_email: request.buyerAddress }),
  };
}

function checkoutOf(session: Stripe.Checkout.Session): Checkout {
  return {
    id: session.id,
    orderId: session.client_reference_id ?? undefined,
    status: statusOf(session),
    payment: paymentOf(session),
    url: session.url ?? undefined,
    currency: (session.currency ?? '').toUpperCase(),
    subtotalMinor: session.amount_subtotal ?? 0,
    discountMinor: session.total_details?.amount_discount ?? 0,
    taxMinor: session.total_details?.amount_tax ?? 0,
    shippingMinor: session.total_details?.amount_shipping ?? 0,
    totalMinor: session.amount_total ?? 0,
    live: session.livemode,
    paymentId: idOf(session.payment_intent),
    createdAt: new Date(session.created * 1000),
    expiresAt: new Date(session.expires_at * 1000),
  };
}

function statusOf({ status }: Stripe.Checkout.Session): Checkout['status'] {
  if (status === 'complete') return 'complete';
  return status === 'expired' ? 'expired' : 'open';
}

function paymentOf({ status, payment_status: paid, payment_intent: intent }: Stripe.Checkout.Session): Checkout['payment'] {
  if (paid === 'paid') return 'paid';
  if (paid === 'no_payment_required') return 'nothing-to-pay';
  // A complete checkout says no more than "unpaid"; whether it still may be is the payment's own affair.
  const isOver = intent !== null && typeof intent === 'object' && (intent.status === 'requires_payment_method' || intent.status === 'canceled');
  return status === 'complete' && isOver ? 'refused' : 'unpaid';
}

function refundOf(refund: Stripe.Refund): Refund {
  const { status } = refund;
  return {
    id: refund.id,
    refundId: refund.metadata?.['refund'],
    paymentId: idOf(refund.payment_intent),
    // `requires_action` waits for somebody as `pending` does; a word we do not know yet must not read as money returned.
    status: status === 'succeeded' || status === 'failed' || status === 'canceled' ? status : 'pending',
    failureReason: refund.failure_reason,
    amountMinor: refund.amount,
    currency: refund.currency.toUpperCase(),
    createdAt: new Date(refund.created * 1000),
  };
}

function idOf(reference: string | { readonly id: string } | null): string | undefined {
  return typeof reference === 'string' ? reference : reference?.id;
}

function failureOf(error: InstanceType<typeof Stripe.errors.StripeError>): PaymentFailure {
  const { message } = error;
  const code = error.code ?? error.rawType ?? 'unknown';
  const { StripeIdempotencyError, StripeInvalidRequestError, StripeAuthenticationError, StripePermissionError, StripeCardError } = Stripe.errors;
  if (error instanceof StripeIdempotencyError) return { kind: 'reused-id', message };
  if (error instanceof StripeAuthenticationError || error instanceof StripePermissionError) return { kind: 'misconfigured', code, message };
  if (error instanceof StripeCardError) return { kind: 'not-possible', code, message };
  if (error instanceof StripeInvalidRequestError) {
    if (error.statusCode === 404 || code === 'resource_missing') return { kind: 'not-found', message };
    // A complaint about a parameter is ours to mend; without one, or about an amount, it is the state of the thing that stands in the way.
    const ours = error.param !== undefined && error.param !== 'amount' && code !== 'charge_already_refunded';
    return { kind: ours ? 'misconfigured' : 'not-possible', code, message };
  }
  return { kind: 'unreachable', message };
}
