import { describe, expect, test } from 'vitest';
import { statementListeners } from '#server/db/sequelize.ts';
import { Order } from '#server/models/index.ts';
import { followedSeries } from '#server/queries/following/followed-series.ts';
import { myLoom } from '#server/queries/loom/my-loom.ts';
import { finishPart } from '#server/use-cases/progress/finish-part.ts';
import { setTick } from '#server/use-cases/progress/set-tick.ts';
import { actorOf, contextFor } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

const now = new Date('2026-12-01T10:00:00Z');

async function counted<T>(work: () => Promise<T>): Promise<{ value: T; count: number }> {
  const statements: string[] = [];
  const listen = (sql: string): void => { statements.push(sql); };
  statementListeners.add(listen);
  try {
    const value = await work();
    return { value, count: statements.length };
  } finally {
    statementListeners.delete(listen);
  }
}

describe('a series as it is followed', () => {
  test('tells what is ticked, finished and open, in seven statements', async () => {
    const { series, parts: [first], student } = await buildFollowed();
    const ctx = await contextFor(student);
    await setTick(ctx, { subject: 'step', series: series.slug, lesson: first.publicId, item: 'tie-on', ticked: true });
    await finishPart(ctx, { series: series.slug, lesson: first.publicId, done: true });
    const { value, count } = await counted(() => followedSeries(ctx.actor, series.slug, now));
    expect(value?.progress).toMatchObject([
      { number: 1, steps: ['tie-on', 'wind'], ticked: new Set(['tie-on']), isFinished: true, standing: { open: true } },
      { number: 2, asksForPhoto: true, verdict: null },
      { number: 3, standing: { open: false, until: 'verdict' } },
    ]);
    expect(value?.amountKeys[0]).toEqual(['ends']);
    expect(count).toBeLessThanOrEqual(7);
  });

  test('a visitor follows nothing, and sees the pattern’s piece', async () => {
    const { series } = await buildFollowed();
    const followed = await followedSeries(null, series.slug, now);
    expect(followed).toMatchObject({ series: { seat: null }, pieces: { mine: {} } });
    expect(followed?.pieces.pattern).not.toBeNull();
  });

  test('a draft of somebody else’s is not there', async () => {
    const series = await buildSeries({ state: 'draft' });
    expect(await followedSeries(await actorOf(await buildUser()), series.slug, now)).toBeNull();
  });
});

describe('my loom', () => {
  test('tells every seat, its parts and what was paid, in five statements however many there are', async () => {
    const { series, parts: [, second], student, seat } = await buildFollowed();
    for (let more = 0; more < 3; more += 1) {
      const lesson = await buildLesson();
      await buildEnrolment({ userId: student.id, seriesId: lesson.seriesId });
    }
    const checkoutParameters = { orderId: 'o', attempt: 1, currency: 'EUR', lines: [], successUrl: '', cancelUrl: '', expiresAt: now.toISOString() } as const;
    const terms = { wordsVersion: '1', startAtOnce: true, withdrawalGivenUp: true, agreedAt: now.toISOString() };
    await Order.create({ userId: student.id, seriesId: series.id, state: 'paid', amountMinor: 6_800, currency: 'EUR', checkoutParameters, terms, receiptNumber: 12, paidAt: now, expiresAt: now });
    await Order.create({ userId: student.id, seriesId: series.id, state: 'expired', amountMinor: 6_800, currency: 'EUR', checkoutParameters, terms, expiresAt: now });
    await setTick(await contextFor(student), { subject: 'step', series: series.slug, lesson: second.publicId, item: 'wind', ticked: true });
    const actor = await actorOf(student);
    const { value, count } = await counted(() => myLoom(actor, now));
    expect(value.seats).toHaveLength(4);
    expect(value.seats[0]).toMatchObject({ enrolmentId: seat.id, parts: [{ number: 1 }, { number: 2, ticked: new Set(['wind']) }, { number: 3, standing: { open: false } }] });
    expect(value.orders).toMatchObject([{ receiptNumber: 12, amountMinor: 6_800, currency: 'EUR', state: 'paid' }]);
    expect(count).toBe(5);
  });

  test('a closed seat and other people’s orders are not on it', async () => {
    const { series } = await buildFollowed();
    const other = await buildUser();
    await buildEnrolment({ userId: other.id, seriesId: series.id, state: 'closed' });
    expect(await myLoom(await actorOf(other), now)).toEqual({ seats: [], orders: [] });
  });
});
