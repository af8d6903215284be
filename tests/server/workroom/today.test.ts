import { describe, expect, test } from 'vitest';
import { sequelize, statementListeners } from '#server/db/sequelize.ts';
import { LedgerEntry, LessonVisit, Media, Order, PatternPiece, ProgressPhoto, RowTally, Tick, WorkroomHelper, type Enrolment, type Lesson, type Series, type User } from '#server/models/index.ts';
import { classOf } from '#server/queries/workroom/class-of.ts';
import { ledgerSince } from '#server/queries/workroom/ledger.ts';
import { lastMonday, today } from '#server/queries/workroom/today.ts';
import { actorOf } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

/** A Tuesday. */
const NOW = new Date('2026-12-01T10:00:00Z');
const day = (date: string): Date => new Date(`2026-${date}T08:00:00Z`);

interface Scene { readonly teacher: User; readonly series: Series; readonly parts: readonly [Lesson, Lesson, Lesson] }

async function scene(): Promise<Scene> {
  const teacher = await buildUser({ name: 'Ilse Marrow' });
  const series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id });
  const part = (title: string): Promise<Lesson> => buildLesson({ seriesId: series.id, title });
  return { teacher, series, parts: [await part('Gather'), await part('Dress the loom'), await part('Weave')] };
}

async function seat(series: Series, name: string, startedAt = day('11-02')): Promise<Enrolment> {
  return buildEnrolment({ userId: (await buildUser({ name })).id, seriesId: series.id, startedAt });
}

async function photo(own: Enrolment, lesson: Lesson, createdAt: Date, verdict: ProgressPhoto['verdict'] = 'waits', verdictAt: Date | null = null): Promise<void> {
  const media = await Media.create({ ownerId: own.userId, kind: 'photo', originalName: 'loom.jpg', files: {}, detail: {} });
  await ProgressPhoto.create({ enrolmentId: own.id, lessonId: lesson.id, mediaId: media.id, verdict, verdictAt, createdAt });
}

async function sale(series: Series, own: Enrolment, amountMinor: number, createdAt: Date): Promise<void> {
  const order = await Order.create({ userId: own.userId, seriesId: series.id, state: 'paid', amountMinor, currency: 'EUR', checkoutParameters: {} as Order['checkoutParameters'], terms: { startAtOnce: true, withdrawalGivenUp: true } as Order['terms'], expiresAt: NOW });
  await LedgerEntry.create({ orderId: order.id, workroomId: series.workroomId, kind: 'sale', amountMinor, currency: 'EUR', externalId: `s${order.id}`, createdAt });
  await LedgerEntry.create({ orderId: order.id, workroomId: series.workroomId, kind: 'fee', amountMinor: -Math.round(amountMinor * 0.08), currency: 'EUR', externalId: `s${order.id}`, createdAt });
}

async function statementsOf(work: () => Promise<unknown>): Promise<number> {
  const statements: string[] = [];
  const listen = (sql: string): void => { statements.push(sql); };
  statementListeners.add(listen);
  await work();
  statementListeners.delete(listen);
  return statements.length;
}

