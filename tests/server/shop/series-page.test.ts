import { describe, expect, test } from 'vitest';
import { statementListeners } from '#server/db/sequelize.ts';
import { Enrolment, MyPieceRow, Order, PatternPiece, WorkroomHelper, type Series, type User } from '#server/models/index.ts';
import { seriesPage } from '#server/queries/shop/series-page.ts';
import { seatStanding } from '#server/queries/shop/seat-standing.ts';
import { beginCheckout } from '#server/use-cases/checkout/begin-checkout.ts';
import { settleCheckout } from '#server/use-cases/checkout/settle-checkout.ts';
import { buyer, worker, AGREED } from '../../support/buyer.ts';
import { actorOf, contextFor } from '../../support/context.ts';
import { buildEnrolment, buildGatheringItem, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

const NOW = new Date('2026-12-01T10:00:00Z');

async function shore(): Promise<{ series: Series; teacher: User; helper: User }> {
  const [teacher, helper] = [await buildUser({ name: 'Ilse Marrow' }), await buildUser({ name: 'Wren Okafor' })];
  const workroom = await buildWorkroom({ ownerId: teacher.id });
  await WorkroomHelper.create({ workroomId: workroom.id, userId: helper.id });
  const series = await buildSeries({ workroomId: workroom.id, slug: 'low-tide' });
  await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
  const first = await buildLesson({ seriesId: series.id, isPreview: true });
  const second = await buildLesson({ seriesId: series.id });
  await buildGatheringItem({ lessonId: first.id, name: 'Frame loom', amountKey: 'loom.width' });
  await buildGatheringItem({ lessonId: second.id, name: 'Frame loom', amountKey: 'nails' });
  return { series, teacher, helper };
}

async function statementsOf(work: () => Promise<unknown>): Promise<number> {
  let count = 0;
  const listener = (): void => { count += 1; };
  statementListeners.add(listener);
  await work().finally(() => statementListeners.delete(listener));
  return count;
}

describe('the page of a series', () => {
  test('shows a visitor everything that matters before paying', async () => {
    await shore();
    const page = await seriesPage(null, 'low-tide', NOW);
    expect(page).toMatchObject({
      looksAfter: false, mine: null, helpers: ['Wren Okafor'], pattern: { craft: 'frame-loom' },
      series: { seat: null, parts: [{ access: { may: 'preview' } }, { access: { may: 'buy' } }] },
      toGather: [{ name: 'Frame loom', parts: [1, 2], amountKey: 'loom.width' }],
    });
  });

  test('a draft is seen by who looks after it, and by nobody else', async () => {
    const { series, teacher, helper } = await shore();
    await series.update({ state: 'draft' });
    expect(await seriesPage(null, 'low-tide', NOW)).toBeNull();
    expect(await seriesPage(await actorOf(await buildUser()), 'low-tide', NOW)).toBeNull();
    for (const person of [teacher, helper]) expect(await seriesPage(await actorOf(person), 'low-tide', NOW)).toMatchObject({ looksAfter: true, series: { state: 'draft' } });
    expect(await seriesPage(null, 'no-such-series', NOW)).toBeNull();
  });

  test('knows her seat and her own piece', async () => {
    const { series } = await shore();
    const student = await buildUser();
    const seat = await buildEnrolment({ userId: student.id, seriesId: series.id });
    await MyPieceRow.create({ enrolmentId: seat.id, data: { widthMm: 300 } });
    expect(await seriesPage(await actorOf(student), 'low-tide', NOW)).toMatchObject({ mine: { widthMm: 300 }, series: { seat: { enrolmentId: seat.id } } });
    expect(await seriesPage(await actorOf(await buildUser()), 'low-tide', NOW)).toMatchObject({ mine: null, series: { seat: null } });
  });

  test('asks the database at most five times, with a seat and without', async () => {
    const { series } = await shore();
    const student = await buildUser();
    await buildEnrolment({ userId: student.id, seriesId: series.id });
    const actor = await actorOf(student);
    expect(await statementsOf(() => seriesPage(null, 'low-tide', NOW))).toBeLessThanOrEqual(5);
    expect(await statementsOf(() => seriesPage(actor, 'low-tide', NOW))).toBeLessThanOrEqual(5);
  });
});

describe('coming back from the pay page', () => {
  test('shows how the order stands, from our own state alone', async () => {
    const { begin, checkout, payments, student, series } = await buyer();
    const actor = await actorOf(student);
    const standing = async () => (await seatStanding(actor, series.slug, checkout().id)).standing;
    await begin();
    payments.pay(checkout().id);
    expect(await standing()).toBe('waits');
    await settleCheckout(worker(payments), checkout().id);
    expect(await seatStanding(actor, series.slug, checkout().id)).toEqual({ standing: 'yours', receiptNumber: 1 });
    expect(await seatStanding(actor, series.slug, null)).toEqual({ standing: 'yours', receiptNumber: 1 });
    expect(await seatStanding(actor, series.slug, 'cs_made_up')).toMatchObject({ standing: 'yours' });
  });

  test.each([['refused', 'refused'], ['expired', 'ended'], ['review', 'looked-at']] as const)('an order that is %s reads as %s', async (state, expected) => {
    const { begin, checkout, student, series } = await buyer();
    await begin();
    await Order.update({ state }, { where: {} });
    expect((await seatStanding(await actorOf(student), series.slug, checkout().id)).standing).toBe(expected);
  });

  test('somebody else’s payment, a made-up one, another series and a seat given back are all unknown', async () => {
    const { begin, checkout, payments, student, series } = await buyer();
    await begin();
    const [actor, other] = [await actorOf(student), await actorOf(await buildUser())];
    const elsewhere = await buildSeries();
    expect((await seatStanding(other, series.slug, checkout().id)).standing).toBe('unknown');
    expect((await seatStanding(actor, series.slug, 'cs_made_up')).standing).toBe('unknown');
    expect((await seatStanding(actor, series.slug, null)).standing).toBe('unknown');
    expect((await seatStanding(actor, elsewhere.slug, checkout().id)).standing).toBe('unknown');
    payments.pay(checkout().id);
    await settleCheckout(worker(payments), checkout().id);
    await Enrolment.update({ state: 'closed' }, { where: {} });
    expect((await seatStanding(actor, series.slug, checkout().id)).standing).toBe('unknown');
  });

  test('a free seat is hers at once', async () => {
    const { series, student } = await buyer();
    await series.update({ priceMinor: 0 });
    await beginCheckout(await contextFor(student), { series: series.slug, ...AGREED, loom: null });
    expect(await seatStanding(await actorOf(student), series.slug, null)).toEqual({ standing: 'yours', receiptNumber: 1 });
  });
});
