// A teacher writes to her class: whom it reaches, how, and that nobody gets it twice.
import { beforeEach, describe, expect, test } from 'vitest';
import { LettersForm, NoticeDraftForm, SendNoticeForm } from '#contracts/notices.ts';
import { runDueJobs } from '#server/jobs/run-due.ts';
import { REGISTERED } from '#server/jobs/handlers/index.ts';
import { AuditEntry, Job, LessonVisit, Mail, MyPieceRow, Notice, NoticeReceipt, PatternPiece, RefusedAddress, Workroom, WorkroomHelper, type Enrolment, type Lesson, type Series, type User } from '#server/models/index.ts';
import { recipientsOf } from '#server/queries/notices/recipients.ts';
import { chooseLetters } from '#server/use-cases/letters/choose-letters.ts';
import { handOutNotice } from '#server/use-cases/notices/hand-out-notice.ts';
import { keepNotice } from '#server/use-cases/notices/keep-notice.ts';
import { sendNotice } from '#server/use-cases/notices/send-notice.ts';
import { takeBackNotice } from '#server/use-cases/notices/take-back-notice.ts';
import { throwAwayNotice } from '#server/use-cases/notices/throw-away-notice.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

const NOW = new Date('2026-12-01T10:00:00Z');
const DAY_MS = 86_400_000;
const ago = (days: number): Date => new Date(NOW.getTime() - days * DAY_MS);
const later = (days: number) => contextOf(null, {}, new Date(NOW.getTime() + days * DAY_MS));

let ilse: User;
let series: Series;
let parts: Lesson[];

beforeEach(async () => {
  ilse = await buildUser({ name: 'Ilse Marrow' });
  const workroom = await buildWorkroom({ ownerId: ilse.id, handle: 'saltmarsh', postalAddress: 'Boat shed 3, Fenmouth' });
  series = await buildSeries({ workroomId: workroom.id, title: 'Low Tide: a woven wall hanging' });
  parts = [];
  for (const title of ['Gather and plan', 'Dress the loom']) parts.push(await buildLesson({ seriesId: series.id, title }));
});

async function student(name: string, given: { daysAgo?: number; letters?: boolean } & Partial<User> = {}): Promise<{ user: User; seat: Enrolment }> {
  const { daysAgo = 1, letters = false, ...more } = given;
  const user = await buildUser({ name, ...more });
  const seat = await buildEnrolment({ seriesId: series.id, userId: user.id, startedAt: ago(daysAgo) });
  if (letters) await chooseLetters(await contextFor(user), LettersForm.parse({ workroom: (await workroomOf()).publicId, source: 'account', notices: 'yes' }));
  return { user, seat };
}

async function workroomOf(): Promise<Workroom> {
  return Workroom.findByPk(series.workroomId, { rejectOnEmpty: true });
}

const draft = async (given: Record<string, string> = {}, user = ilse): Promise<Notice> =>
  keepNotice(await contextFor(user), NoticeDraftForm.parse({ series: series.slug, title: 'Bring a cork', words: 'Push it on the **corner nails**.', ...given }));
const send = async (notice: Notice, given: Record<string, string> = { when: 'now' }): Promise<Notice> => sendNotice(await contextFor(ilse), SendNoticeForm.parse({ notice: notice.publicId, ...given }));
const handOut = (notice: Notice, ctx = later(0)): Promise<void> => handOutNotice(ctx, { notice: notice.publicId });
const whoHasIt = async (): Promise<number[]> => (await NoticeReceipt.findAll({ order: ['userId'] })).map(({ userId }) => userId);

