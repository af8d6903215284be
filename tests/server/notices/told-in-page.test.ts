// What a person is told in her page, beside the letters.
import { beforeEach, describe, expect, test } from 'vitest';
import { VerdictForm } from '#contracts/bench.ts';
import { actorOfToken, beginSession } from '#server/auth/sessions.ts';
import { Mail, Media, NoticeReceipt, ProgressPhoto, User, type Enrolment, type Lesson, type Series } from '#server/models/index.ts';
import { myNotices, unreadNotices } from '#server/queries/notices/my-notices.ts';
import { markRead } from '#server/use-cases/notices/mark-read.ts';
import { tellOpenings } from '#server/use-cases/openings/tell-openings.ts';
import { actorOf, contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { giveVerdict } from '../../support/verdicts.ts';

const NOW = new Date('2026-12-01T10:00:00Z');

let teacher: User;
let series: Series;
let student: User;
let seat: Enrolment;
let asked: Lesson;

beforeEach(async () => {
  teacher = await buildUser({ name: 'Ilse Marrow' });
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id, title: 'Low Tide: a woven wall hanging' });
  student = await buildUser({ name: 'Maud Ellery' });
  asked = await buildLesson({ seriesId: series.id, checkpoint: { ask: 'Show your warped loom', look: [] } });
  seat = await buildEnrolment({ seriesId: series.id, userId: student.id, startedAt: new Date('2026-11-26T10:00:00Z') });
});

const look = (): Promise<void> => tellOpenings(contextOf(null, {}, NOW));
const titles = async (user: User): Promise<string[]> => (await myNotices(await actorOf(user), 1)).rows.map(({ said }) => said.title);

async function answer(verdict: 'weave-on' | 'mend-first'): Promise<void> {
  const media = await Media.create({ ownerId: student.id, kind: 'photo', state: 'ready', originalName: 'loom.jpg', width: 4, height: 3, files: {}, detail: {} });
  const photo = await ProgressPhoto.create({ enrolmentId: seat.id, lessonId: asked.id, mediaId: media.id });
  await giveVerdict(await contextFor(teacher), VerdictForm.parse({ photo: photo.publicId, verdict, words: 'Wind the two at the left again.' }));
}

describe('a student is told in her page', () => {
  test('that a part has opened, in the words of the letter and without what makes it one, once however many look', async () => {
    await buildLesson({ seriesId: series.id, title: 'Rya fringe', opens: { rule: 'after-seat', days: 3 } });
    await Promise.all([look(), look(), look()]);
    await look();
    const { rows } = await myNotices(await actorOf(student), 1);
    expect(rows.map(({ kind, said, byLetter, isRead }) => [kind, said.title, byLetter, isRead])).toEqual([['opening', 'Part 2 of Low Tide is open', true, false]]);
    expect(rows[0]?.said.blocks).toEqual([
      { kind: 'words', words: 'Part 2 of Low Tide is open to you now. What is open stays open: take the time you need.' },
      { kind: 'list', items: ['Part 2, Rya fringe'] },
    ]);
    expect(rows[0]?.said.act).toEqual({ label: 'Go to Part 2', href: `/series/${series.slug}/2` });
    expect(await Mail.count({ where: { template: 'parts-opened' } })).toBe(1);
  });

  test('what was said of her photo, newest first', async () => {
    await answer('mend-first');
    await answer('weave-on');
    expect(await titles(student)).toEqual(['Weave on: Ilse Marrow has seen your photo', 'Mend first: Ilse Marrow has seen your photo']);
  });

  test('and nobody else is', async () => {
    await answer('weave-on');
    expect(await titles(teacher)).toEqual([]);
    expect(await NoticeReceipt.count()).toBe(1);
  });
});

describe('marking as read', () => {
  const ids = async (): Promise<string[]> => (await myNotices(await actorOf(student), 1)).rows.map(({ publicId }) => publicId);

  test('needs somebody signed in, and is only for what is hers', async () => {
    await answer('weave-on');
    const [notice = ''] = await ids();
    await expect(markRead(contextOf(null), { notice })).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(markRead(await contextFor(teacher), { notice })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await markRead(await contextFor(teacher), { notice: 'all' })).toBe(0);
    expect(await NoticeReceipt.count({ where: { readAt: null } })).toBe(1);
  });

  test('takes one off the count she sees on every page, and all take the rest', async () => {
    for (let index = 0; index < 3; index += 1) await answer('mend-first');
    const countShown = async (): Promise<number | undefined> => (await actorOfToken((await beginSession(student.id, 'student', '', new Date())).token))?.unreadNotices;
    expect(await countShown()).toBe(3);
    const [notice = ''] = await ids();
    expect(await markRead(await contextFor(student), { notice })).toBe(1);
    expect(await markRead(await contextFor(student), { notice })).toBe(0);
    expect(await countShown()).toBe(2);
    expect(await markRead(await contextFor(student), { notice: 'all' })).toBe(2);
    expect(await countShown()).toBe(0);
    expect(await unreadNotices(await actorOf(student), 3)).toEqual([]);
  });
});

test('a long list comes in pages of twenty', async () => {
  await NoticeReceipt.bulkCreate(Array.from({ length: 45 }, (_, index) => ({
    userId: student.id, kind: 'opening' as const, byLetter: true, dedupeKey: `k${index}`, said: { title: `No. ${index}`, from: '', blocks: [], act: null },
  })));
  const actor = await actorOf(student);
  expect((await myNotices(actor, 1)).rows[0]?.said.title).toBe('No. 44');
  expect((await myNotices(actor, 9))).toMatchObject({ page: 3, pages: 3, rows: { length: 5 } });
});
