import { describe, expect, test } from 'vitest';
import { VerdictForm } from '#contracts/bench.ts';
import { verdict } from '#server/mail/templates/bench.ts';
import { HeldVerdict, Job, Mail, Media, PhotoNote, ProgressPhoto, User, WorkroomHelper, Workroom, type Enrolment, type Lesson, type Series } from '#server/models/index.ts';
import { benchDesk } from '#server/queries/bench/bench-desk.ts';
import { answeredLately, heldBy } from '#server/queries/bench/said-lately.ts';
import { waitingPhotos } from '#server/queries/bench/waiting-photos.ts';
import { photoThread } from '#server/queries/photos/photo-thread.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { holdVerdict } from '#server/use-cases/bench/hold-verdict.ts';
import { bringBackVerdict } from '#server/use-cases/bench/send-verdict.ts';
import { takeBackVerdict } from '#server/use-cases/bench/take-back-verdict.ts';
import { actorOf, contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { giveVerdict, sendVerdicts } from '../../support/verdicts.ts';

interface Scene { teacher: User; student: User; series: Series; checkpoint: Lesson; next: Lesson; seat: Enrolment }

async function scene(): Promise<Scene> {
  const teacher = await buildUser({ name: 'Ilse Marrow' });
  const series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id });
  const checkpoint = await buildLesson({ seriesId: series.id, checkpoint: { ask: 'Show your warped loom', look: [] } });
  const next = await buildLesson({ seriesId: series.id, opens: { rule: 'after-verdict', lesson: checkpoint.publicId } });
  const student = await buildUser({ name: 'Maud Ellery' });
  return { teacher, student, series, checkpoint, next, seat: await buildEnrolment({ userId: student.id, seriesId: series.id }) };
}

async function photoOf({ student, seat, checkpoint }: Scene, createdAt = new Date('2026-11-30T08:00:00Z')): Promise<ProgressPhoto> {
  const media = await Media.create({ ownerId: student.id, kind: 'photo', state: 'ready', originalName: 'loom.jpg', width: 4, height: 3, files: {}, detail: {} });
  return ProgressPhoto.create({ enrolmentId: seat.id, lessonId: checkpoint.id, mediaId: media.id, createdAt });
}

async function helperOf({ series }: Scene, name: string): Promise<User> {
  const helper = await buildUser({ name });
  await WorkroomHelper.create({ workroomId: series.workroomId, userId: helper.id });
  return helper;
}

const says = (photo: ProgressPhoto, given: Record<string, string>) => VerdictForm.parse({ photo: photo.publicId, ...given });
const NOTES = JSON.stringify([{ words: 'Ends 14 and 15 change places here.', xPermille: 460, yPermille: 520 }]);

