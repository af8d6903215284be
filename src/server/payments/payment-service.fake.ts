import { createHmac } from 'node:crypto';
import { verifySignature } from './event-signature.ts';
import type { Checkout, CheckoutRequest, PaymentAnswer, PaymentFailure, PaymentService, Refund, RefundRequest } from './payment-service.ts';
import { readEvent } from './read-event.ts';

const FAKE_VERSION = 'fake';

/**
 * A payment service in memory, for tests of what stands around it. Buyers are played by `pay`, `payLater`, `settle`
 * and `letExpire`; failures wait in a queue.
 */
export class FakePaymentService implements PaymentService {
  static readonly webhookSecret = 'whsec_fake';
  readonly checkouts = new Map<string, Checkout>();
  readonly refunds = new Map<string, Refund>();
  readonly requests: CheckoutRequest[] = [];
  readonly #byKey = new Map<string, { readonly request: string; readonly id: string }>();
  readonly #failures: PaymentFailure[] = [];
  #count = 0;

  /** What the next calls fail with, in this order, before anything is done. */
  failNext(...failures: readonly PaymentFailure[]): void {
    this.#failures.push(...failures);
  }

  pay(checkoutId: string): Checkout {
    return this.#change(checkoutId, { status: 'complete', payment: 'paid', url: undefined, paymentId: this.#newId('pi') });
  }

  /** Completes the checkout by a slow way of paying; `settle` says how it ends. */
  payLater(checkoutId: string): Checkout {
    return this.#change(checkoutId, { status: 'complete', payment: 'unpaid', url: undefined, paymentId: this.#newId('pi') });
  }

  settle(checkoutId: string, paid: boolean): Checkout {
    return this.#change(checkoutId, { payment: paid ? 'paid' : 'refused' });
  }

  letExpire(checkoutId: string): Checkout {
    return this.#change(checkoutId, { status: 'expired', url: undefined });
  }

  /** The bank sends the money back to us. */
  failRefund(id: string): void {
    const refund = this.refunds.get(id);
    if (refund) this.refunds.set(id, { ...refund, status: 'failed', failureReason: 'lost_or_stolen_card' });
  }

