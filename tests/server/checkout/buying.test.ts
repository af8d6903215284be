import { describe, expect, test } from 'vitest';
import { AppError } from '#server/errors.ts';
import { Enrolment, Job, LedgerEntry, Mail, Order, PaymentEvent, type Series, type User } from '#server/models/index.ts';
import type { Checkout } from '#server/payments/payment-service.ts';
import { FakePaymentService } from '#server/payments/payment-service.fake.ts';
import { beginCheckout } from '#server/use-cases/checkout/begin-checkout.ts';
import { lookAtOldOrders } from '#server/use-cases/checkout/look-at-old-orders.ts';
import { recordPaymentEvent } from '#server/use-cases/checkout/record-payment-event.ts';
import { settleCheckout } from '#server/use-cases/checkout/settle-checkout.ts';
import { settleEvent } from '#server/use-cases/checkout/settle-event.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildSeries, buildUser } from '../../support/factories.ts';

const AGREED = { startAtOnce: true, withdrawalGivenUp: true };

async function buyer(): Promise<{ student: User; series: Series; payments: FakePaymentService; begin: () => Promise<{ payUrl: string }>; checkout: () => Checkout }> {
  const [student, series, payments] = [await buildUser(), await buildSeries(), new FakePaymentService()];
  const ctx = await contextFor(student, { payments });
  return {
    student, series, payments,
    begin: () => beginCheckout(ctx, { series: series.slug, ...AGREED }),
    checkout: () => [...payments.checkouts.values()].at(-1) ?? expect.fail('no checkout'),
  };
}

const worker = (payments: FakePaymentService) => contextOf(null, { payments });

