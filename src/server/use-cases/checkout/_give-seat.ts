/** A seat and everything that belongs to it, written together or not at all. */
import { QueryTypes } from 'sequelize';
import { feeOf, type BasisPoints } from '#core/money/share.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { found } from '#server/errors.ts';
import { postLetter, type LetterTo } from '#server/mail/outbox.ts';
import { Enrolment, LedgerEntry, MyPieceRow, User, type Order, type Series } from '#server/models/index.ts';
import { putUpLetter } from '#server/notices/put-up.ts';

/** What the house keeps of a sale. */
const FEE: BasisPoints = 800;

/** How it was paid; null when it cost nothing. */
export interface PaidBy {
  readonly checkoutId: string;
  readonly paymentId: string | undefined;
}

/**
 * Gives the buyer of `order` her seat, with its receipt and what it adds to the ledger. Must run in a transaction that
 * holds the locks of series and order. A seat for nothing is an order and a letter like any other, so that its terms
 * are on record; no money moved, so the ledger has no row of it.
 * @returns false, with nothing written, when she has an active seat already.
 */
export async function giveSeat(ctx: Context, series: Series, order: Order, paid: PaidBy | null): Promise<boolean> {
  const now = ctx.clock.now();
  const held = await Enrolment.findOne({ where: { userId: order.userId, seriesId: series.id }, lock: true });
  if (held?.state === 'active') return false;
  const receiptNumber = await nextReceiptNumber();
  await order.update({ state: 'paid', paidAt: now, sessionId: paid?.checkoutId ?? null, paymentIntentId: paid?.paymentId ?? null, receiptNumber });
  const seat = { orderId: order.id, source: 'bought', state: 'active', startedAt: now } as const;
  const { id } = held === null ? await Enrolment.create({ userId: order.userId, seriesId: series.id, ...seat }) : await held.update(seat);
  if (order.loom !== null && (await MyPieceRow.findByPk(id)) === null) await MyPieceRow.create({ enrolmentId: id, data: order.loom });
  if (paid !== null && order.amountMinor > 0) await enterSale(series, order, paid);
  await audit(ctx, 'give-seat', { kind: 'order', id: order.publicId }, { series: series.publicId });
  await sendReceipt(series, order, receiptNumber, now);
  return true;
}

async function enterSale(series: Series, { id, amountMinor, currency }: Order, { checkoutId }: PaidBy): Promise<void> {
  const entry = { orderId: id, workroomId: series.workroomId, currency, externalId: checkoutId };
  await LedgerEntry.create({ ...entry, kind: 'sale', amountMinor });
  await LedgerEntry.create({ ...entry, kind: 'fee', amountMinor: -feeOf(amountMinor, FEE) });
}

/** Without gaps: the counter's row is locked until this transaction ends, and goes back with it. */
async function nextReceiptNumber(): Promise<number> {
  await sequelize.query('UPDATE receipt_counters SET last_number = last_number + 1 WHERE id = 1', { type: QueryTypes.UPDATE });
  const [row] = await sequelize.query<{ number: number }>('SELECT last_number AS number FROM receipt_counters WHERE id = 1', { type: QueryTypes.SELECT });
  return found(row).number;
}

async function sendReceipt(series: Series, order: Order, receiptNumber: number, paidAt: Date): Promise<void> {
  const buyer = found(await User.findByPk(order.userId));
  const letter: LetterTo<'seat-bought'> = {
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
  };
  await postLetter(letter);
  await putUpLetter(letter, { kind: 'seat', seriesId: series.id });
}