  /** An event as it would arrive, signed at `now`. */
  signedEvent(type: string, object: { readonly object: string; readonly id: string }, now: Date): { body: string; signature: string } {
    const created = Math.floor(now.getTime() / 1000);
    const body = JSON.stringify({ object: 'event', id: this.#newId('evt'), type, created, livemode: false, api_version: FAKE_VERSION, data: { object } });
    const proof = createHmac('sha256', FakePaymentService.webhookSecret).update(`${created}.${body}`).digest('hex');
    return { body, signature: `t=${created},v1=${proof}` };
  }

  async createCheckout(request: CheckoutRequest): Promise<PaymentAnswer<Checkout>> {
    this.requests.push(request);
    const failure = this.#failures.shift();
    if (failure) return { ok: false, failure };
    const key = `${request.orderId}:${request.attempt}`;
    const asked = JSON.stringify(request);
    const before = this.#byKey.get(key);
    if (before) {
      return before.request === asked ? this.readCheckout(before.id) : { ok: false, failure: { kind: 'reused-id', message: 'Another request came under this id' } };
    }
    const checkout = this.#newCheckout(request);
    this.#byKey.set(key, { request: asked, id: checkout.id });
    this.checkouts.set(checkout.id, checkout);
    return { ok: true, value: checkout };
  }

  async readCheckout(checkoutId: string): Promise<PaymentAnswer<Checkout>> {
    return this.#find(this.checkouts, checkoutId);
  }

  async findCheckout(orderId: string, since: Date): Promise<PaymentAnswer<Checkout | undefined>> {
    const failure = this.#failures.shift();
    if (failure) return { ok: false, failure };
    return { ok: true, value: [...this.checkouts.values()].findLast((checkout) => checkout.orderId === orderId && checkout.createdAt >= since) };
  }

  async expireCheckout(checkoutId: string): Promise<PaymentAnswer<Checkout>> {
    const found = this.#find(this.checkouts, checkoutId);
    if (!found.ok) return found;
    if (found.value.status !== 'open') return { ok: false, failure: { kind: 'not-possible', code: 'not_open', message: 'This checkout is not open' } };
    return { ok: true, value: this.letExpire(checkoutId) };
  }

  async refund({ refundId, paymentId, amountMinor }: RefundRequest): Promise<PaymentAnswer<Refund>> {
    const failure = this.#failures.shift();
    if (failure) return { ok: false, failure };
    const all = [...this.refunds.values()].filter((refund) => refund.paymentId === paymentId);
    const again = all.find((refund) => refund.refundId === refundId);
    if (again) return { ok: true, value: again };
    const paid = [...this.checkouts.values()].find((checkout) => checkout.paymentId === paymentId && checkout.payment === 'paid');
    if (!paid) return { ok: false, failure: { kind: 'not-found', message: 'No such payment' } };
    const left = paid.totalMinor - all.filter(({ status }) => status !== 'failed').reduce((sum, refund) => sum + refund.amountMinor, 0);
    const last = all.at(-1);
    if (left === 0 && last) return { ok: true, value: last };
    const amount = amountMinor ?? left;
    if (amount > left) return { ok: false, failure: { kind: 'not-possible', code: 'amount_too_large', message: 'More than was paid' } };
    const refund: Refund = {
      id: this.#newId('re'),
      refundId,
      paymentId,
      status: 'succeeded',
      failureReason: undefined,
      amountMinor: amount,
      currency: paid.currency,
      createdAt: new Date(),
    };
    this.refunds.set(refund.id, refund);
    return { ok: true, value: refund };
  }

  async readRefund(id: string): Promise<PaymentAnswer<Refund>> {
    return this.#find(this.refunds, id);
  }

  verifyEvent(rawBody: string, signatureHeader: string | null | undefined, now: Date): ReturnType<PaymentService['verifyEvent']> {
    const verdict = verifySignature(rawBody, signatureHeader, [FakePaymentService.webhookSecret], now);
    if (!verdict.ok) return verdict;
    const event = readEvent(rawBody, FAKE_VERSION);
    return event === undefined ? { ok: false, reason: 'unreadable' } : { ...verdict, event };
  }

  #newCheckout(request: CheckoutRequest): Checkout {
    const id = this.#newId('cs_test');
    const totalMinor = request.lines.reduce((sum, line) => sum + line.amountMinor * line.quantity, 0);
    return {
      id,
      orderId: request.orderId,
      status: 'open',
      payment: totalMinor === 0 ? 'nothing-to-pay' : 'unpaid',
      url: `http://127.0.0.1/pay/${id}`,
      currency: request.currency,
      subtotalMinor: totalMinor,
      discountMinor: 0,
      taxMinor: 0,
      shippingMinor: 0,
      totalMinor,
      live: false,
      paymentId: undefined,
      createdAt: new Date(),
      expiresAt: request.expiresAt,
    };
  }

  #find<T>(things: ReadonlyMap<string, T>, id: string): PaymentAnswer<T> {
    const failure = this.#failures.shift();
    if (failure) return { ok: false, failure };
    const thing = things.get(id);
    return thing === undefined ? { ok: false, failure: { kind: 'not-found', message: 'No such thing' } } : { ok: true, value: thing };
  }

  #change(checkoutId: string, change: Partial<Checkout>): Checkout {
    const checkout = this.checkouts.get(checkoutId);
    if (!checkout) throw new TypeError('There is no such checkout');
    const changed = { ...checkout, ...change };
    this.checkouts.set(checkoutId, changed);
    return changed;
  }

  #newId(prefix: string): string {
    this.#count += 1;
    return `${prefix}_${String(this.#count).padStart(6, '0')}`;
  }
}