describe('beginning to buy', () => {
  test('an order is kept with the exact request before she is sent to the pay page', async () => {
    const { begin, series, student } = await buyer();
    const { payUrl } = await begin();
    const order = await Order.findOne({ where: { userId: student.id, seriesId: series.id } });
    expect(payUrl).toMatch(/^http/);
    expect(order).toMatchObject({ state: 'pending', amountMinor: 6_800, currency: 'EUR', payUrl });
    expect(order?.checkoutParameters).toMatchObject({ orderId: order?.publicId, attempt: 1, lines: [{ amountMinor: 6_800, quantity: 1 }] });
    expect(order?.terms).toMatchObject({ startAtOnce: true, withdrawalGivenUp: true });
  });

  test('two clicks at once make one order and one pay page', async () => {
    const { begin, payments } = await buyer();
    const pages = await Promise.all([begin(), begin(), begin()]);
    expect(new Set(pages.map(({ payUrl }) => payUrl)).size).toBe(1);
    expect(await Order.count()).toBe(1);
    expect(payments.checkouts.size).toBe(1);
  });

  test('when the answer of the payment service is lost, trying again asks for the same page with the same words', async () => {
    const { begin, payments } = await buyer();
    payments.failNext({ kind: 'unreachable', message: 'no answer' });
    await expect(begin()).rejects.toMatchObject({ code: 'UPSTREAM' });
    await begin();
    expect(payments.requests).toHaveLength(2);
    expect(payments.requests[1]).toEqual(payments.requests[0]);
    expect(await Order.count()).toBe(1);
  });

  test('who has a seat is told so and pays nothing', async () => {
    const { begin, series, student } = await buyer();
    await buildEnrolment({ userId: student.id, seriesId: series.id });
    await expect(begin()).rejects.toMatchObject({ code: 'CONFLICT' });
    expect(await Order.count()).toBe(0);
  });

  test('a draft series cannot be bought, nor can a visitor buy, nor one whose address is not confirmed', async () => {
    const { series, payments } = await buyer();
    const unsure = await contextFor(await buildUser({ emailConfirmedAt: null }), { payments });
    await expect(beginCheckout(unsure, { series: series.slug, ...AGREED })).rejects.toMatchObject({ code: 'VALIDATION' });
    await expect(beginCheckout(contextOf(null), { series: series.slug, ...AGREED })).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await series.update({ state: 'draft' });
    const ctx = await contextFor(await buildUser(), { payments });
    await expect(beginCheckout(ctx, { series: series.slug, ...AGREED })).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('after a change of price a new order asks the new price', async () => {
    const { begin, series, payments } = await buyer();
    await begin();
    await series.update({ priceMinor: 7_200 });
    await begin();
    expect(payments.requests.map(({ lines }) => lines[0]?.amountMinor)).toEqual([6_800, 7_200]);
  });

  test('an eleventh try within the hour has to wait', async () => {
    const { begin } = await buyer();
    for (let i = 0; i < 10; i += 1) await begin();
    await expect(begin()).rejects.toBeInstanceOf(AppError);
  });
});

describe('settling', () => {
  test('a paid checkout gives one seat, one receipt, one sale and its fee, however often it is looked at', async () => {
    const { begin, checkout, payments, student, series } = await buyer();
    await begin();
    payments.pay(checkout().id);
    const settled = await Promise.all([1, 2, 3, 4, 5].map(() => settleCheckout(worker(payments), checkout().id)));
    expect(settled.filter((word) => word === 'seat')).toHaveLength(1);
    expect(await Enrolment.findAll({ where: { userId: student.id, seriesId: series.id, state: 'active', source: 'bought' } })).toHaveLength(1);
    expect(await Mail.count({ where: { template: 'seat-bought' } })).toBe(1);
    expect((await LedgerEntry.findAll({ order: ['id'] })).map(({ kind, amountMinor }) => [kind, amountMinor])).toEqual([['sale', 6_800], ['fee', -544]]);
    expect(await Order.findOne()).toMatchObject({ state: 'paid', receiptNumber: 1 });
  });

  test('before anything is paid nothing happens; a slow way of paying waits until it is settled', async () => {
    const { begin, checkout, payments } = await buyer();
    await begin();
    expect(await settleCheckout(worker(payments), checkout().id)).toBe('nothing');
    payments.payLater(checkout().id);
    expect(await settleCheckout(worker(payments), checkout().id)).toBe('nothing');
    payments.settle(checkout().id, true);
    expect(await settleCheckout(worker(payments), checkout().id)).toBe('seat');
  });

  test('a checkout that ended releases its order, and a late "paid" still gives the seat', async () => {
    const { begin, checkout, payments } = await buyer();
    await begin();
    payments.letExpire(checkout().id);
    expect(await settleCheckout(worker(payments), checkout().id)).toBe('released');
    payments.pay(checkout().id);
    expect(await settleCheckout(worker(payments), checkout().id)).toBe('seat');
  });

  test('a second payment for a seat that is there is put aside for a person', async () => {
    const { begin, checkout, payments, series } = await buyer();
    await begin();
    const first = checkout().id;
    await series.update({ priceMinor: 7_200 });
    await begin();
    const second = checkout().id;
    payments.pay(first);
    payments.pay(second);
    expect(await settleCheckout(worker(payments), second)).toBe('seat');
    expect(await settleCheckout(worker(payments), first)).toBe('review');
    expect(await Enrolment.count()).toBe(1);
  });

  test('an amount or currency that does not agree gives no seat', async () => {
    const { begin, checkout, payments } = await buyer();
    await begin();
    payments.pay(checkout().id);
    await Order.update({ amountMinor: 9_900 }, { where: {} });
    expect(await settleCheckout(worker(payments), checkout().id)).toBe('review');
    expect(await Enrolment.count()).toBe(0);
    expect((await Order.findOne())?.reviewReason).toContain('6800');
  });

  test('twenty buyers at once get receipts 1 to 20 without a gap', async () => {
    const payments = new FakePaymentService();
    const series = await buildSeries();
    for (let i = 0; i < 20; i += 1) await beginCheckout(await contextFor(await buildUser(), { payments }), { series: series.slug, ...AGREED });
    for (const id of payments.checkouts.keys()) payments.pay(id);
    await Promise.all([...payments.checkouts.keys()].map((id) => settleCheckout(worker(payments), id)));
    const numbers = (await Order.findAll()).map(({ receiptNumber }) => receiptNumber ?? 0);
    expect(numbers.toSorted((a, b) => a - b)).toEqual(Array.from({ length: 20 }, (_, index) => index + 1));
  });
});

describe('news from the payment service', () => {
  const news = async (payments: FakePaymentService, type: string, id: string): Promise<string> => {
    const { body, signature } = payments.signedEvent(type, { object: 'checkout.session', id }, new Date('2026-12-01T10:00:00Z'));
    const receipt = await recordPaymentEvent(worker(payments), body, signature);
    expect(receipt.ok).toBe(true);
    return (JSON.parse(body) as { id: string }).id;
  };

  test('the same news ten times in parallel is kept once, with one job', async () => {
    const payments = new FakePaymentService();
    const { body, signature } = payments.signedEvent('checkout.session.completed', { object: 'checkout.session', id: 'cs_1' }, new Date('2026-12-01T10:00:00Z'));
    const receipts = await Promise.all(Array.from({ length: 10 }, () => recordPaymentEvent(worker(payments), body, signature)));
    expect(receipts.filter((receipt) => receipt.ok && receipt.isNew)).toHaveLength(1);
    expect(receipts.every(({ ok }) => ok)).toBe(true);
    expect(await PaymentEvent.count()).toBe(1);
    expect(await Job.count({ where: { type: 'settle-payment-event' } })).toBe(1);
  });

  test('forged news is refused and leaves nothing', async () => {
    const payments = new FakePaymentService();
    const { body } = payments.signedEvent('checkout.session.completed', { object: 'checkout.session', id: 'cs_1' }, new Date());
    for (const signature of [null, '', 't=1,v1=00', `t=${Math.floor(Date.parse('2026-12-01T10:00:00Z') / 1000)},v1=${'0'.repeat(64)}`]) {
      expect((await recordPaymentEvent(worker(payments), body, signature)).ok).toBe(false);
    }
    expect(await PaymentEvent.count()).toBe(0);
  });

  const ORDERS = [
    ['checkout.session.completed', 'checkout.session.expired', 'charge.refunded'],
    ['checkout.session.expired', 'charge.refunded', 'checkout.session.completed'],
    ['charge.refunded', 'checkout.session.completed', 'checkout.session.expired'],
    ['charge.refunded', 'checkout.session.expired', 'checkout.session.completed'],
  ];
  test.each(ORDERS.map((order) => [order.join(', '), order] as const))('in the order %s the rows end the same', async (_words, order) => {
    const { begin, checkout, payments } = await buyer();
    await begin();
    payments.pay(checkout().id);
    for (const type of order) {
      const eventId = await news(payments, type, checkout().id);
      await settleEvent(worker(payments), eventId);
      for (const job of await Job.findAll({ where: { type: 'settle-checkout', state: 'ready' } })) {
        await settleCheckout(worker(payments), (job.payload as { checkoutId: string }).checkoutId);
      }
    }
    expect(await Enrolment.count({ where: { state: 'active' } })).toBe(1);
    expect(await Order.findOne()).toMatchObject({ state: 'paid', receiptNumber: 1 });
    expect(await LedgerEntry.count()).toBe(2);
    expect(await PaymentEvent.count({ where: { handledAt: null } })).toBe(0);
  });

  test('when no news ever comes, the round finds the paid order after ten minutes', async () => {
    const { begin, checkout, payments } = await buyer();
    await begin();
    payments.pay(checkout().id);
    await Order.update({ createdAt: new Date('2026-12-01T09:40:00Z') }, { where: {}, silent: true });
    await lookAtOldOrders(worker(payments));
    await lookAtOldOrders(worker(payments));
    const jobs = await Job.findAll({ where: { type: 'settle-checkout' } });
    expect(jobs.map(({ payload }) => payload)).toEqual([{ checkoutId: checkout().id }]);
  });
});
