import { describe, expect, test } from 'vitest';
import { AuditEntry, Enrolment, LedgerEntry, Mail, Order } from '#server/models/index.ts';
import { FakePaymentService } from '#server/payments/payment-service.fake.ts';
import { beginCheckout } from '#server/use-cases/checkout/begin-checkout.ts';
import { settleCheckout } from '#server/use-cases/checkout/settle-checkout.ts';
import { AGREED, buyer, worker } from '../../support/buyer.ts';
import { contextFor } from '../../support/context.ts';
import { buildSeries, buildUser } from '../../support/factories.ts';

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

  test('when the bank says no after a while, the order is over, she is told once, and may try again', async () => {
    const { begin, checkout, payments } = await buyer();
    await begin();
    payments.payLater(checkout().id);
    payments.settle(checkout().id, false);
    expect(await settleCheckout(worker(payments), checkout().id)).toBe('refused');
    expect(await settleCheckout(worker(payments), checkout().id)).toBe('nothing');
    expect(await Mail.findAll()).toMatchObject([{ template: 'seat-refused' }]);
    expect([await Enrolment.count(), await LedgerEntry.count()]).toEqual([0, 0]);
    await begin();
    expect((await Order.findAll({ order: ['id'] })).map(({ state }) => state)).toEqual(['refused', 'pending']);
  });

  test('one order paid on two of its pages keeps its seat, and the second payment is written down once', async () => {
    const { begin, checkout, payments } = await buyer();
    await begin();
    const first = checkout().id;
    payments.letExpire(first);
    await begin();
    const second = checkout().id;
    payments.pay(second);
    payments.pay(first);
    expect(await settleCheckout(worker(payments), second)).toBe('seat');
    expect(await settleCheckout(worker(payments), first)).toBe('review');
    expect(await settleCheckout(worker(payments), first)).toBe('review');
    expect(await Order.findAll()).toMatchObject([{ state: 'paid', sessionId: second, reviewReason: `Paid twice, the second time by ${first}.` }]);
    expect(await AuditEntry.count({ where: { action: 'review-order' } })).toBe(1);
    expect(await Enrolment.count({ where: { state: 'active' } })).toBe(1);
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
    for (let i = 0; i < 20; i += 1) await beginCheckout(await contextFor(await buildUser(), { payments }), { series: series.slug, ...AGREED, loom: null });
    for (const id of payments.checkouts.keys()) payments.pay(id);
    await Promise.all([...payments.checkouts.keys()].map((id) => settleCheckout(worker(payments), id)));
    const numbers = (await Order.findAll()).map(({ receiptNumber }) => receiptNumber ?? 0);
    expect(numbers.toSorted((a, b) => a - b)).toEqual(Array.from({ length: 20 }, (_, index) => index + 1));
  });
});