describe('where a class is', () => {
  test('is told by what each has finished, shown and ticked', async () => {
    const { series, parts: [gather, dress, weave] } = await scene();
    const [fresh, shown, mending, off] = [await seat(series, 'Jonas'), await seat(series, 'Maud'), await seat(series, 'Amara'), await seat(series, 'Noor')];
    for (const own of [shown, mending, off]) await LessonVisit.create({ enrolmentId: own.id, lessonId: gather.id, finishedAt: day('11-05') });
    await photo(shown, dress, day('11-20'), 'mend-first', day('11-21'));
    await photo(shown, dress, day('11-22'));
    await photo(mending, dress, day('11-20'), 'mend-first', day('11-21'));
    await photo(off, dress, day('11-10'), 'weave-on', day('11-11'));
    await LessonVisit.create({ enrolmentId: off.id, lessonId: weave.id, finishedAt: day('11-12') });
    await Tick.create({ enrolmentId: mending.id, subject: 'step', itemKey: `${dress.publicId}:wind`, isTicked: true, changedAt: day('11-25') });
    const [one] = await classOf([series.workroomId]);
    const rows = new Map(one?.students.map(({ name, at, verdict, lastStepAt }) => [name, [at, verdict, lastStepAt.toISOString().slice(5, 10)]]));
    expect(Object.fromEntries(rows)).toEqual({ Jonas: [0, null, '11-02'], Maud: [1, 'waits', '11-22'], Amara: [1, 'mend-first', '11-25'], Noor: [undefined, null, '11-12'] });
    expect(fresh.seriesId).toBe(series.id);
  });

  test('counts ticked steps as a share of the part in hand', async () => {
    const { series, parts: [gather] } = await scene();
    const own = await seat(series, 'Maud');
    await sequelize.query(`UPDATE lesson_versions SET facts = JSON_SET(facts, '$.steps', JSON_ARRAY(JSON_OBJECT('id','a'), JSON_OBJECT('id','b'))) WHERE lesson_id = ${String(gather.id)}`);
    await Tick.create({ enrolmentId: own.id, subject: 'step', itemKey: `${gather.publicId}:a`, isTicked: true, changedAt: day('11-25') });
    await Tick.create({ enrolmentId: own.id, subject: 'step', itemKey: `${gather.publicId}:b`, isTicked: false, changedAt: day('11-25') });
    expect((await classOf([series.workroomId]))[0]?.students[0]?.done).toBe(0.5);
  });

  test('counts rows at the loom as the share of the part in hand, and as a step', async () => {
    const { series, parts: [gather, dress, weave] } = await scene();
    const own = await seat(series, 'Maud');
    await LessonVisit.bulkCreate([gather, dress].map(({ id }) => ({ enrolmentId: own.id, lessonId: id, finishedAt: day('11-12') })));
    const piece = await lowTide();
    await PatternPiece.destroy({ where: { seriesId: series.id } });
    await PatternPiece.create({ seriesId: series.id, data: piece, revision: 1 });
    const place = async () => (await classOf([series.workroomId]))[0]?.students[0];
    const before = await place();
    await sequelize.query(`UPDATE lesson_versions SET facts = JSON_SET(facts, '$.amounts', JSON_ARRAY(${piece.bands.map(({ name }) => `'band.${name ?? ''}.rows'`).join(',')})) WHERE lesson_id = ${String(weave.id)}`);
    await RowTally.create({ enrolmentId: own.id, bandKey: piece.bands[1]?.name ?? '', device: 'a', counted: 3, version: 1 });
    const after = await place();
    expect([before?.at, after?.at]).toEqual([2, 2]);
    expect(before?.done).toBe(2);
    expect(after?.done).toBeGreaterThan(2);
    expect(after?.done).toBeLessThan(3);
    expect(after?.lastStepAt.getTime()).toBeGreaterThan(before?.lastStepAt.getTime() ?? 0);
  });

  test('leaves out seats that were closed, parts taken out, and other workrooms', async () => {
    const { series, parts: [gather] } = await scene();
    await gather.update({ takenOutAt: NOW });
    await (await seat(series, 'Gone')).update({ state: 'closed' });
    await buildEnrolment();
    const classes = await classOf([series.workroomId]);
    expect(classes.map(({ students, parts }) => [students.length, parts.map(({ number, title }) => [number, title])])).toEqual([[0, [[1, 'Dress the loom'], [2, 'Weave']]]]);
  });
});

