import { beforeEach, describe, expect, test } from 'vitest';
import { AnswerForm, HideReviewForm, ReviewForm } from '#contracts/review.ts';
import { AuditEntry, LessonVisit, Media, ProgressPhoto, Review, User, WorkroomHelper, type Enrolment, type Lesson, type Series } from '#server/models/index.ts';
import { listReviews } from '#server/queries/office/list-reviews.ts';
import { reviewsOf, type SeriesReviews } from '#server/queries/reviews/reviews-of.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { answerReview } from '#server/use-cases/reviews/answer-review.ts';
import { hideReview } from '#server/use-cases/reviews/hide-review.ts';
import { showReview } from '#server/use-cases/reviews/show-review.ts';
import { writeReview } from '#server/use-cases/reviews/write-review.ts';
import { actorOf, contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

let teacher: User;
let student: User;
let series: Series;
let lessons: Lesson[];
let seat: Enrolment;

beforeEach(async () => {
  teacher = await buildUser({ name: 'Ilse Marrow' });
  student = await buildUser({ name: 'Maud Ellery' });
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id });
  lessons = [await buildLesson({ seriesId: series.id }), await buildLesson({ seriesId: series.id, checkpoint: { ask: 'Show your slopes', look: [] } })];
  seat = await buildEnrolment({ userId: student.id, seriesId: series.id });
});

const said = (given: Partial<Record<'words' | 'again' | 'name', string>> = {}) => ReviewForm.parse({ series: series.slug, words: 'The slopes took me two evenings.', again: 'yes', name: 'Maud', ...given });

/** Part 1 said to be done, Part 2 woven on by the teacher. */
async function finish(): Promise<void> {
  const [first, second] = lessons;
  await LessonVisit.create({ enrolmentId: seat.id, lessonId: first?.id ?? 0, finishedAt: new Date('2026-11-20T10:00:00Z') });
  const media = await Media.create({ ownerId: student.id, kind: 'photo', state: 'ready', originalName: 'slopes.jpg', width: 4, height: 3, files: {}, detail: {} });
  await ProgressPhoto.create({ enrolmentId: seat.id, lessonId: second?.id ?? 0, mediaId: media.id, verdict: 'weave-on', verdictAt: new Date(), verdictById: teacher.id });
}

async function seenBy(user: User | null): Promise<SeriesReviews> {
  const actor = user === null ? null : await actorOf(user);
  const found = await seriesFor(actor, series.slug, new Date('2026-12-01T10:00:00Z'));
  if (found === null) throw new RangeError('no series');
  return reviewsOf(actor, found);
}

async function written(): Promise<string> {
  await finish();
  await writeReview(await contextFor(student), said());
  return (await Review.findOne({ rejectOnEmpty: true })).publicId;
}

describe('a review', () => {
  test('is written by who made every part, under the name she wishes, and everybody reads it', async () => {
    await written();
    const { shown, total, againCount } = await seenBy(null);
    expect(shown.map(({ name, words, wouldMakeAgain, answer }) => [name, words, wouldMakeAgain, answer])).toEqual([['Maud', 'The slopes took me two evenings.', true, '']]);
    expect([total, againCount]).toEqual([1, 1]);
    expect((await seenBy(student)).mine).toMatchObject({ words: 'The slopes took me two evenings.', hiddenWhy: '' });
  });

  test('is not asked for, nor taken, before every part is done', async () => {
    expect((await seenBy(student)).mayWrite).toBe(false);
    await expect(writeReview(await contextFor(student), said())).rejects.toMatchObject({ code: 'CONFLICT' });
    await finish();
    await buildLesson({ seriesId: series.id, publishedVersionId: null });
    await expect(writeReview(await contextFor(student), said())).rejects.toMatchObject({ code: 'CONFLICT' });
    expect(await Review.count()).toBe(0);
  });

  test('is taken from nobody without a seat, nor from who works for the series', async () => {
    await finish();
    const wren = await buildUser();
    await WorkroomHelper.create({ workroomId: series.workroomId, userId: wren.id });
    await buildEnrolment({ userId: wren.id, seriesId: series.id });
    await expect(writeReview(await contextFor(wren), said())).rejects.toMatchObject({ code: 'FORBIDDEN' });
    for (const user of [teacher, await buildUser()]) await expect(writeReview(await contextFor(user), said())).rejects.toMatchObject({ code: 'FORBIDDEN' });
    await expect(writeReview(contextOf(null), said())).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await seat.update({ state: 'closed' });
    await expect(writeReview(await contextFor(student), said())).rejects.toMatchObject({ code: 'FORBIDDEN' });
  });

  test('said once more takes the place of the first, also when both are sent at once', async () => {
    await finish();
    const ctx = await contextFor(student);
    await Promise.all([writeReview(ctx, said()), writeReview(ctx, said())]);
    await writeReview(ctx, said({ words: 'I would begin with the sky.', again: 'no' }));
    expect((await seenBy(null)).shown.map(({ words, wouldMakeAgain }) => [words, wouldMakeAgain])).toEqual([['I would begin with the sky.', false]]);
  });

  test.each([
    ['without words', { words: '  ' }, 'words', 'Your words are missing. Say what somebody should know who thinks of making it.'],
    ['without yes or no', { again: 'perhaps' }, 'again', 'Choose yes or no.'],
    ['without a name', { name: '' }, 'name', 'The name is missing. Write how you want to be called there; a first name is enough.'],
  ])('%s is refused at its field', (_what, given, field, sentence) => {
    const parsed = ReviewForm.safeParse({ series: 'low-tide', words: 'Good.', again: 'yes', name: 'Maud', ...given });
    expect(parsed.error?.issues.map(({ path, message }) => [path[0], message])).toEqual([[field, sentence]]);
  });
});

