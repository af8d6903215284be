/** Buying a seat through the payment service's own library, its stand-in, and news that goes astray in every way. */
import { afterEach, describe, expect, test } from 'vitest';
import { AuditEntry, Enrolment, LedgerEntry, Mail, Order, PaymentEvent, type Series, type User } from '#server/models/index.ts';
import { askForSettlement } from '#server/use-cases/checkout/ask-for-settlement.ts';
import { beginCheckout } from '#server/use-cases/checkout/begin-checkout.ts';
import type { WebhookFaults } from '#stand-ins/payment/webhook-faults.ts';
import { AGREED } from '../../support/buyer.ts';
import { actorOf, contextOf } from '../../support/context.ts';
import { buildSeries, buildUser } from '../../support/factories.ts';
import { openShopDoor, type ShopDoor } from '../../support/shop-door.ts';
import { buyerDoes, CARD } from '../../support/stand-ins.ts';

const doors: ShopDoor[] = [];
afterEach(async () => {
  for (const door of doors.splice(0)) await door.close();
});

async function open(): Promise<ShopDoor> {
  const door = await openShopDoor({ settleSeconds: 3_600 });
  doors.push(door);
  return door;
}

async function begin({ payments }: ShopDoor, student: User, series: Series, now = new Date()): Promise<string> {
  const ctx = contextOf(await actorOf(student), { payments }, now);
  return (await beginCheckout(ctx, { series: series.slug, ...AGREED, loom: null })).to;
}

/** One seat, one receipt, one sale with its fee, and nothing that a person would have to look at. */
async function expectOneSeat(student: User): Promise<void> {
  expect(await Enrolment.findAll({ where: { userId: student.id } })).toMatchObject([{ state: 'active', source: 'bought' }]);
  const orders = await Order.findAll({ where: { userId: student.id } });
  expect(orders).toMatchObject([{ state: 'paid', reviewReason: null }]);
  expect(await Mail.findAll({ where: { userId: student.id } })).toMatchObject([{ template: 'seat-bought' }]);
  expect((await LedgerEntry.findAll({ where: { orderId: orders[0]?.id ?? 0 }, order: ['id'] })).map(({ kind, amountMinor }) => [kind, amountMinor])).toEqual([['sale', 6_800], ['fee', -544]]);
}

const GOOD: WebhookFaults = { duplicate: 0, reorder: 0, drop: 0, delayMs: 0, seed: 1 };
const FATES: readonly (readonly [string, WebhookFaults])[] = [
  ['arrives as it should', GOOD],
  ['arrives twice', { ...GOOD, duplicate: 1 }],
  ['arrives in another order', { ...GOOD, reorder: 1 }],
  ['arrives late', { ...GOOD, delayMs: 300 }],
  ['is lost more often than not', { ...GOOD, drop: 0.7, seed: 5 }],
  ['suffers all of it', { duplicate: 0.8, reorder: 0.8, drop: 0.5, delayMs: 60, seed: 11 }],
];

describe('when the news of a payment', () => {
  test.each(FATES)('%s, there is one seat and one receipt', async (_words, faults) => {
    const door = await open();
    const [student, series] = [await buildUser(), await buildSeries()];
    const page = await begin(door, student, series);
    door.standIns.webhooks.faults = faults;
    expect((await buyerDoes(page, CARD)).location).toContain(`/series/${series.slug}/seat?checkout=cs_test_`);
    await door.untilQuiet();
    await expectOneSeat(student);
    expect(await PaymentEvent.count({ where: { handledAt: null } })).toBe(0);
  });

  test('never comes at all, coming back is enough to have it looked at, and grants nothing by itself', async () => {
    const door = await open();
    const [student, series] = [await buildUser(), await buildSeries()];
    const page = await begin(door, student, series);
    door.standIns.webhooks.stop();
    await buyerDoes(page, CARD);
    const order = await Order.findOne({ where: { userId: student.id } });
    const back = contextOf(await actorOf(student), { payments: door.payments }, new Date(Date.now() - 60_000));
    for (let times = 0; times < 3; times += 1) await askForSettlement(back, order?.sessionId ?? '');
    expect(await Enrolment.count()).toBe(0);
    const { runDueJobs } = await import('#server/jobs/run-due.ts');
    const { REGISTERED } = await import('#server/jobs/handlers/index.ts');
    expect(await runDueJobs(door.ctx, 'worker', REGISTERED)).toBe(1);
    await expectOneSeat(student);
  });

  test('another person who brings its address sets nothing going', async () => {
    const door = await open();
    const [student, series] = [await buildUser(), await buildSeries()];
    await begin(door, student, series);
    const order = await Order.findOne();
    await askForSettlement(contextOf(await actorOf(await buildUser()), { payments: door.payments }), order?.sessionId ?? '');
    await door.untilQuiet();
    expect(await Order.findOne()).toMatchObject({ state: 'pending' });
  });

  test('of eight buyers goes astray at once, each has one seat and the receipts are 1 to 8', async () => {
    const door = await open();
    const series = await buildSeries();
    const students = await Promise.all(Array.from({ length: 8 }, () => buildUser()));
    const pages = await Promise.all(students.map((student) => begin(door, student, series)));
    door.standIns.webhooks.faults = { duplicate: 0.6, reorder: 0.6, drop: 0.4, delayMs: 20, seed: 23 };
    await Promise.all(pages.map((page) => buyerDoes(page, CARD)));
    await door.untilQuiet();
    for (const student of students) await expectOneSeat(student);
    expect((await Order.findAll()).map(({ receiptNumber }) => receiptNumber).toSorted((a, b) => (a ?? 0) - (b ?? 0))).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  });
});

