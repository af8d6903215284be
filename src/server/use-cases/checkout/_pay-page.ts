/**
 * The page on which an order can be paid. Whatever the payment service answers, or fails to answer, an order never
 * stays stuck: what was refused for good is asked for anew under the next attempt's number, and what may have been
 * carried out is looked for before it is asked for again.
 */
import { isCurrency } from '#core/money/currency.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found } from '#server/errors.ts';
import { settleCheckout } from '#server/jobs/definitions/payments.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { Order } from '#server/models/index.ts';
import type { Checkout, PaymentFailure } from '#server/payments/payment-service.ts';
import { keptRequest, newRequest, seatPage } from './_order-request.ts';

export interface Buying {
  readonly series: { readonly slug: string; readonly title: string };
  readonly buyerAddress: string;
}

/** The kept attempt, and one anew. */
const ATTEMPTS_AT_ONCE = 2;
const MINUTE_MS = 60_000;
/** A pay page that ends sooner than this is closed and opened anew. */
const LEAST_LEFT_MS = 5 * MINUTE_MS;
const LOST = 'The payment service does not answer just now. Nothing was taken; try again in a minute.';

/**
 * The address to send the buyer to: the pay page, or the page of her seat when this order has been paid meanwhile.
 * @throws UPSTREAM when no page can be had; the order is kept and the next try goes on from there.
 */
export async function payPageOf(ctx: Context, order: Order, buying: Buying): Promise<string> {
  const standing = await standingPage(ctx, order, buying);
  if (standing !== null) return standing;
  let current = order.payUrl === null ? order : await takeNextAttempt(ctx, order, buying);
  let failure: PaymentFailure | undefined;
  for (let tries = 1; tries <= ATTEMPTS_AT_ONCE; tries += 1) {
    const answer = await ctx.services.payments.createCheckout(keptRequest(current));
    if (answer.ok) return keepPage(current, answer.value);
    failure = answer.failure;
    if (failure.kind === 'unreachable') {
      const lost = await ctx.services.payments.findCheckout(current.publicId, new Date(current.createdAt.getTime() - MINUTE_MS));
      if (!lost.ok) break;
      if (lost.value?.status === 'open') return keepPage(current, lost.value);
    }
    if (tries < ATTEMPTS_AT_ONCE) current = await takeNextAttempt(ctx, current, buying);
  }
  throw new AppError('UPSTREAM', { says: LOST, message: `order ${order.publicId}: ${failure?.kind ?? ''} ${failure?.message ?? ''}` });
}

/** The page that was opened before, unless nobody can pay on it any more. */
async function standingPage(ctx: Context, order: Order, { series }: Buying): Promise<string | null> {
  const { sessionId, payUrl, expiresAt } = order;
  if (payUrl === null || sessionId === null) return null;
  const answer = await ctx.services.payments.readCheckout(sessionId);
  // Without an answer the page is the best we know; it says by itself when it has ended.
  if (!answer.ok) return answer.failure.kind === 'not-found' ? null : payUrl;
  if (answer.value.status === 'open') {
    if (expiresAt.getTime() - ctx.clock.now().getTime() > LEAST_LEFT_MS) return payUrl;
    // Closed first, so that nobody can pay on two pages; what cannot be closed has been paid this moment.
    if ((await ctx.services.payments.expireCheckout(sessionId)).ok) return null;
  }
  if (answer.value.status === 'expired') return null;
  await enqueue(settleCheckout, { checkoutId: sessionId });
  return `${seatPage(series.slug)}?checkout=${encodeURIComponent(sessionId)}`;
}

/** The order with a new number and a new request, unless somebody else has just given it one. */
function takeNextAttempt(ctx: Context, { id, attempt }: Order, { series, buyerAddress }: Buying): Promise<Order> {
  return withTransaction(async () => {
    const order = found(await Order.findByPk(id, { lock: true }));
    const { amountMinor, currency } = order;
    if (order.attempt !== attempt || !isCurrency(currency)) return order;
    const request = newRequest({ orderId: order.publicId, attempt: attempt + 1, amountMinor, currency, series, buyerAddress }, ctx.clock.now());
    return order.update({ attempt: attempt + 1, checkoutParameters: request, expiresAt: new Date(request.expiresAt), sessionId: null, payUrl: null });
  });
}

async function keepPage({ id, attempt }: Order, { id: sessionId, url }: Checkout): Promise<string> {
  if (url === undefined) throw new AppError('UPSTREAM', { says: LOST, message: 'checkout without an address' });
  await Order.update({ sessionId, payUrl: url }, { where: { id, attempt } });
  return url;
}
