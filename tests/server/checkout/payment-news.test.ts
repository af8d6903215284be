import { describe, expect, test } from 'vitest';
import { Enrolment, Job, LedgerEntry, Order, PaymentEvent } from '#server/models/index.ts';
import { FakePaymentService } from '#server/payments/payment-service.fake.ts';
import { lookAtOldOrders } from '#server/use-cases/checkout/look-at-old-orders.ts';
import { recordPaymentEvent } from '#server/use-cases/checkout/record-payment-event.ts';
import { settleCheckout } from '#server/use-cases/checkout/settle-checkout.ts';
import { settleEvent } from '#server/use-cases/checkout/settle-event.ts';
import { buyer, worker } from '../../support/buyer.ts';

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