describe('writing one', () => {
  test('is for the teacher of the series alone', async () => {
    const input = NoticeDraftForm.parse({ series: series.slug, title: 'Hello', words: 'Hello.' });
    const wren = await buildUser();
    await WorkroomHelper.create({ workroomId: series.workroomId, userId: wren.id });
    const other = await buildUser();
    await buildWorkroom({ ownerId: other.id });
    await expect(keepNotice(contextOf(null), input)).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    for (const user of [wren, other, (await student('Maud')).user]) await expect(keepNotice(await contextFor(user), input)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await Notice.count()).toBe(0);
  });

  test('so is every other act on it', async () => {
    const notice = await draft();
    const other = await buildUser();
    await buildWorkroom({ ownerId: other.id });
    const ctx = await contextFor(other);
    const acts = [
      () => sendNotice(ctx, SendNoticeForm.parse({ notice: notice.publicId, when: 'now' })),
      () => takeBackNotice(ctx, notice.publicId),
      () => throwAwayNotice(ctx, notice.publicId),
      () => keepNotice(ctx, NoticeDraftForm.parse({ notice: notice.publicId, series: series.slug, title: 'a', words: 'b' })),
    ];
    for (const act of acts) await expect(act()).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await Notice.findAll()).toMatchObject([{ state: 'draft', title: 'Bring a cork' }]);
  });

  test.each([
    ['nothing', { words: '  ' }, 'words'],
    ['a hundred kilobytes', { words: 'a'.repeat(100_000) }, 'words'],
    ['no heading', { title: '' }, 'title'],
    ['a heading with a line break in it', { title: 'Hello\r\nBcc: all@weavers.example' }, 'title'],
    ['half a day', { still: '0.5' }, 'still'],
    ['part nought', { part: '0' }, 'part'],
  ])('with %s is refused at its field', (_words, given, field) => {
    const parsed = NoticeDraftForm.safeParse({ series: 'low-tide', title: 'Hello', words: 'Hello.', ...given });
    expect(parsed.success ? [] : parsed.error.issues.map(({ path }) => path[0])).toEqual([field]);
  });

  test.each([
    ['a heading in its words', '# Hello'],
    ['a step', '<Step id="a">Hello.</Step>'],
    ['markup of another kind', '<script>alert(1)</script>'],
    ['braces', '{1 + 1}'],
    ['an address that runs', '[press](javascript:alert(1))'],
    ['a place in a page', '[there](#there)'],
    ['an amount no plan gives', 'Take <Amount of="warp"/>.'],
  ])('with %s is refused, in words', async (_words, words) => {
    await expect(draft({ words })).rejects.toMatchObject({ code: 'VALIDATION', fields: { words: expect.stringMatching(/\.$/) } });
  });

  test('asks for a part the series has, and once for a postal address', async () => {
    await expect(draft({ part: '3' })).rejects.toMatchObject({ fields: { part: 'This series has no such part.' } });
    await (await workroomOf()).update({ postalAddress: '' });
    await expect(draft()).rejects.toMatchObject({ fields: { postalAddress: expect.stringContaining('asked for once') } });
    await draft({ postalAddress: 'Boat shed 3' });
    await draft();
    expect((await workroomOf()).postalAddress).toBe('Boat shed 3');
  });

  test('keeps it, and may write over it until it is sent', async () => {
    const notice = await draft();
    await draft({ notice: notice.publicId, title: 'Bring two corks', part: '2', still: '7' });
    expect(await Notice.findAll()).toMatchObject([{ title: 'Bring two corks', atLessonId: parts[1]?.id, stillDays: 7 }]);
    await send(notice);
    await expect(draft({ notice: notice.publicId })).rejects.toMatchObject({ code: 'CONFLICT' });
    expect(await NoticeReceipt.count()).toBe(0);
  });
});

describe('sending one', () => {
  test('twice sends it once', async () => {
    const notice = await draft();
    const results = await Promise.allSettled([send(notice), send(notice)]);
    expect(results.map(({ status }) => status).toSorted()).toEqual(['fulfilled', 'rejected']);
    expect([await Job.count(), await AuditEntry.count({ where: { action: 'send-notice' } })]).toEqual([1, 1]);
  });

  test('more than ten times a day is too often', async () => {
    for (let index = 0; index < 10; index += 1) await send(await draft());
    await expect(send(await draft())).rejects.toMatchObject({ code: 'RATE_LIMITED' });
  });

  test.each([
    ['', 'missing'], ['2026-02-30T09:00', 'missing'], ['2026-12-01T10:59', 'passed'], ['2028-01-01T09:00', 'a year away'],
  ])('at the moment “%s” is refused: %s', async (wall, why) => {
    await expect(send(await draft(), { when: 'later', wall })).rejects.toMatchObject({ fields: { wall: expect.stringContaining(why) } });
  });

  test('later goes by the workroom’s clock, waits until then, and can be taken back until then', async () => {
    await student('Maud');
    const notice = await draft();
    expect((await send(notice, { when: 'later', wall: '2026-12-04 09:00' })).sendAt?.toISOString()).toBe('2026-12-04T08:00:00.000Z');
    await handOut(notice, later(1));
    expect(await whoHasIt()).toEqual([]);
    await takeBackNotice(await contextFor(ilse), notice.publicId);
    await handOut(notice, later(4));
    expect(await whoHasIt()).toEqual([]);
    await send(notice, { when: 'later', wall: '2026-12-05T09:00' });
    await handOut(notice, later(3));
    expect(await whoHasIt()).toEqual([]);
    await handOut(notice, later(4));
    expect(await whoHasIt()).toHaveLength(1);
    await expect(takeBackNotice(await contextFor(ilse), notice.publicId)).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(throwAwayNotice(await contextFor(ilse), notice.publicId)).rejects.toMatchObject({ code: 'CONFLICT' });
  });

  test('a draft can be thrown away', async () => {
    await throwAwayNotice(await contextFor(ilse), (await draft()).publicId);
    expect(await Notice.count()).toBe(0);
  });
});