describe('today', () => {
  test('shows a teacher her photos, her class and what was sold since Monday', async () => {
    const { teacher, series, parts: [gather] } = await scene();
    const own = await seat(series, 'Maud Ellery');
    await photo(own, gather, new Date('2026-11-30T12:00:00Z'));
    await photo(own, gather, new Date('2026-11-30T06:00:00Z'), 'mend-first', new Date('2026-11-30T09:00:00Z'));
    await sale(series, own, 6_800, new Date('2026-11-30T12:00:00Z'));
    await sale(series, own, 6_800, day('11-20'));
    const seen = await today(await actorOf(teacher), NOW);
    expect(seen.waiting.map(({ studentName }) => studentName)).toEqual(['Maud Ellery']);
    expect([...(seen.sold ?? [])]).toEqual([['EUR', { seats: 1, takenMinor: 6_800, refundedMinor: 0, feeMinor: -544, yoursMinor: 6_256 }]]);
    expect([seen.answerDays, seen.answerHours, seen.series.map(({ students }) => students.length)]).toEqual([2, [3], [1]]);
  });

  test('shows a helper the bench and the class, and no money', async () => {
    const { series } = await scene();
    const helper = await buildUser();
    await WorkroomHelper.create({ workroomId: series.workroomId, userId: helper.id });
    await sale(series, await seat(series, 'Maud'), 6_800, NOW);
    const seen = await today(await actorOf(helper), NOW);
    expect([seen.sold, seen.series.map(({ slug }) => slug), seen.answerDays]).toEqual([null, [series.slug], 2]);
  });

  test('has nothing for who works in no workroom', async () => {
    await scene();
    expect(await today(await actorOf(await buildUser()), NOW)).toMatchObject({ waiting: [], series: [], sold: null });
  });

  test('asks the database as often for two hundred students as for one', async () => {
    const { teacher, series, parts: [gather] } = await scene();
    await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
    const actor = await actorOf(teacher);
    const grow = async (count: number): Promise<void> => {
      for (let index = 0; index < count; index += 1) {
        const own = await seat(series, `Student ${String(index)}`);
        await photo(own, gather, day('11-25'));
        await Tick.create({ enrolmentId: own.id, subject: 'step', itemKey: `${gather.publicId}:a`, isTicked: true, changedAt: day('11-25') });
      }
    };
    await grow(1);
    const forOne = await statementsOf(() => today(actor, NOW));
    await grow(199);
    expect(await statementsOf(() => today(actor, NOW))).toBe(forOne);
    expect(forOne).toBeLessThanOrEqual(9);
  });
});

test('the ledger is a workroom’s own, newest first, in one statement however long', async () => {
  const { series } = await scene();
  const own = await seat(series, 'Maud Ellery');
  const other = await buildSeries();
  await sale(other, await seat(other, 'Somebody'), 9_900, day('11-20'));
  await sale(series, own, 6_800, day('11-20'));
  await sale(series, own, 3_200, day('11-25'));
  const lines = await ledgerSince(series.workroomId, day('11-01'));
  expect(lines.map(({ kind, amountMinor, buyerName }) => [kind, amountMinor, buyerName])).toEqual([['fee', -256, 'Maud Ellery'], ['sale', 3_200, 'Maud Ellery'], ['fee', -544, 'Maud Ellery'], ['sale', 6_800, 'Maud Ellery']]);
  const forFour = await statementsOf(() => ledgerSince(series.workroomId, day('11-01')));
  for (let index = 0; index < 98; index += 1) await sale(series, own, 100, day('11-26'));
  expect([forFour, await statementsOf(() => ledgerSince(series.workroomId, day('11-01')))]).toEqual([1, 1]);
  expect(await ledgerSince(series.workroomId, day('11-25'))).toHaveLength(198);
});

test.each([
  ['2026-12-01T10:00:00Z', 'UTC', '2026-11-30T00:00:00.000Z'],
  ['2026-11-30T03:00:00Z', 'America/New_York', '2026-11-23T05:00:00.000Z'],
  ['2026-10-27T10:00:00Z', 'Europe/Berlin', '2026-10-25T23:00:00.000Z'],
])('Monday before %s begins on the clock of %s', (now, zone, monday) => {
  expect(lastMonday(new Date(now), zone).toISOString()).toBe(monday);
});
