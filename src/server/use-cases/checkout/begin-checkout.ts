import { isCurrency, type Currency } from '#core/money/currency.ts';
import type { MyPiece } from '#core/craft/fit.ts';
import { tryOnLoom } from '#core/trial/try-on-loom.ts';
import { TERMS_WORDS_VERSION, type CheckoutInput, type OrderTerms } from '#contracts/checkout.ts';
import type { Actor, Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found, signedIn } from '#server/errors.ts';
import { Enrolment, Order, PatternPiece, Series, User } from '#server/models/index.ts';
import { mayBuy } from '#server/policies/person.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { giveSeat } from './_give-seat.ts';
import { newRequest, seatPage } from './_order-request.ts';
import { payPageOf } from './_pay-page.ts';

interface Wish {
  readonly actor: Actor;
  readonly terms: OrderTerms;
  /** Her own piece, begun on the loom she tried. */
  readonly loom: MyPiece | null;
}

/**
 * Begins to buy a seat and returns where to go: the page to pay on, or, when there is nothing to pay, the page of the
 * seat. Asked again before the pay page ends, it gives the same page. The order and the exact request are kept before
 * the payment service hears of them, so that an answer that was lost can be asked for again.
 * @throws CONFLICT when she has a seat; VALIDATION when her address is not confirmed; UPSTREAM when the service does not answer.
 */
export async function beginCheckout(ctx: Context, input: CheckoutInput): Promise<{ to: string }> {
  const actor = signedIn(ctx);
  if (!mayBuy(actor)) throw new AppError('VALIDATION', { says: 'Confirm your address first: the receipt goes there. The link is in your mail.' });
  await countUse(RATE_RULES.checkout, actor.publicId);
  const series = found(await Series.findOne({ where: { slug: input.series, state: 'published' } }));
  const { startAtOnce, withdrawalGivenUp } = input;
  const terms: OrderTerms = { wordsVersion: TERMS_WORDS_VERSION, startAtOnce, withdrawalGivenUp, agreedAt: ctx.clock.now().toISOString() };
  const wish: Wish = { actor, terms, loom: await pieceOnLoom(series, input) };
  if (series.priceMinor === 0) {
    await withTransaction(() => takeFreeSeat(ctx, series.id, wish));
    return { to: seatPage(series.slug) };
  }
  const order = await withTransaction(() => takeOrder(ctx, series, wish));
  return { to: await payPageOf(ctx, order, { series, buyerAddress: actor.email }) };
}

/** A loom on which the piece does not fit is not held against her: she tells us of another one later. */
async function pieceOnLoom({ id, title }: Series, { loom }: CheckoutInput): Promise<MyPiece | null> {
  const pattern = loom === null ? null : await PatternPiece.findByPk(id);
  if (loom === null || pattern?.data.craft !== 'frame-loom') return null;
  const trial = tryOnLoom(pattern.data, title, loom);
  return trial.ok && trial.fits ? trial.mine : null;
}

/** The buyer's own row is the lock: two clicks make one order. */
async function lockBuyer(actor: Actor, seriesId: number): Promise<void> {
  await User.findByPk(actor.userId, { lock: true });
  const seat = await Enrolment.findOne({ where: { userId: actor.userId, seriesId, state: 'active' } });
  if (seat !== null) throw new AppError('CONFLICT', { says: 'You have a seat in this series already. It is on your loom.' });
}

function priceOf({ priceMinor, currency }: Series): { amountMinor: number; currency: Currency } {
  if (priceMinor === null || !isCurrency(currency)) throw new AppError('CONFLICT', { says: 'This series has no price yet, so no seat can be taken.' });
  return { amountMinor: priceMinor, currency };
}

/** The buyer's open order, or a new one. What she agreed to last is what holds. */
async function takeOrder(ctx: Context, series: Series, wish: Wish): Promise<Order> {
  await lockBuyer(wish.actor, series.id);
  const { amountMinor, currency } = priceOf(series);
  const open = await Order.findOne({ where: { userId: wish.actor.userId, seriesId: series.id, state: 'pending' }, order: [['id', 'DESC']] });
  const { terms, loom } = wish;
  return open !== null && open.amountMinor === amountMinor && open.currency === currency ? open.update({ terms, loom }) : newOrder(ctx, series, wish);
}

function newOrder(ctx: Context, series: Series, { actor, terms, loom }: Wish): Promise<Order> {
  const publicId = newPublicId();
  const price = priceOf(series);
  const request = newRequest({ orderId: publicId, attempt: 1, ...price, series, buyerAddress: actor.email }, ctx.clock.now());
  return Order.create({ publicId, userId: actor.userId, seriesId: series.id, ...price, terms, loom, expiresAt: new Date(request.expiresAt), checkoutParameters: request });
}

/** Nothing is asked of the payment service; the order and its letter are made as for any other seat. */
async function takeFreeSeat(ctx: Context, seriesId: number, wish: Wish): Promise<void> {
  const series = found(await Series.findByPk(seriesId, { lock: true }));
  await lockBuyer(wish.actor, series.id);
  if (series.state !== 'published' || series.priceMinor !== 0) throw new AppError('CONFLICT', { says: 'The price changed just now. Look at it and take your seat again.' });
  await giveSeat(ctx, series, await newOrder(ctx, series, wish), null);
}