describe('who gets it', () => {
  test('everybody with a seat in that series, and nobody else', async () => {
    const [maud, jonas] = [await student('Maud'), await student('Jonas')];
    const closed = await student('Amara');
    await closed.seat.update({ state: 'closed' });
    await student('Teodor', { suspendedAt: NOW });
    await buildEnrolment({ seriesId: (await buildSeries({ workroomId: series.workroomId })).id });
    const notice = await draft();
    await send(notice);
    await handOut(notice);
    expect(await whoHasIt()).toEqual([maud.user.id, jonas.user.id].toSorted((a, b) => a - b));
    expect(await Notice.findAll()).toMatchObject([{ state: 'sent', sentAt: NOW }]);
  });

  test('those who have a part in hand, and those without a step for so many days', async () => {
    const [still, moving, ahead] = [await student('Maud', { daysAgo: 20 }), await student('Jonas', { daysAgo: 2 }), await student('Amara', { daysAgo: 20 })];
    await LessonVisit.create({ enrolmentId: ahead.seat.id, lessonId: parts[0]?.id ?? 0, finishedAt: ago(15) });
    const names = async (given: Record<string, string>): Promise<string[]> => (await recipientsOf(await draft(given), NOW)).map(({ name }) => name);
    expect(await names({})).toEqual(['Amara', 'Jonas', 'Maud']);
    expect(await names({ part: '1' })).toEqual(['Jonas', 'Maud']);
    expect(await names({ part: '2' })).toEqual(['Amara']);
    expect(await names({ still: '15' })).toEqual(['Amara', 'Maud']);
    expect(await names({ still: '16' })).toEqual(['Maud']);
    expect(await names({ part: '1', still: '16' })).toEqual(['Maud']);
    await parts[1]?.update({ takenOutAt: NOW });
    expect(await recipientsOf(await Notice.findOne({ where: { atLessonId: parts[1]?.id ?? 0 }, rejectOnEmpty: true }), NOW)).toEqual([]);
    expect([still, moving]).toHaveLength(2);
  });

  test('in her page always; by letter only who asked, has confirmed her address, and gets what is sent there', async () => {
    const asked = await student('Maud', { letters: true });
    await student('Jonas');
    await student('Amara', { letters: true, emailConfirmedAt: null });
    const refused = await student('Nell', { letters: true });
    await RefusedAddress.create({ addressKey: refused.user.emailKey, reply: '550' });
    const notice = await draft();
    await send(notice);
    await handOut(notice);
    expect(await whoHasIt()).toHaveLength(4);
    expect((await Mail.findAll()).map(({ toAddress, listKind, listWorkroomId }) => [toAddress, listKind, listWorkroomId])).toEqual([[asked.user.email, 'notices', series.workroomId]]);
    expect(await NoticeReceipt.count({ where: { byLetter: true } })).toBe(1);
  });

  test('each with the amounts of her own loom, in her own units', async () => {
    await PatternPiece.create({ seriesId: series.id, data: await lowTide(), revision: 1 });
    const maud = await student('Maud', { letters: true });
    await MyPieceRow.create({ enrolmentId: maud.seat.id, data: { widthMm: 300 } });
    await student('Jonas', { units: 'in' });
    await student('Wren');
    const notice = await draft({ words: 'It is <Amount of="width"/> wide.' });
    await send(notice);
    await handOut(notice);
    const said = (await NoticeReceipt.findAll({ order: ['id'] })).map(({ said: { blocks } }) => (blocks[0]?.kind === 'prose' ? blocks[0].runs[0]?.words : undefined));
    expect(new Set(said).size).toBe(3);
    expect(said.join(' ')).toMatch(/30\scm/);
    expect(said.join(' ')).toMatch(/3\/4\sin/);
    const mail = await Mail.findOne({ rejectOnEmpty: true });
    expect(JSON.stringify(mail.data)).toMatch(/30\scm/);
  });
});

describe('nobody gets it twice', () => {
  test('when four workers hand it out at once', async () => {
    for (let index = 0; index < 60; index += 1) await buildEnrolment({ seriesId: series.id });
    await student('Maud', { letters: true });
    const notice = await draft();
    await send(notice);
    await Promise.all([handOut(notice), handOut(notice), handOut(notice), handOut(notice)]);
    await handOut(notice);
    expect([await NoticeReceipt.count(), new Set(await whoHasIt()).size, await Mail.count()]).toEqual([61, 61, 1]);
  }, 60_000);

  test('when a worker died in the middle, and the next goes on where it was', async () => {
    const half = await student('Maud', { letters: true });
    await student('Jonas', { letters: true });
    const notice = await draft();
    await send(notice);
    // As it is left by a worker that died after its first step: on its way, one person served.
    await handOut(notice);
    await notice.reload();
    await NoticeReceipt.destroy({ where: { userId: half.user.id } });
    await Mail.destroy({ where: { userId: half.user.id } });
    await notice.update({ state: 'sending' });
    await handOut(notice);
    expect([await NoticeReceipt.count(), await Mail.count(), (await notice.reload()).state]).toEqual([2, 2, 'sent']);
  });

  test('by the worker itself: the job is done once, whoever claims it', async () => {
    await student('Maud', { letters: true });
    await send(await draft());
    await Job.update({ runAt: new Date(Date.now() - 1_000) }, { where: {} });
    const claimed = await Promise.all(['a', 'b', 'c'].map((owner) => runDueJobs(later(0), owner, REGISTERED)));
    expect(claimed.reduce((sum, count) => sum + count, 0)).toBe(1);
    expect([await NoticeReceipt.count(), await Mail.count(), await Job.count({ where: { state: 'done' } })]).toEqual([1, 1, 1]);
  });
});
