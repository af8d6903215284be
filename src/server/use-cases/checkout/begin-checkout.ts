import { isCurrency } from '#core/money/currency.ts';
import { TERMS_WORDS_VERSION, type CheckoutInput, type OrderTerms } from '#contracts/checkout.ts';
import { config } from '#server/config.ts';
import type { Actor, Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { Enrolment, Order, Series, User } from '#server/models/index.ts';
import { checkoutExpiry, type CheckoutRequest, type PaymentFailure } from '#server/payments/payment-service.ts';
import { mayBuy } from '#server/policies/person.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';

/** A pay page that ends sooner than this is not offered again. */
const LEAST_LEFT_MS = 5 * 60_000;

/**
 * Begins to buy a seat and returns the address of the page to pay on. Asked again before that page ends, it gives the
 * same page. The order and the exact request are kept before the payment service hears of them, so that an answer
 * that was lost can be asked for again.
 * @throws CONFLICT when she has a seat; FORBIDDEN when her address is not confirmed; UPSTREAM when the service does not answer.
 */
export async function beginCheckout(ctx: Context, input: CheckoutInput): Promise<{ payUrl: string }> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  if (!mayBuy(ctx.actor)) throw new AppError('VALIDATION', { says: 'Confirm your address first: the receipt goes there. The link is in your mail.' });
  await countUse(RATE_RULES.checkout, ctx.actor.publicId);
  const series = found(await Series.findOne({ where: { slug: input.series, state: 'published' } }));
  const order = await withTransaction(() => takeOrder(ctx, ctx.actor, series, input));
  if (order.payUrl !== null) return { payUrl: order.payUrl };
  const answer = await ctx.services.payments.createCheckout(requestOf(order));
  if (!answer.ok) throw refusal(answer.failure);
  const payUrl = answer.value.url;
  if (payUrl === undefined) throw new AppError('UPSTREAM', { message: 'checkout without an address' });
  await order.update({ sessionId: answer.value.id, payUrl });
  return { payUrl };
}

/** The buyer's open order, or a new one. Her own row is the lock: two clicks make one order. */
async function takeOrder(ctx: Context, actor: Actor | null, series: Series, input: CheckoutInput): Promise<Order> {
  authorize(actor !== null, 'UNAUTHENTICATED');
  await User.findByPk(actor.userId, { lock: true });
  const seat = await Enrolment.findOne({ where: { userId: actor.userId, seriesId: series.id, state: 'active' } });
  if (seat !== null) throw new AppError('CONFLICT', { says: 'You have a seat in this series already. It is on your loom.' });
  const { priceMinor, currency } = series;
  if (priceMinor === null || !isCurrency(currency)) throw new AppError('CONFLICT', { says: 'This series has no price yet, so no seat can be taken.' });
  const open = await Order.findOne({ where: { userId: actor.userId, seriesId: series.id, state: 'pending' }, order: [['id', 'DESC']] });
  const now = ctx.clock.now();
  if (open !== null && open.amountMinor === priceMinor && open.currency === currency && open.expiresAt.getTime() - now.getTime() > LEAST_LEFT_MS) return open;
  const terms: OrderTerms = { wordsVersion: TERMS_WORDS_VERSION, startAtOnce: input.startAtOnce, withdrawalGivenUp: input.withdrawalGivenUp, agreedAt: now.toISOString() };
  const publicId = newPublicId();
  const expiresAt = checkoutExpiry(now);
  const pages = `${config().publicUrl}/series/${series.slug}`;
  const request: CheckoutRequest = {
    orderId: publicId,
    attempt: 1,
    currency,
    lines: [{ name: series.title, description: 'A seat in the series', amountMinor: priceMinor, quantity: 1 }],
    buyerAddress: actor.email,
    successUrl: `${pages}/seat?checkout={CHECKOUT_SESSION_ID}`,
    cancelUrl: `${pages}?paying=stopped`,
    expiresAt,
  };
  return Order.create({ publicId, userId: actor.userId, seriesId: series.id, amountMinor: priceMinor, currency, terms, expiresAt, checkoutParameters: { ...request, expiresAt: expiresAt.toISOString() } });
}

/** The request exactly as it was kept. */
function requestOf(order: Order): CheckoutRequest {
  const kept = order.checkoutParameters as unknown as Omit<CheckoutRequest, 'expiresAt'> & { expiresAt: string };
  return { ...kept, expiresAt: new Date(kept.expiresAt) };
}

function refusal(failure: PaymentFailure): AppError {
  const lost = 'The payment service does not answer just now. Nothing was taken; try again in a minute.';
  return failure.kind === 'unreachable'
    ? new AppError('UPSTREAM', { says: lost, message: failure.message })
    : new AppError('BUG', { message: `checkout refused: ${failure.kind} ${failure.message}` });
}
