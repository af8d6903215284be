import { describe, expect, test } from 'vitest';
import { VerdictForm } from '#contracts/bench.ts';
import { Mail, Media, PhotoNote, ProgressPhoto, User, WorkroomHelper, Workroom, type Enrolment, type Lesson, type Series } from '#server/models/index.ts';
import { waitingPhotos } from '#server/queries/bench/waiting-photos.ts';
import { photoThread } from '#server/queries/photos/photo-thread.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { giveVerdict } from '#server/use-cases/bench/give-verdict.ts';
import { actorOf, contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

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
    await giveVerdict(await contextFor(all.teacher), says(first, { verdict: 'mend-first', notes: NOTES }));
    await photoOf(all, new Date('2026-12-01T08:00:00Z'));
    const thread = await photoThread(all.seat.id, all.checkpoint.id);
    expect(thread.map(({ verdict, verdictBy, notes }) => [verdict, verdictBy, notes.length])).toEqual([['mend-first', 'Ilse Marrow', 1], ['waits', null, 0]]);
    expect(thread[0]?.notes[0]).toEqual({ words: 'Ends 14 and 15 change places here.', xPermille: 460, yPermille: 520 });
    expect((await seriesFor(await actorOf(all.student), all.series.slug, new Date()))?.parts[1]?.access.may).toBe('wait');
  });

  test('a helper may answer, and is named as one', async () => {
    const all = await scene();
    const wren = await buildUser({ name: 'Wren Okafor' });
    await WorkroomHelper.create({ workroomId: all.series.workroomId, userId: wren.id });
    const photo = await photoOf(all);
    await giveVerdict(await contextFor(wren), says(photo, { verdict: 'weave-on' }));
    expect((await photoThread(all.seat.id, all.checkpoint.id))[0]).toMatchObject({ verdictBy: 'Wren Okafor', byHelper: true });
  });

  test('of two who answer at once the first is heard, and the other is told who was', async () => {
    const all = await scene();
    const photo = await photoOf(all);
    const ctx = await contextFor(all.teacher);
    const results = await Promise.allSettled([giveVerdict(ctx, says(photo, { verdict: 'weave-on' })), giveVerdict(ctx, says(photo, { verdict: 'mend-first', words: 'Wind it again.' }))]);
    expect(results.map(({ status }) => status).toSorted()).toEqual(['fulfilled', 'rejected']);
    const refused = results.find((result): result is PromiseRejectedResult => result.status === 'rejected');
    expect(refused?.reason).toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('Ilse Marrow') });
    expect(await Mail.count()).toBe(1);
  });

  test('nobody else may answer: another teacher, the student, a visitor', async () => {
    const all = await scene();
    const photo = await photoOf(all);
    const other = found(await User.findByPk((await buildWorkroom()).ownerId));
    for (const ctx of [await contextFor(other), await contextFor(all.student)]) {
      await expect(giveVerdict(ctx, says(photo, { verdict: 'weave-on' }))).rejects.toMatchObject({ code: 'NOT_FOUND' });
    }
    await expect(giveVerdict(contextOf(null), says(photo, { verdict: 'weave-on' }))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
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

function found<T>(value: T | null): T {
  if (value === null) throw new RangeError('missing');
  return value;
}
