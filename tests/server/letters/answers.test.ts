// How often letters about answers come: at once, gathered in one a day, never; changed while letters wait.
import { beforeEach, describe, expect, test } from 'vitest';
import { LettersForm } from '#contracts/notices.ts';
import type { AnswerPace } from '#core/notices/letter-kinds.ts';
import { leaveKey } from '#server/auth/leave-key.ts';
import { sendDueMails } from '#server/mail/send-due.ts';
import { FakeMailTransport } from '#server/mail/transport.fake.ts';
import { Mail, NoticeReceipt, Workroom } from '#server/models/index.ts';
import { answerQuestion } from '#server/use-cases/questions/answer-question.ts';
import { chooseLetters } from '#server/use-cases/letters/choose-letters.ts';
import { leaveLetters } from '#server/use-cases/letters/leave-letters.ts';
import { AnswerForm } from '#contracts/questions.ts';
import { ask, buildClass, type Class } from '../../support/asking.ts';
import { contextFor, contextOf } from '../../support/context.ts';

let all: Class;
let workroom: Workroom;
let transport: FakeMailTransport;

beforeEach(async () => {
  all = await buildClass();
  await all.maud.update({ timeZone: 'America/Halifax' });
  workroom = await Workroom.findByPk(all.series.workroomId, { rejectOnEmpty: true });
  transport = new FakeMailTransport();
});

const choose = async (answers: AnswerPace): Promise<unknown> => chooseLetters(await contextFor(all.maud), LettersForm.parse({ workroom: workroom.publicId, source: 'account', answers }));

async function answer(words: string, now = new Date('2031-12-01T10:00:00Z')): Promise<void> {
  const question = await ask(all, all.maud, { words: `${words}?`, letter: 'yes' });
  const ctx = await contextFor(all.teacher);
  ctx.clock.set(now);
  await answerQuestion(ctx, AnswerForm.parse({ question: question.publicId, words, seen: '0' }));
}

const post = (owner = 'worker-1'): Promise<number> =>
  sendDueMails({ transport, from: 'hello@fellmark.example', publicUrl: 'https://fellmark.example', now: () => new Date(), chance: () => 0.5 }, owner);
/** As if the time a letter waits for had come. */
const morningComes = (): Promise<unknown> => Mail.update({ runAt: new Date(Date.now() - 1_000) }, { where: { state: 'ready' } });
const waiting = async (): Promise<unknown[]> => (await Mail.findAll({ order: ['id'] })).map(({ template, runAt }) => [template, runAt.toISOString()]);

describe('letters about answers', () => {
  test('come at once to who chose nothing, and can be left by one press', async () => {
    await answer('Leave a bow');
    await post();
    const [letter] = transport.sent;
    expect([transport.sent.length, letter?.subject]).toEqual([1, 'Ilse Marrow answered your question']);
    const key = leaveKey({ person: all.maud.publicId, workroom: workroom.publicId, kind: 'answers' });
    expect(letter?.headers).toMatchObject({ 'List-Unsubscribe': `<https://fellmark.example/leave/${key}>`, 'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click' });
    await leaveLetters(contextOf(null), key);
    await answer('Beat less');
    await post();
    expect([transport.sent.length, await Mail.count(), (await NoticeReceipt.findAll({ order: ['id'] })).map(({ byLetter }) => byLetter)]).toEqual([1, 1, [true, false]]);
  });

  test('once a day are one letter at seven by her own clocks, with every answer and the way to it', async () => {
    await choose('daily');
    await answer('Leave a bow', new Date('2031-12-01T10:59:00Z'));
    await answer('Beat less', new Date('2031-12-01T11:00:00Z'));
    await answer('Use a longer needle', new Date('2031-12-01T23:00:00Z'));
    // Seven in Halifax is eleven by UTC in winter: the first goes out at that hour of the same day.
    expect(await waiting()).toEqual([['answers-gathered', '2031-12-01T11:00:00.000Z'], ['answers-gathered', '2031-12-02T11:00:00.000Z']]);
    expect(await NoticeReceipt.count()).toBe(3);
    await morningComes();
    await post();
    const letter = transport.sent.find(({ subject }) => subject.startsWith('2 answers'));
    for (const said of ['Beat less', 'Use a longer needle', `https://fellmark.example/series/${all.series.slug}/1#q-`, 'because you chose one a day']) expect(letter?.text).toContain(said);
    expect(letter?.text).not.toContain('Leave a bow');
  });

  test('gathered go out once, whatever two workers do; what is answered after that waits for the next morning', async () => {
    await choose('daily');
    await answer('Leave a bow');
    await morningComes();
    await Promise.all([post('worker-1'), post('worker-2')]);
    await post();
    expect(transport.sent).toHaveLength(1);
    await answer('Beat less');
    expect(await waiting()).toEqual([expect.anything(), ['answers-gathered', '2031-12-02T11:00:00.000Z']]);
  });

  test('two answers at the same moment are both in it', async () => {
    await choose('daily');
    await Promise.all([answer('Leave a bow'), answer('Beat less')]);
    const mails = await Mail.findAll();
    expect(mails.map(({ data }) => (data['answers'] as unknown[]).length)).toEqual([2]);
  });

  test('what was gathered goes out now when she wants them at once after all, and not at all when she wants none', async () => {
    await choose('daily');
    await answer('Leave a bow');
    await post();
    expect(transport.sent).toHaveLength(0);
    await choose('at-once');
    expect(await waiting()).toEqual([['answers-gathered', '2026-12-01T10:00:00.000Z']]);
    await choose('daily');
    await answer('Beat less');
    await choose('never');
    await answer('Use a longer needle');
    await morningComes();
    await post();
    expect(transport.sent).toHaveLength(0);
    expect((await Mail.findAll()).map(({ state, lastError }) => [state, lastError])).toEqual([['dropped', 'these letters were left']]);
    expect(await NoticeReceipt.count()).toBe(3);
  });

  test('changed from at once to daily: what was on its way goes on, the next is gathered', async () => {
    await answer('Leave a bow');
    await choose('daily');
    await answer('Beat less');
    await post();
    expect(transport.sent.map(({ subject }) => subject)).toEqual(['Ilse Marrow answered your question']);
    expect((await Mail.findAll({ where: { state: 'ready' } })).map(({ template }) => template)).toEqual(['answers-gathered']);
  });
});
