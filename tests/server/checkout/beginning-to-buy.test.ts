import { describe, expect, test } from 'vitest';
import { AppError } from '#server/errors.ts';
import type { TypedLoom } from '#core/trial/typed-loom.ts';
import { Enrolment, Job, LedgerEntry, Mail, MyPieceRow, Order, PatternPiece } from '#server/models/index.ts';
import { beginCheckout } from '#server/use-cases/checkout/begin-checkout.ts';
import { settleCheckout } from '#server/use-cases/checkout/settle-checkout.ts';
import { AGREED, buyer, NO_ANSWER, worker } from '../../support/buyer.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildUser } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

describe('beginning to buy', () => {
  test('an order is kept with the exact request before she is sent to the pay page', async () => {
    const { begin, series, student } = await buyer();
    const { to } = await begin();
    const order = await Order.findOne({ where: { userId: student.id, seriesId: series.id } });
    expect(to).toMatch(/^http/);
    expect(order).toMatchObject({ state: 'pending', amountMinor: 6_800, currency: 'EUR', payUrl: to });
    expect(order?.checkoutParameters).toMatchObject({ orderId: order?.publicId, attempt: 1, lines: [{ amountMinor: 6_800, quantity: 1 }] });
    expect(order?.terms).toMatchObject({ startAtOnce: true, withdrawalGivenUp: true });
  });

  test('two clicks at once make one order and one pay page', async () => {
    const { begin, payments } = await buyer();
    const pages = await Promise.all([begin(), begin(), begin()]);
    expect(new Set(pages.map(({ to }) => to)).size).toBe(1);
    expect(await Order.count()).toBe(1);
    expect(payments.checkouts.size).toBe(1);
  });

  test('when nothing comes from the payment service, trying again asks for the same page with the same words', async () => {
    const { begin, payments } = await buyer();
    payments.failNext(NO_ANSWER, NO_ANSWER);
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
    await expect(beginCheckout(unsure, { series: series.slug, ...AGREED, loom: null })).rejects.toMatchObject({ code: 'VALIDATION' });
    await expect(beginCheckout(contextOf(null), { series: series.slug, ...AGREED, loom: null })).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await series.update({ state: 'draft' });
    const ctx = await contextFor(await buildUser(), { payments });
    await expect(beginCheckout(ctx, { series: series.slug, ...AGREED, loom: null })).rejects.toMatchObject({ code: 'NOT_FOUND' });
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

describe('an order never stays stuck', () => {
  test('a failure that is answered again and again is left behind by a new attempt with its own words', async () => {
    const { begin, payments } = await buyer();
    payments.failNext(NO_ANSWER);
    const { to } = await begin();
    expect(payments.requests.map(({ attempt }) => attempt)).toEqual([1, 2]);
    expect(await Order.findAll()).toMatchObject([{ attempt: 2, payUrl: to, state: 'pending', checkoutParameters: { attempt: 2 } }]);
  });

  test.each([
    { kind: 'misconfigured', code: 'parameter_invalid', message: 'expires_at is too soon' },
    { kind: 'not-possible', code: 'refused', message: 'no' },
    { kind: 'reused-id', message: 'other words' },
  ] as const)('a request refused as $kind is asked for anew, reckoned from now', async (failure) => {
    const { ctx, series, payments } = await buyer();
    payments.failNext(NO_ANSWER, NO_ANSWER);
    await expect(beginCheckout(ctx, { series: series.slug, ...AGREED, loom: null })).rejects.toMatchObject({ code: 'UPSTREAM' });
    ctx.clock.set(new Date('2026-12-01T10:20:00Z'));
    payments.failNext(failure);
    await beginCheckout(ctx, { series: series.slug, ...AGREED, loom: null });
    expect(payments.requests.map(({ attempt, expiresAt }) => [attempt, expiresAt.toISOString()])).toEqual([
      [1, '2026-12-01T10:35:00.000Z'], [1, '2026-12-01T10:35:00.000Z'], [2, '2026-12-01T10:55:00.000Z'],
    ]);
    expect(await Order.findOne()).toMatchObject({ attempt: 2, expiresAt: new Date('2026-12-01T10:55:00Z') });
  });

  test('a page that was opened though its answer got lost is found, not opened twice', async () => {
    const { begin, payments } = await buyer();
    const { to } = await begin();
    await Order.update({ payUrl: null, sessionId: null }, { where: {} });
    payments.failNext(NO_ANSWER);
    expect((await begin()).to).toBe(to);
    expect(payments.checkouts.size).toBe(1);
  });

  test('while the service refuses everything, she is told that nothing was taken, and no attempt is lost', async () => {
    const { begin, payments } = await buyer();
    payments.failNext(...Array.from({ length: 2 }, () => ({ kind: 'misconfigured', code: 'key', message: 'wrong key' }) as const));
    await expect(begin()).rejects.toMatchObject({ code: 'UPSTREAM', says: expect.stringContaining('Nothing was taken') as string });
    await begin();
    expect(payments.requests.map(({ attempt }) => attempt)).toEqual([1, 2, 2]);
  });

  test('a page that ended is opened anew for the same order', async () => {
    const { begin, checkout, payments } = await buyer();
    const first = (await begin()).to;
    payments.letExpire(checkout().id);
    expect((await begin()).to).not.toBe(first);
    expect(await Order.findAll()).toMatchObject([{ attempt: 2 }]);
  });

  test('a page that is about to end is closed before another is opened, so that nobody can pay on two', async () => {
    const { ctx, series, payments, checkout } = await buyer();
    await beginCheckout(ctx, { series: series.slug, ...AGREED, loom: null });
    const first = checkout().id;
    ctx.clock.set(new Date('2026-12-01T10:31:00Z'));
    await beginCheckout(ctx, { series: series.slug, ...AGREED, loom: null });
    expect(payments.checkouts.get(first)?.status).toBe('expired');
    expect(await settleCheckout(worker(payments), first)).toBe('nothing');
    expect(await Order.findOne()).toMatchObject({ state: 'pending', sessionId: checkout().id });
  });

  test('who has paid and comes back too soon is sent to her seat, not to pay again', async () => {
    const { begin, checkout, payments, series } = await buyer();
    await begin();
    payments.pay(checkout().id);
    expect((await begin()).to).toContain(`/series/${series.slug}/seat?checkout=${checkout().id}`);
    expect(payments.checkouts.size).toBe(1);
    expect(await Job.count({ where: { type: 'settle-checkout' } })).toBe(1);
  });

  test('what she agreed to last is what holds', async () => {
    const { ctx, series } = await buyer();
    await beginCheckout(ctx, { series: series.slug, startAtOnce: false, withdrawalGivenUp: false, loom: null });
    await beginCheckout(ctx, { series: series.slug, ...AGREED, loom: null });
    expect((await Order.findAll()).map(({ terms }) => terms)).toMatchObject([AGREED]);
  });
});

describe('a seat for nothing', () => {
  test('is given without a pay page: an order, a receipt, no money in the ledger', async () => {
    const { begin, series, student, payments } = await buyer();
    await series.update({ priceMinor: 0 });
    expect((await begin()).to).toMatch(new RegExp(`/series/${series.slug}/seat$`));
    expect(payments.requests).toEqual([]);
    expect(await Enrolment.findAll()).toMatchObject([{ userId: student.id, seriesId: series.id, state: 'active', source: 'bought' }]);
    expect(await Order.findAll()).toMatchObject([{ state: 'paid', amountMinor: 0, receiptNumber: 1, sessionId: null, terms: AGREED }]);
    expect(await Mail.count({ where: { template: 'seat-bought' } })).toBe(1);
    expect(await LedgerEntry.count()).toBe(0);
  });

  test('three clicks at once give one', async () => {
    const { begin, series } = await buyer();
    await series.update({ priceMinor: 0 });
    const clicks = await Promise.allSettled([begin(), begin(), begin()]);
    expect(clicks.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
    expect([await Enrolment.count(), await Order.count(), await Mail.count()]).toEqual([1, 1, 1]);
  });
});

describe('the loom she tried', () => {
  const LOOM: TypedLoom = { inside: '36', spacing: '8', ends: 2, units: 'cm', narrower: true };

  test('becomes her own piece with the seat', async () => {
    const { begin, checkout, payments, series } = await buyer();
    await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
    await begin(LOOM);
    payments.pay(checkout().id);
    await settleCheckout(worker(payments), checkout().id);
    const seat = await Enrolment.findOne();
    expect((await MyPieceRow.findByPk(seat?.id ?? 0))?.data).toEqual({ loom: { insideWidthMm: 360, nailPitchMm: 8 }, endsTogether: 2, widthMm: 310 });
  });

  test('is forgotten where the piece does not fit it, and no piece of hers is overwritten', async () => {
    const { begin, checkout, payments, series, student } = await buyer();
    await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
    const before = await buildEnrolment({ userId: student.id, seriesId: series.id, state: 'closed' });
    await MyPieceRow.create({ enrolmentId: before.id, data: { widthMm: 350 } });
    await begin(LOOM);
    await begin({ ...LOOM, inside: 'wide' });
    expect((await Order.findOne())?.loom).toBeNull();
    await begin(LOOM);
    payments.pay(checkout().id);
    expect(await settleCheckout(worker(payments), checkout().id)).toBe('seat');
    expect((await MyPieceRow.findByPk(before.id))?.data).toEqual({ widthMm: 350 });
  });
});
