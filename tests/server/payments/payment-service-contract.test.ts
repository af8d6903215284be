/** The fake keeps the same promises as the real adapter, or tests that use it prove nothing. */
import { afterEach, describe, expect, test } from 'vitest';
import { FakePaymentService } from '#server/payments/payment-service.fake.ts';
import type { PaymentService } from '#server/payments/payment-service.ts';
import { buyerDoes, CARD, checkoutRequest, startTrial, valueOf, type Trial } from '../../support/stand-ins.ts';

interface Played {
  readonly payments: PaymentService;
  pay(checkoutId: string): Promise<void>;
  payLater(checkoutId: string): Promise<void>;
  /** A slow way of paying that comes to nothing. */
  payInVain(checkoutId: string): Promise<void>;
}

const trials: Trial[] = [];

afterEach(async () => {
  for (const trial of trials.splice(0)) await trial.close();
});

async function real(): Promise<Played> {
  const trial = await startTrial({ settleSeconds: 3600 });
  trials.push(trial);
  const page = (id: string) => `${trial.standIns.url}/pay/${id}`;
  return {
    payments: trial.payments,
    async pay(id) {
      await buyerDoes(page(id), CARD);
    },
    async payLater(id) {
      await buyerDoes(page(id), { do: 'debit', email: 'amara@weavers.example', account: 'DE89370400440532013000' });
    },
    async payInVain(id) {
      await buyerDoes(page(id), { do: 'debit', email: 'amara@weavers.example', account: 'DE62370400440532013001' });
      trial.standIns.clock.advance(3601);
    },
  };
}

async function fake(): Promise<Played> {
  const payments = new FakePaymentService();
  return {
    payments,
    async pay(id) {
      payments.pay(id);
    },
    async payLater(id) {
      payments.payLater(id);
    },
    async payInVain(id) {
      payments.payLater(id);
      payments.settle(id, false);
    },
  };
}

describe.each([
  ['the adapter, at the stand-in', real],
  ['the fake', fake],
])('%s', (_name, begin) => {
  test('opens a checkout once for one order and attempt', async () => {
    const { payments } = await begin();
    const request = checkoutRequest();
    const first = valueOf(await payments.createCheckout(request));
    expect(first).toMatchObject({ orderId: request.orderId, status: 'open', payment: 'unpaid', totalMinor: 6800, subtotalMinor: 6800, currency: 'EUR', live: false, paymentId: undefined, expiresAt: request.expiresAt });
    expect(first.url).toMatch(/^http/);
    expect(valueOf(await payments.createCheckout(request))).toEqual(first);
    expect(await payments.createCheckout({ ...request, cancelUrl: 'http://127.0.0.1/elsewhere' })).toMatchObject({ ok: false, failure: { kind: 'reused-id' } });
    expect(valueOf(await payments.createCheckout({ ...request, attempt: 2 })).id).not.toBe(first.id);
  });

  test('finds a checkout by its id and by its order, and says when there is none', async () => {
    const { payments } = await begin();
    const request = checkoutRequest();
    const opened = valueOf(await payments.createCheckout(request));
    const since = new Date(Date.now() - 60_000);
    expect(valueOf(await payments.readCheckout(opened.id))).toEqual(opened);
    expect(valueOf(await payments.findCheckout(request.orderId, since))).toEqual(opened);
    expect(valueOf(await payments.findCheckout('nobody', since))).toBeUndefined();
    expect(await payments.readCheckout('cs_test_none')).toMatchObject({ ok: false, failure: { kind: 'not-found' } });
  });

  test('shows a checkout that was paid, that is being paid, and that was closed', async () => {
    const { payments, pay, payLater, payInVain } = await begin();
    const [paid, later, inVain, closed] = [
      valueOf(await payments.createCheckout(checkoutRequest())),
      valueOf(await payments.createCheckout(checkoutRequest())),
      valueOf(await payments.createCheckout(checkoutRequest())),
      valueOf(await payments.createCheckout(checkoutRequest())),
    ];
    await pay(paid.id);
    await payLater(later.id);
    expect(valueOf(await payments.expireCheckout(closed.id))).toMatchObject({ status: 'expired', payment: 'unpaid', url: undefined });
    expect(valueOf(await payments.readCheckout(paid.id))).toMatchObject({ status: 'complete', payment: 'paid', url: undefined, paymentId: expect.stringMatching(/^pi_/) as string });
    expect(valueOf(await payments.readCheckout(later.id))).toMatchObject({ status: 'complete', payment: 'unpaid', paymentId: expect.stringMatching(/^pi_/) as string });
    expect(await payments.expireCheckout(paid.id)).toMatchObject({ ok: false, failure: { kind: 'not-possible' } });
    expect(await payments.expireCheckout(closed.id)).toMatchObject({ ok: false, failure: { kind: 'not-possible' } });
    await payInVain(inVain.id);
    expect(valueOf(await payments.readCheckout(inVain.id))).toMatchObject({ status: 'complete', payment: 'refused' });
  });

  test('gives money back once for one refund, in parts, and never too much', async () => {
    const { payments, pay } = await begin();
    const { id } = valueOf(await payments.createCheckout(checkoutRequest()));
    await pay(id);
    const paymentId = valueOf(await payments.readCheckout(id)).paymentId ?? '';
    const part = valueOf(await payments.refund({ refundId: 'a', paymentId, amountMinor: 1000 }));
    expect(part).toMatchObject({ refundId: 'a', paymentId, status: 'succeeded', amountMinor: 1000, currency: 'EUR', failureReason: undefined });
    expect(valueOf(await payments.refund({ refundId: 'a', paymentId, amountMinor: 1000 }))).toEqual(part);
    expect(await payments.refund({ refundId: 'b', paymentId, amountMinor: 5801 })).toMatchObject({ ok: false, failure: { kind: 'not-possible' } });
    expect(valueOf(await payments.refund({ refundId: 'c', paymentId })).amountMinor).toBe(5800);
    expect(valueOf(await payments.refund({ refundId: 'd', paymentId })).refundId).toBe('c');
    expect(valueOf(await payments.readRefund(part.id))).toEqual(part);
    expect(await payments.readRefund('re_none')).toMatchObject({ ok: false, failure: { kind: 'not-found' } });
    expect(await payments.refund({ refundId: 'e', paymentId: 'pi_none' })).toMatchObject({ ok: false, failure: { kind: 'not-found' } });
  });
});

test('the fake signs news that it believes, and fails when told to', async () => {
  const payments = new FakePaymentService();
  const now = new Date();
  const { body, signature } = payments.signedEvent('checkout.session.completed', { object: 'checkout.session', id: 'cs_test_1' }, now);
  expect(payments.verifyEvent(body, signature, now)).toMatchObject({ ok: true, event: { about: { id: 'cs_test_1' } } });
  expect(payments.verifyEvent(`${body} `, signature, now)).toEqual({ ok: false, reason: 'wrong-signature' });
  payments.failNext({ kind: 'unreachable', message: 'no line' });
  expect(await payments.createCheckout(checkoutRequest())).toMatchObject({ ok: false, failure: { kind: 'unreachable' } });
  expect(await payments.createCheckout(checkoutRequest())).toMatchObject({ ok: true });
});
