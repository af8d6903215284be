import { describe, expect, test } from 'vitest';
import { AnswerForm } from '#contracts/questions.ts';
import { AuditEntry, Enrolment, Mail, NoticeReceipt, Question, QuestionAnswer, WordReport, WorkroomHelper, type User } from '#server/models/index.ts';
import { listReports } from '#server/queries/office/list-reports.ts';
import { countWaitingQuestions, questionInbox } from '#server/queries/questions/question-inbox.ts';
import { answerQuestion } from '#server/use-cases/questions/answer-question.ts';
import { changeWords } from '#server/use-cases/questions/change-words.ts';
import { forgetTakenOutWords } from '#server/use-cases/questions/forget-taken-out-words.ts';
import { putBackWords } from '#server/use-cases/questions/put-back-words.ts';
import { reportWords } from '#server/use-cases/questions/report-words.ts';
import { settleReport } from '#server/use-cases/questions/settle-report.ts';
import { takeOutWords } from '#server/use-cases/questions/take-out-words.ts';
import { ask, buildClass } from '../../support/asking.ts';
import { actorOf, contextFor, contextOf } from '../../support/context.ts';
import { buildUser, buildWorkroom } from '../../support/factories.ts';

const says = (question: Question, words = 'Leave the weft a little bow in every row.', seen = 0) => AnswerForm.parse({ question: question.publicId, words, seen: String(seen) });
const answer = async (who: User, question: Question, words?: string, seen?: number) => answerQuestion(await contextFor(who), says(question, words, seen));
const theAnswer = (): Promise<QuestionAnswer> => QuestionAnswer.findOne({ rejectOnEmpty: true });
const otherTeacher = async (): Promise<User> => {
  const user = await buildUser();
  await buildWorkroom({ ownerId: user.id });
  return user;
};

describe('an answer', () => {
  test('is refused to everybody but the teacher and her helpers', async () => {
    const all = await buildClass();
    const question = await ask(all, all.maud, { to: 'class' });
    await expect(answerQuestion(contextOf(null), says(question))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    for (const who of [all.maud, all.jonas, await otherTeacher(), await buildUser({ isSteward: true })]) await expect(answer(who, question)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await WorkroomHelper.destroy({ where: { userId: all.helper.id } });
    await expect(answer(all.helper, question)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await QuestionAnswer.count()).toBe(0);
  });

  test('goes to the asker by letter when she wanted one, and says that a helper gave it', async () => {
    const all = await buildClass();
    const question = await ask(all, all.maud, { letter: 'yes', lesson: all.parts[1].publicId });
    await answer(all.helper, question);
    await answer(all.teacher, question, 'And beat less.', 1);
    const letters = await Mail.findAll({ order: ['id'] });
    expect(letters.map(({ template, toAddress, data }) => [template, toAddress, data['partNumber'], data['byName'], data['helpsName']])).toEqual([
      ['question-answered', all.maud.email, 2, 'Wren Okafor', 'Ilse Marrow'],
      ['question-answered', all.maud.email, 2, 'Ilse Marrow', null],
    ]);
  });

  test('is told in her page in any case, once, with the way to it', async () => {
    const all = await buildClass();
    await answer(all.teacher, await ask(all, all.maud));
    const told = await NoticeReceipt.findAll();
    expect(told).toMatchObject([{ userId: all.maud.id, kind: 'answer', byLetter: false, seriesId: all.series.id }]);
    expect(told[0]?.said).toMatchObject({ title: 'Ilse Marrow answered your question', act: { href: expect.stringMatching(new RegExp(`^/series/${all.series.slug}/1#q-[0-9a-z]{26}$`)) } });
  });

  test('makes no letter when she wanted none, or has no seat any more', async () => {
    const all = await buildClass();
    await answer(all.teacher, await ask(all, all.maud));
    const wanted = await ask(all, all.maud, { words: 'And now?', letter: 'yes' });
    await Enrolment.update({ state: 'closed' }, { where: { id: all.maudsSeat.id } });
    await answer(all.teacher, wanted);
    expect(await Mail.count()).toBe(0);
  });

  test('sent twice is one answer and one letter, also when both come at once', async () => {
    const all = await buildClass();
    const question = await ask(all, all.maud, { letter: 'yes' });
    await Promise.all([answer(all.teacher, question), answer(all.teacher, question)]);
    expect([await QuestionAnswer.count(), await Mail.count(), await NoticeReceipt.count()]).toEqual([1, 1, 1]);
  });

  test('written while another one answered is not sent before it was read', async () => {
    const all = await buildClass();
    const question = await ask(all, all.maud);
    await answer(all.helper, question);
    await expect(answer(all.teacher, question, 'Mine')).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('Wren Okafor answered in the meantime') });
    await answer(all.teacher, question, 'Mine', 1);
    expect(await QuestionAnswer.count()).toBe(2);
  });
});