describe('the teacher’s answer', () => {
  test('stands under the review, and can be changed and taken back', async () => {
    const review = await written();
    const ctx = await contextFor(teacher);
    for (const words of ['Thank you, Maud.', 'Thank you. Part 5 says it now.']) await answerReview(ctx, AnswerForm.parse({ review, words }));
    expect((await seenBy(null)).shown[0]?.answer).toBe('Thank you. Part 5 says it now.');
    await answerReview(ctx, AnswerForm.parse({ review, words: ' ' }));
    expect((await seenBy(null)).shown[0]?.answer).toBe('');
  });

  test('is hers alone: not her helper’s, not another teacher’s, not the writer’s', async () => {
    const review = await written();
    const wren = await buildUser();
    await WorkroomHelper.create({ workroomId: series.workroomId, userId: wren.id });
    const other = await User.findByPk((await buildWorkroom()).ownerId, { rejectOnEmpty: true });
    for (const user of [wren, other, student]) {
      expect((await seenBy(user)).mayAnswer).toBe(false);
      await expect(answerReview(await contextFor(user), { review, words: 'Mine.' })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    }
  });
});

describe('the steward', () => {
  test('hides a review with a reason that its writer reads, and shows it again; both stand in the log', async () => {
    const review = await written();
    const pell = await contextFor(await buildUser({ isSteward: true }));
    await hideReview(pell, HideReviewForm.parse({ review, reason: 'It names another student.' }));
    expect((await seenBy(null)).shown).toEqual([]);
    expect((await seenBy(student)).mine?.hiddenWhy).toBe('It names another student.');
    await writeReview(await contextFor(student), said({ words: 'The slopes are worth it.' }));
    expect((await seenBy(null)).total).toBe(0);
    await expect(answerReview(await contextFor(teacher), { review, words: 'Hidden.' })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect((await listReviews(true, 1)).rows).toMatchObject([{ writer: 'Maud Ellery', shownName: 'Maud', words: 'The slopes are worth it.', hiddenWhy: 'It names another student.' }]);
    await showReview(pell, { review });
    expect((await seenBy(null)).shown).toHaveLength(1);
    expect((await AuditEntry.findAll({ order: ['id'] })).map(({ action, detail }) => [action, detail])).toEqual([['hide-review', { reason: 'It names another student.' }], ['show-review', {}]]);
  });

  test('alone does so: a teacher cannot take a review away', async () => {
    const review = await written();
    for (const ctx of [contextOf(null), await contextFor(student), await contextFor(teacher)]) {
      await expect(hideReview(ctx, { review, reason: 'I do not like it.' })).rejects.toMatchObject({ code: 'NOT_FOUND' });
      await expect(showReview(ctx, { review })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    }
    expect((await seenBy(null)).total).toBe(1);
  });
});