describe('at the pay page', () => {
  test('a card the bank refuses takes nothing; the next one gives the seat', async () => {
    const door = await open();
    const [student, series] = [await buildUser(), await buildSeries()];
    const page = await begin(door, student, series);
    expect((await buyerDoes(page, { ...CARD, number: '4000 0000 0000 0002' })).text).toContain('The bank said no');
    await door.untilQuiet();
    expect([await Enrolment.count(), await Mail.count()]).toEqual([0, 0]);
    expect(await begin(door, student, series)).toBe(page);
    await buyerDoes(page, CARD);
    await door.untilQuiet();
    await expectOneSeat(student);
  });

  test('who closes it comes back to the series, and finds the same page the next time', async () => {
    const door = await open();
    const [student, series] = [await buildUser(), await buildSeries()];
    const page = await begin(door, student, series);
    expect((await buyerDoes(page, { do: 'close' })).location).toContain(`/series/${series.slug}?paying=stopped`);
    expect(await begin(door, student, series)).toBe(page);
    expect(await Order.count()).toBe(1);
  });

  test.each([['comes', 'DE89370400440532013000', true], ['does not come', 'DE62370400440532013001', false]] as const)('a slow way of paying, whose money %s, says so', async (_words, account, paid) => {
    const door = await open();
    const [student, series] = [await buildUser(), await buildSeries()];
    await buyerDoes(await begin(door, student, series), { do: 'debit', email: student.email, account });
    await door.untilQuiet();
    expect(await Enrolment.count()).toBe(0);
    door.standIns.clock.advance(3_601);
    await door.stripe.checkout.sessions.list();
    await door.untilQuiet();
    if (paid) await expectOneSeat(student);
    else expect([await Order.findOne(), await Mail.findOne()]).toMatchObject([{ state: 'refused' }, { template: 'seat-refused' }]);
  });

  test('who has paid already is never sent to a page to pay on', async () => {
    const door = await open();
    const [student, series] = [await buildUser(), await buildSeries()];
    await buyerDoes(await begin(door, student, series), CARD);
    expect(await begin(door, student, series)).toContain(`/series/${series.slug}/seat?checkout=`);
    await door.untilQuiet();
    await expectOneSeat(student);
    await expect(begin(door, student, series)).rejects.toMatchObject({ code: 'CONFLICT' });
  });
});

describe('when opening the pay page', () => {
  test('was carried out but answered by 500 again and again, the page is found, and there is one', async () => {
    const door = await open();
    const [student, series] = [await buildUser(), await buildSeries()];
    door.standIns.apiFaults.set([{ kind: 'fail-after', method: 'POST', path: '/v1/checkout/sessions', times: 1, status: 500, type: 'api_error', delayMs: 0 }]);
    await buyerDoes(await begin(door, student, series), CARD);
    await door.untilQuiet();
    await expectOneSeat(student);
    expect(door.standIns.payments.checkouts.oldestFirst()).toHaveLength(1);
  });

  test('fails before anything was done, a new attempt opens it', async () => {
    const door = await open();
    const [student, series] = [await buildUser(), await buildSeries()];
    door.standIns.apiFaults.set([{ kind: 'answer', method: 'POST', path: '/v1/checkout/sessions', times: 3, status: 500, type: 'api_error', delayMs: 0 }]);
    await buyerDoes(await begin(door, student, series), CARD);
    await door.untilQuiet();
    await expectOneSeat(student);
    expect(await Order.findOne()).toMatchObject({ attempt: 2 });
  });

  test('is tried again when its first words are too old, they are written anew', async () => {
    const door = await open();
    const [student, series] = [await buildUser(), await buildSeries()];
    door.standIns.apiFaults.set([{ kind: 'hang-up-before', path: '/v1/', times: 20, status: 500, type: 'api_error', delayMs: 0 }]);
    await expect(begin(door, student, series, new Date(Date.now() - 3_600_000))).rejects.toMatchObject({ code: 'UPSTREAM' });
    door.standIns.apiFaults.set([]);
    await buyerDoes(await begin(door, student, series), CARD);
    await door.untilQuiet();
    await expectOneSeat(student);
    expect(await Order.findOne()).toMatchObject({ attempt: 2 });
    expect(await AuditEntry.count({ where: { action: 'review-order' } })).toBe(0);
  });
});
