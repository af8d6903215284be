import { QueryTypes } from 'sequelize';
import { settlementOf } from '#core/checkout/settle.ts';
import { feeOf, type BasisPoints } from '#core/money/share.ts';
import { audit } from '#server/audit.ts';
import { config } from '#server/config.ts';
import type { Context } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found } from '#server/errors.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { Enrolment, LedgerEntry, Order, Series, User } from '#server/models/index.ts';
import type { Checkout } from '#server/payments/payment-service.ts';

/** What the house keeps of a sale. */
const FEE: BasisPoints = 800;

export type Settled = 'seat' | 'released' | 'review' | 'nothing';

/**
 * Reads a checkout back from the payment service and does what its state means for our order. The one way to a bought
 * seat; doing it again, or twice at once, changes nothing more.
 * @throws UPSTREAM when the service does not answer, so that the job is tried again.
 */
export async function settleCheckout(ctx: Context, checkoutId: string): Promise<Settled> {
  const answer = await ctx.services.payments.readCheckout(checkoutId);
  if (!answer.ok) {
    if (answer.failure.kind === 'not-found') return 'nothing';
    throw new AppError('UPSTREAM', { message: answer.failure.message });
  }
  const checkout = answer.value;
  if (checkout.orderId === undefined) return 'nothing';
  const known = await Order.findOne({ where: { publicId: checkout.orderId } });
  if (known === null) return 'nothing';
  return withTransaction(async () => settleLocked(ctx, known, checkout));
}

async function settleLocked(ctx: Context, known: Order, checkout: Checkout): Promise<Settled> {
  const series = found(await Series.findByPk(known.seriesId, { lock: true }));
  const order = found(await Order.findByPk(known.id, { lock: true }));
  const live = !config().payments.key.startsWith('sk_test_');
  const settlement = settlementOf({ state: order.state, orderId: order.publicId, amountMinor: order.amountMinor, currency: order.currency, live }, checkout);
  switch (settlement.act) {
    case 'none':
      return 'nothing';
    case 'release':
      await order.update({ state: 'expired' });
      return 'released';
    case 'review':
      await putAside(ctx, order, checkout, settlement.reason);
      return 'review';
    case 'seat':
      return giveSeat(ctx, series, order, checkout);
  }
}

async function putAside(ctx: Context, order: Order, checkout: Checkout, reason: string): Promise<void> {
  await order.update({ state: 'review', reviewReason: reason, sessionId: checkout.id, paymentIntentId: checkout.paymentId ?? null });
  await audit(ctx, 'review-order', { kind: 'order', id: order.publicId }, { reason });
}

async function giveSeat(ctx: Context, series: Series, order: Order, checkout: Checkout): Promise<Settled> {
  const now = ctx.clock.now();
  const held = await Enrolment.findOne({ where: { userId: order.userId, seriesId: series.id }, lock: true });
  if (held?.state === 'active') {
    await putAside(ctx, order, checkout, 'Paid a second time for a seat that was there already.');
    return 'review';
  }
  const receiptNumber = await nextReceiptNumber();
  await order.update({ state: 'paid', paidAt: now, sessionId: checkout.id, paymentIntentId: checkout.paymentId ?? null, receiptNumber });
  if (held === null) await Enrolment.create({ userId: order.userId, seriesId: series.id, orderId: order.id, source: 'bought', startedAt: now });
  else await held.update({ state: 'active', orderId: order.id, source: 'bought', startedAt: now });
  const entry = { orderId: order.id, workroomId: series.workroomId, currency: order.currency, externalId: checkout.id };
  await LedgerEntry.create({ ...entry, kind: 'sale', amountMinor: order.amountMinor });
  await LedgerEntry.create({ ...entry, kind: 'fee', amountMinor: -feeOf(order.amountMinor, FEE) });
  await audit(ctx, 'give-seat', { kind: 'order', id: order.publicId }, { series: series.publicId });
  await sendReceipt(series, order, receiptNumber, now);
  return 'seat';
}

/** Without gaps: the counter's row is locked until this transaction ends, and goes back with it. */
async function nextReceiptNumber(): Promise<number> {
  await sequelize.query('UPDATE receipt_counters SET last_number = last_number + 1 WHERE id = 1', { type: QueryTypes.UPDATE });
  const [row] = await sequelize.query<{ number: number }>('SELECT last_number AS number FROM receipt_counters WHERE id = 1', { type: QueryTypes.SELECT });
  return found(row).number;
}

async function sendReceipt(series: Series, order: Order, receiptNumber: number, paidAt: Date): Promise<void> {
  const buyer = found(await User.findByPk(order.userId));
  await postLetter({
    template: 'seat-bought',
    dedupeKey: `receipt:${order.publicId}`,
    to: { userId: buyer.id, name: buyer.name, address: buyer.email },
    data: {
      seriesTitle: series.title,
      seriesSlug: series.slug,
      receiptNumber,
      amountMinor: order.amountMinor,
      currency: order.currency,
      paidAt: paidAt.toISOString(),
      timeZone: buyer.timeZone,
      withdrawalGivenUp: order.terms.startAtOnce && order.terms.withdrawalGivenUp,
    },
  });
}