describe('the inbox', () => {
  test('shows what waits in one’s own workrooms, oldest first, and then what was answered last', async () => {
    const all = await buildClass();
    const foreign = await buildClass();
    await ask(foreign, foreign.maud);
    const first = await ask(all, all.jonas, { words: 'First?', step: 'tie-on' });
    await ask(all, all.maud, { words: 'Second?', to: 'class' });
    const third = await ask(all, all.maud, { words: 'Third?', lesson: all.parts[1].publicId });
    await first.update({ createdAt: new Date('2026-11-01T00:00:00Z') });
    await answer(all.teacher, third);
    const inbox = await questionInbox(await actorOf(all.helper));
    expect(inbox.waiting.map(({ words, byName, stepWords }) => [words, byName, stepWords])).toEqual([['First?', 'Jonas Pike', 'Tie on.'], ['Second?', 'Maud Ellery', null]]);
    expect(inbox).toMatchObject({ waitingCount: 2, answered: [{ words: 'Third?', partNumber: 2, answers: [{ byName: 'Ilse Marrow', byHelper: false }] }] });
    expect(await countWaitingQuestions(await actorOf(all.maud))).toBe(0);
    expect(await questionInbox(await actorOf(await otherTeacher()))).toMatchObject({ waitingCount: 0, waiting: [], answered: [] });
  });
});

