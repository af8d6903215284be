import { describe, expect, test } from 'vitest';
import { AskForm } from '#contracts/questions.ts';
import { Enrolment, Media, ProgressPhoto, Question, type Lesson, type User } from '#server/models/index.ts';
import { benchDesk } from '#server/queries/bench/bench-desk.ts';
import { likeQuestions } from '#server/queries/questions/like-questions.ts';
import { questionInbox } from '#server/queries/questions/question-inbox.ts';
import { questionsOn } from '#server/queries/questions/questions-on.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { askQuestion } from '#server/use-cases/questions/ask-question.ts';
import { ask, asking, buildClass, type Class } from '../../support/asking.ts';
import { actorOf, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';

const now = new Date('2026-12-01T10:00:00Z');

async function seen(all: Class, who: User, part = 0): Promise<string[]> {
  const actor = await actorOf(who);
  const series = await seriesFor(actor, all.series.slug, now);
  const on = series?.parts[part];
  return series === null || on === undefined ? [] : (await questionsOn(actor, series, on)).map(({ words }) => words);
}

async function photoOf(owner: User, seat: Enrolment, lesson: Lesson): Promise<ProgressPhoto> {
  const media = await Media.create({ ownerId: owner.id, kind: 'photo', state: 'ready', originalName: 'loom.jpg', width: 4, height: 3, files: {}, detail: {} });
  return ProgressPhoto.create({ enrolmentId: seat.id, lessonId: lesson.id, mediaId: media.id, createdAt: now });
}

describe('a question', () => {
  test('is refused to a visitor, without a seat, in a part that is shut, and to the teacher herself', async () => {
    const all = await buildClass();
    await expect(askQuestion(contextOf(null), asking(all))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    for (const who of [await buildUser(), all.teacher, all.helper]) await expect(ask(all, who)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(ask(all, all.maud, { lesson: all.parts[2].publicId })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(ask(all, all.maud, { series: 'no-such-series' })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await all.maud.update({ emailConfirmedAt: null });
    await expect(ask(all, all.maud)).rejects.toMatchObject({ code: 'VALIDATION', says: expect.stringContaining('Confirm your address first') });
    expect(await Question.count()).toBe(0);
  });

  test('about a step the text does not have is refused at its field', async () => {
    const all = await buildClass();
    await expect(ask(all, all.maud, { step: 'no-such-step' })).rejects.toMatchObject({ fields: { step: expect.stringContaining('no longer in the text') } });
    await expect(ask(all, all.maud, { step: 'tie-on' })).resolves.toMatchObject({ stepId: 'tie-on' });
  });

  test('carries a photo of hers, which she and whoever teaches or helps see, and the class does not', async () => {
    const all = await buildClass();
    const lesson = all.parts[1];
    const photo = await photoOf(all.maud, all.maudsSeat, lesson);
    const about = { lesson: lesson.publicId, photo: photo.publicId, to: 'class' };
    const question = await ask(all, all.maud, about);
    expect((await ask(all, all.maud, { ...about, photo: '' })).id).not.toBe(question.id);
    const photosSeen = async (who: User): Promise<unknown[]> => {
      const actor = await actorOf(who);
      const series = await seriesFor(actor, all.series.slug, now);
      const on = series?.parts[1];
      return series === null || on === undefined ? [] : (await questionsOn(actor, series, on)).map((one) => one.photo?.publicId ?? null).toSorted();
    };
    for (const who of [all.maud, all.teacher, all.helper]) expect(await photosSeen(who)).toEqual([photo.publicId, null]);
    expect(await photosSeen(all.jonas)).toEqual([null, null]);
    expect((await questionInbox(await actorOf(all.teacher))).waiting.map((one) => one.photo?.publicId ?? null)).toEqual([photo.publicId, null]);
    const { inHand } = await benchDesk(await actorOf(all.teacher), photo.publicId);
    expect(inHand?.asked).toMatchObject([{ question: question.publicId, photo: photo.publicId, isAnswered: false }]);
  });

  test('about another’s photo, or one of another part, is refused at its field', async () => {
    const all = await buildClass();
    const jonas = await Enrolment.findOne({ where: { userId: all.jonas.id }, rejectOnEmpty: true });
    const [foreign, elsewhere] = [await photoOf(all.jonas, jonas, all.parts[1]), await photoOf(all.maud, all.maudsSeat, all.parts[0])];
    for (const photo of [foreign.publicId, elsewhere.publicId, 'nothing']) {
      await expect(ask(all, all.maud, { lesson: all.parts[1].publicId, photo })).rejects.toMatchObject({ fields: { photo: expect.stringContaining('not among yours') } });
    }
    expect(await Question.count()).toBe(0);
  });

  test('sent twice is one question, also when both come at once', async () => {
    const all = await buildClass();
    const both = await Promise.all([ask(all, all.maud), ask(all, all.maud)]);
    expect(new Set(both.map(({ publicId }) => publicId)).size).toBe(1);
    expect(await Question.count()).toBe(1);
  });

  test('that is the twenty-first to wait is told to wait its turn', async () => {
    const all = await buildClass();
    for (let n = 1; n <= 20; n += 1) await ask(all, all.maud, { words: `Question ${n}` });
    await expect(ask(all, all.maud, { words: 'One more' })).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('20 questions of yours wait') });
  });

  test('to the teacher is seen by both and her helper, one to the class by whoever has that part open', async () => {
    const all = await buildClass();
    await ask(all, all.maud, { words: 'Between us?' });
    await ask(all, all.maud, { words: 'For all?', to: 'class' });
    for (const who of [all.maud, all.teacher, all.helper]) expect((await seen(all, who)).toSorted()).toEqual(['Between us?', 'For all?']);
    expect(await seen(all, all.jonas)).toEqual(['For all?']);
    expect(await seen(all, await buildUser())).toEqual([]);
    await all.parts[0].update({ opens: { rule: 'after-seat', days: 900 } });
    expect(await seen(all, all.jonas)).toEqual([]);
  });
});

describe('what the class asked before', () => {
  const found = async (all: Class, who: User, words: string): Promise<string[]> => {
    const actor = await actorOf(who);
    const series = await seriesFor(actor, all.series.slug, now);
    return series === null ? [] : (await likeQuestions(actor, series, words)).map((question) => `${question.partNumber}: ${question.words}`);
  };

  test('is found by like words, the likest first, and only in parts she has open', async () => {
    const all = await buildClass();
    await ask(all, all.maud, { words: 'Why does the edge pull in when I weave?', to: 'class' });
    await ask(all, all.maud, { words: 'How far does the edge pull in at the end of a row?', to: 'class', lesson: all.parts[1].publicId });
    await ask(all, all.maud, { words: 'Which wool is softest?', to: 'class' });
    await ask(all, all.maud, { words: 'My edges pull in, between us', to: 'teacher' });
    expect(await found(all, all.jonas, 'Edges pulling in at every row end')).toEqual(['2: How far does the edge pull in at the end of a row?', '1: Why does the edge pull in when I weave?']);
    await all.parts[1].update({ opens: { rule: 'after-seat', days: 900 } });
    expect(await found(all, all.jonas, 'Edges pulling in at every row end')).toEqual(['1: Why does the edge pull in when I weave?']);
    expect(await found(all, await buildUser(), 'Edges pulling')).toEqual([]);
  });

  test('is not disturbed by signs that mean something to the search', async () => {
    const all = await buildClass();
    await ask(all, all.maud, { words: 'Why does the edge pull in?', to: 'class' });
    for (const words of ['+edge -pull ~* ("', "edge'); DROP TABLE questions; --", '@5 <>*', '%_']) await expect(found(all, all.jonas, words)).resolves.toBeInstanceOf(Array);
    expect(await found(all, all.jonas, '"+edges" (pull*)')).toHaveLength(1);
  });
});

describe('what is typed', () => {
  const typed = (given: Record<string, unknown>) => AskForm.safeParse({ series: 'low-tide', lesson: '0'.repeat(26), to: 'class', words: 'Why?', ...given });
  test.each([
    ['nothing', { words: '' }, 'Your question is missing. Write what you see on your loom and what you want to know.'],
    ['blanks and signs nobody sees', { words: ' \u200b\u2060 \u202e\n' }, 'Your question is missing. Write what you see on your loom and what you want to know.'],
    ['a hundred thousand letters', { words: 'x'.repeat(100_000) }, 'At most 2000 characters work here.'],
    ['no choice of who sees it', { to: 'everybody' }, 'Choose who sees it.'],
  ])('%s is told of at its field', (_what, given, sentence) => {
    expect(typed(given).error?.issues.map(({ message }) => message)).toContain(sentence);
  });

  test('markup stays the words it is, and hidden signs go', () => {
    expect(typed({ words: '<b>Why?</b>\r\n<script>alert(1)</script>\u0000\u202e' }).data?.words).toBe('<b>Why?</b>\n<script>alert(1)</script>');
  });
});
