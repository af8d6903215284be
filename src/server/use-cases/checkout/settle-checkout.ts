import { settlementOf } from '#core/checkout/settle.ts';
import { audit } from '#server/audit.ts';
import { config } from '#server/config.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found } from '#server/errors.ts';
import { postLetter, type LetterTo } from '#server/mail/outbox.ts';
import { Order, Series, User } from '#server/models/index.ts';
import { putUpLetter } from '#server/notices/put-up.ts';
import type { Checkout } from '#server/payments/payment-service.ts';
import { giveSeat } from './_give-seat.ts';

export type Settled = 'seat' | 'released' | 'refused' | 'review' | 'nothing';

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
  const { state, publicId, amountMinor, currency, sessionId } = order;
  const live = !config().payments.key.startsWith('sk_test_');
  const settlement = settlementOf({ state, orderId: publicId, checkoutId: sessionId, amountMinor, currency, live }, checkout);
  switch (settlement.act) {
    case 'none':
      return 'nothing';
    case 'release':
      await order.update({ state: 'expired' });
      return 'released';
    case 'refuse':
      await order.update({ state: 'refused', sessionId: checkout.id });
      await sayRefused(series, order);
      return 'refused';
    case 'review':
      return putAside(ctx, order, checkout, settlement.reason);
    case 'paid-twice':
      return notePaidTwice(ctx, order, checkout);
    case 'seat':
      return (await giveSeat(ctx, series, order, { checkoutId: checkout.id, paymentId: checkout.paymentId }))
        ? 'seat'
        : putAside(ctx, order, checkout, 'Paid a second time for a seat that was there already.');
  }
}

async function putAside(ctx: Context, order: Order, { id, paymentId }: Checkout, reason: string): Promise<Settled> {
  await order.update({ state: 'review', reviewReason: reason, sessionId: id, paymentIntentId: paymentId ?? null });
  await audit(ctx, 'review-order', { kind: 'order', id: order.publicId }, { reason });
  return 'review';
}

/** One order paid on two of its pages. The seat stands; what came second is written down once, for a person to give back. */
async function notePaidTwice(ctx: Context, order: Order, { id, paymentId }: Checkout): Promise<Settled> {
  if (order.reviewReason === null) {
    await order.update({ reviewReason: `Paid twice, the second time by ${id}.` });
    await audit(ctx, 'review-order', { kind: 'order', id: order.publicId }, { reason: 'paid twice', checkout: id, payment: paymentId ?? null });
  }
  return 'review';
}

async function sayRefused(series: Series, order: Order): Promise<void> {
  const buyer = found(await User.findByPk(order.userId));
  const letter: LetterTo<'seat-refused'> = {
    template: 'seat-refused',
    dedupeKey: `refused:${order.publicId}`,
    to: { userId: buyer.id, name: buyer.name, address: buyer.email },
    data: { seriesTitle: series.title, seriesSlug: series.slug },
  };
  await postLetter(letter);
  await putUpLetter(letter, { kind: 'seat', seriesId: series.id });
}