describe('own words', () => {
  test('are changed by their writer alone, a question only until it is answered', async () => {
    const all = await buildClass();
    const question = await ask(all, all.maud, { to: 'class' });
    const change = async (who: User, of: 'question' | 'answer', id: string) => changeWords(await contextFor(who), { of, which: id, words: 'Better words' });
    for (const who of [all.jonas, all.teacher, await otherTeacher()]) await expect(change(who, 'question', question.publicId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await change(all.maud, 'question', question.publicId);
    expect(await question.reload()).toMatchObject({ words: 'Better words', changedAt: expect.any(Date) });
    await answer(all.helper, question);
    await expect(change(all.maud, 'question', question.publicId)).rejects.toMatchObject({ code: 'CONFLICT' });
    const { publicId } = await theAnswer();
    for (const who of [all.maud, all.jonas, all.teacher]) await expect(change(who, 'answer', publicId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await change(all.helper, 'answer', publicId);
    expect((await theAnswer()).words).toBe('Better words');
  });

  test('are taken out and put back by who took them out; a question without its answer waits again', async () => {
    const all = await buildClass();
    const question = await ask(all, all.maud, { to: 'class' });
    await answer(all.helper, question);
    const { publicId } = await theAnswer();
    const take = async (who: User, of: 'question' | 'answer', id: string) => takeOutWords(await contextFor(who), { of, which: id });
    const put = async (who: User, of: 'question' | 'answer', id: string) => putBackWords(await contextFor(who), { of, which: id });
    for (const who of [all.jonas, all.maud]) await expect(take(who, 'answer', publicId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await take(all.helper, 'answer', publicId);
    expect(await countWaitingQuestions(await actorOf(all.teacher))).toBe(1);
    await expect(put(all.teacher, 'answer', publicId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await put(all.helper, 'answer', publicId);
    expect(await countWaitingQuestions(await actorOf(all.teacher))).toBe(0);
    await expect(take(all.helper, 'question', question.publicId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await take(all.teacher, 'question', question.publicId);
    await expect(put(all.maud, 'question', question.publicId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect((await AuditEntry.findAll()).map(({ action }) => action)).toEqual(['take-out-question']);
  });
});

describe('words taken out', () => {
  test('are forgotten after thirty days, unless the steward has still to judge them', async () => {
    const all = await buildClass();
    const [gone, judged, young, standing] = [await ask(all, all.maud, { words: 'One?', to: 'class' }), await ask(all, all.maud, { words: 'Two?', to: 'class' }), await ask(all, all.maud, { words: 'Three?' }), await ask(all, all.maud, { words: 'Four?' })];
    await reportWords(await contextFor(all.jonas), { of: 'question', which: judged.publicId, why: 'Unkind' });
    for (const question of [gone, standing]) await answer(all.teacher, question);
    for (const question of [gone, judged, young]) await takeOutWords(await contextFor(all.maud), { of: 'question', which: question.publicId });
    const later = await contextFor(all.maud);
    await young.update({ takenOutAt: new Date('2026-12-03T00:00:00Z') });
    later.clock.set(new Date('2026-12-31T10:00:01Z'));
    await forgetTakenOutWords(later);
    expect((await Question.findAll({ order: ['id'] })).map(({ words }) => words)).toEqual(['Two?', 'Three?', 'Four?']);
    expect(await QuestionAnswer.count()).toBe(1);
  });
});

describe('a report', () => {
  test('comes from who sees the words, once each, and the steward settles it for all', async () => {
    const all = await buildClass();
    const question = await ask(all, all.maud, { to: 'class' });
    const pell = await buildUser({ name: 'Pell Harrow', isSteward: true });
    const report = async (who: User, why = 'Unkind') => reportWords(await contextFor(who), { of: 'question', which: question.publicId, why });
    await expect(report(all.maud)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(report(await buildUser())).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await report(all.jonas);
    await report(all.jonas, 'Unkind to beginners');
    await report(all.helper);
    const reports = await listReports();
    expect(reports.map(({ reportedBy, why, writtenBy, kind }) => [reportedBy, why, writtenBy, kind])).toEqual([['Jonas Pike', 'Unkind to beginners', 'Maud Ellery', 'question'], ['Wren Okafor', 'Unkind', 'Maud Ellery', 'question']]);
    const [first] = reports;
    const settle = async (who: User) => settleReport(await contextFor(who), { report: first?.publicId ?? '', words: 'take-out' });
    await expect(settle(all.teacher)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await settle(pell);
    await expect(settle(pell)).rejects.toMatchObject({ code: 'CONFLICT' });
    expect(await listReports()).toEqual([]);
    expect(await question.reload()).toMatchObject({ takenOutAt: expect.any(Date) });
    expect(await WordReport.count({ where: { settledById: pell.id } })).toBe(2);
    await expect(putBackWords(await contextFor(all.maud), { of: 'question', which: question.publicId })).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('may end in the words standing as they are', async () => {
    const all = await buildClass();
    const question = await ask(all, all.maud, { to: 'class' });
    await answer(all.teacher, question);
    await reportWords(await contextFor(all.jonas), { of: 'answer', which: (await theAnswer()).publicId, why: 'Wrong' });
    const [report] = await listReports();
    await settleReport(await contextFor(await buildUser({ isSteward: true })), { report: report?.publicId ?? '', words: 'stand' });
    expect(await theAnswer()).toMatchObject({ takenOutAt: null });
    expect(await listReports()).toEqual([]);
  });
});