describe('a verdict', () => {
  test('weave on opens the next part and writes to the student, once', async () => {
    const all = await scene();
    const photo = await photoOf(all);
    const maud = await actorOf(all.student);
    const now = new Date('2026-12-01T10:00:00Z');
    expect((await seriesFor(maud, all.series.slug, now))?.parts[1]?.access).toMatchObject({ may: 'wait' });
    await giveVerdict(await contextFor(all.teacher), says(photo, { verdict: 'weave-on' }));
    expect((await seriesFor(maud, all.series.slug, now))?.parts[1]?.access).toEqual({ may: 'follow' });
    const letters = await Mail.findAll();
    expect(letters.map(({ template, toAddress, data }) => [template, toAddress, data['openedParts']])).toEqual([['verdict', all.student.email, [2]]]);
  });

  test('mend first keeps the next part shut, keeps the pins, and a second photo goes on in the same thread', async () => {
    const all = await scene();
    const first = await photoOf(all);
    await giveVerdict(await contextFor(all.teacher), says(first, { verdict: 'mend-first', notes: NOTES, see: 'fault:crossed-ends' }));
    await photoOf(all, new Date('2026-12-01T08:00:00Z'));
    const thread = await photoThread(all.seat.id, all.checkpoint.id);
    expect(thread.map(({ verdict, verdictBy, notes }) => [verdict, verdictBy, notes.length])).toEqual([['mend-first', 'Ilse Marrow', 1], ['waits', null, 0]]);
    expect(thread.map(({ see }) => see)).toEqual(['fault:crossed-ends', null]);
    const letter = await Mail.findOne({ rejectOnEmpty: true });
    expect(letter.data['see']).toMatchObject({ href: expect.stringMatching(/^\/handbook\//) });
    expect(verdict.compose(letter.data, { publicUrl: 'https://fellmark.example' }).blocks).toContainEqual({ kind: 'prose', runs: [{ words: 'How to mend it: ' }, { words: expect.stringContaining('how to mend it'), href: expect.stringMatching(/^\/handbook\//) }] });
    expect(thread[0]?.notes[0]).toEqual({ words: 'Ends 14 and 15 change places here.', shot: 1, xPermille: 460, yPermille: 520 });
    expect((await seriesFor(await actorOf(all.student), all.series.slug, new Date()))?.parts[1]?.access.may).toBe('wait');
  });

  test('a helper may answer, and is named as one', async () => {
    const all = await scene();
    const wren = await helperOf(all, 'Wren Okafor');
    const photo = await photoOf(all);
    await giveVerdict(await contextFor(wren), says(photo, { verdict: 'weave-on' }));
    expect(await answeredLately(await actorOf(all.teacher))).toMatchObject([{ studentName: 'Maud Ellery', partNumber: 1, verdict: 'weave-on', by: 'Wren Okafor', byHelper: true }]);
    expect((await photoThread(all.seat.id, all.checkpoint.id))[0]).toMatchObject({ verdictBy: 'Wren Okafor', byHelper: true });
  });

  test('of two who answer at once the first is heard, and the other is told who was', async () => {
    const all = await scene();
    const photo = await photoOf(all);
    const helpers = [await helperOf(all, 'Wren Okafor'), await helperOf(all, 'Nell Fane')];
    const [wren, nell] = await Promise.all(helpers.map((helper) => contextFor(helper)));
    const results = await Promise.allSettled([holdVerdict(found(wren), says(photo, { verdict: 'weave-on' })), holdVerdict(found(nell), says(photo, { verdict: 'mend-first', words: 'Wind it again.' }))]);
    expect(results.map(({ status }) => status).toSorted()).toEqual(['fulfilled', 'rejected']);
    const refused = results.find((result): result is PromiseRejectedResult => result.status === 'rejected');
    expect(refused?.reason).toMatchObject({ code: 'CONFLICT', says: expect.stringMatching(/^(?:Wren Okafor|Nell Fane) answered this photo in the meantime/) });
    await sendVerdicts();
    expect(await Mail.count()).toBe(1);
  });

  test('nobody else may answer: another teacher, the student, a visitor', async () => {
    const all = await scene();
    const photo = await photoOf(all);
    const other = found(await User.findByPk((await buildWorkroom()).ownerId));
    for (const ctx of [await contextFor(other), await contextFor(all.student)]) {
      await expect(holdVerdict(ctx, says(photo, { verdict: 'weave-on' }))).rejects.toMatchObject({ code: 'NOT_FOUND' });
      await expect(takeBackVerdict(ctx, { photo: photo.publicId })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    }
    await expect(holdVerdict(contextOf(null), says(photo, { verdict: 'weave-on' }))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    expect(await PhotoNote.count()).toBe(0);
  });

  test('the queue shows only one’s own workrooms, oldest first', async () => {
    const [mine, foreign] = [await scene(), await scene()];
    await photoOf(mine, new Date('2026-11-30T12:00:00Z'));
    await photoOf(mine, new Date('2026-11-29T12:00:00Z'));
    await photoOf(foreign);
    const queue = await waitingPhotos(await actorOf(mine.teacher));
    expect(queue.map(({ postedAt, partNumber }) => [postedAt.toISOString(), partNumber])).toEqual([['2026-11-29T12:00:00.000Z', 1], ['2026-11-30T12:00:00.000Z', 1]]);
    expect(await Workroom.count()).toBe(2);
  });
});

describe('a verdict on its way', () => {
  const WORDS = { verdict: 'mend-first', words: 'Wind the left edge again.', notes: NOTES };

  test('is told to nobody for ten seconds, and leaves the bench at once', async () => {
    const all = await scene();
    const photo = await photoOf(all);
    const teacher = await contextFor(all.teacher);
    await holdVerdict(teacher, says(photo, WORDS));
    expect(await Mail.count()).toBe(0);
    expect((await photoThread(all.seat.id, all.checkpoint.id))[0]).toMatchObject({ verdict: 'waits', verdictWords: '', notes: [] });
    expect(await waitingPhotos(found(teacher.actor))).toEqual([]);
    expect(await heldBy(found(teacher.actor))).toEqual([{ photo: photo.publicId, studentName: 'Maud Ellery', verdict: 'mend-first' }]);
    const job = await Job.findOne({ where: { type: 'send-verdict' }, rejectOnEmpty: true });
    expect(job.runAt.getTime() - teacher.clock.now().getTime()).toBe(10_000);
  });

  test('is taken back: nothing is sent, and the photo waits again with the words and pins that were set', async () => {
    const all = await scene();
    const photo = await photoOf(all);
    const teacher = await contextFor(all.teacher);
    await holdVerdict(teacher, says(photo, WORDS));
    await takeBackVerdict(teacher, { photo: photo.publicId });
    await sendVerdicts();
    expect([await Mail.count(), await PhotoNote.count()]).toEqual([0, 0]);
    const { inHand } = await benchDesk(found(teacher.actor), null);
    expect([inHand?.photo.publicId, inHand?.takenBack]).toEqual([photo.publicId, { words: WORDS.words, notes: JSON.parse(NOTES), see: null, by: 'Ilse Marrow', byOther: false }]);
    expect(await heldBy(found(teacher.actor))).toEqual([]);
  });

  test('said anew after it was taken back, it goes out as it was said last, in one letter', async () => {
    const all = await scene();
    const photo = await photoOf(all);
    const teacher = await contextFor(all.teacher);
    await holdVerdict(teacher, says(photo, WORDS));
    await takeBackVerdict(teacher, { photo: photo.publicId });
    await holdVerdict(teacher, says(photo, { verdict: 'weave-on' }));
    await Promise.all([sendVerdicts(), sendVerdicts()]);
    expect((await photoThread(all.seat.id, all.checkpoint.id)).map(({ verdict, notes }) => [verdict, notes.length])).toEqual([['weave-on', 0]]);
    expect((await Mail.findAll()).map(({ data }) => data['verdict'])).toEqual(['weave-on']);
    expect(await HeldVerdict.count()).toBe(0);
  });

  test('cannot be taken back once it is out, nor by somebody else', async () => {
    const all = await scene();
    const photo = await photoOf(all);
    const wren = await contextFor(await helperOf(all, 'Wren Okafor'));
    const teacher = await contextFor(all.teacher);
    await holdVerdict(wren, says(photo, { verdict: 'weave-on' }));
    await expect(takeBackVerdict(teacher, { photo: photo.publicId })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await sendVerdicts();
    await expect(takeBackVerdict(wren, { photo: photo.publicId })).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(holdVerdict(teacher, says(photo, { verdict: 'weave-on' }))).rejects.toMatchObject({ code: 'CONFLICT', says: 'Wren Okafor answered this photo in the meantime: weave on. Yours was not sent.' });
    expect(await Mail.count()).toBe(1);
  });

  test('that could not be sent comes back to the bench, and the teacher sees what a helper had written', async () => {
    const all = await scene();
    const photo = await photoOf(all);
    await holdVerdict(await contextFor(await helperOf(all, 'Wren Okafor')), says(photo, WORDS));
    await bringBackVerdict(contextOf(null), { photoId: photo.id, round: 1 });
    const { inHand } = await benchDesk(await actorOf(all.teacher), null);
    expect(inHand?.takenBack).toMatchObject({ words: WORDS.words, by: 'Wren Okafor', byOther: true });
  });
});

describe('the queue', () => {
  test('puts the answer that is due first in front, where workrooms promise differently', async () => {
    const [slow, quick] = [await scene(), await scene()];
    await Workroom.update({ answerDays: 1 }, { where: { id: quick.series.workroomId } });
    const late = await photoOf(slow, new Date('2026-11-30T12:00:00Z'));
    const soon = await photoOf(quick, new Date('2026-11-30T20:00:00Z'));
    const wren = await helperOf(slow, 'Wren Okafor');
    await WorkroomHelper.create({ workroomId: quick.series.workroomId, userId: wren.id });
    expect((await waitingPhotos(await actorOf(wren))).map(({ publicId, answerDays }) => [publicId, answerDays])).toEqual([[soon.publicId, 1], [late.publicId, 2]]);
  });

  test('shows what she has shown before in this series, the newest first', async () => {
    const all = await scene();
    const elsewhere = await photoOf({ ...all, checkpoint: all.next }, new Date('2026-11-28T08:00:00Z'));
    const first = await photoOf(all, new Date('2026-11-29T08:00:00Z'));
    const inHand = await photoOf(all, new Date('2026-11-30T08:00:00Z'));
    const desk = await benchDesk(await actorOf(all.teacher), inHand.publicId);
    expect(desk.inHand?.placeInThread).toBe(1);
    expect((await benchDesk(await actorOf(all.teacher), first.publicId)).inHand).toMatchObject({ placeInThread: 0, earlier: [{ publicId: elsewhere.publicId }] });
    expect(desk.inHand?.earlier.map(({ publicId, partNumber }) => [publicId, partNumber])).toEqual([[first.publicId, 1], [elsewhere.publicId, 2]]);
  });
});

describe('what a verdict must say', () => {
  const photo = '0'.repeat(26);
  test.each([
    ['a word that is no verdict', { verdict: 'perhaps' }, 'verdict', 'Choose weave on or mend first.'],
    ['no verdict', {}, 'verdict', 'Choose weave on or mend first.'],
    ['mend first without a word', { verdict: 'mend-first' }, 'words', 'Say what to mend: in words, or with a pin on the photo.'],
    ['too many words', { verdict: 'weave-on', words: 'x'.repeat(2_001) }, 'words', 'At most 2,000 characters work here.'],
    ['pins that are no pins', { verdict: 'weave-on', notes: '{' }, 'notes', 'The pins could not be read. Set them again.'],
    ['a photo full of pins', { verdict: 'weave-on', notes: JSON.stringify(Array.from({ length: 21 }, () => ({ words: 'a', xPermille: 1, yPermille: 1 }))) }, 'notes', 'At most 20 pins work on one photo.'],
  ])('%s is refused at its field', (_words, given, field, sentence) => {
    const parsed = VerdictForm.safeParse({ photo, ...given });
    expect(parsed.success ? [] : parsed.error.issues.map(({ path, message }) => [path[0], message])).toContainEqual([field, sentence]);
  });

  test('a pin outside the photo is refused', () => {
    expect(VerdictForm.safeParse({ photo, verdict: 'weave-on', notes: JSON.stringify([{ words: 'a', xPermille: 1_001, yPermille: 0 }]) }).success).toBe(false);
  });
});

function found<T>(value: T | null | undefined): T {
  if (value === null || value === undefined) throw new RangeError('missing');
  return value;
}
