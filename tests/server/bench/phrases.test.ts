import { describe, expect, test } from 'vitest';
import { PhrasesForm, PromiseForm } from '#contracts/bench.ts';
import { AuditEntry, User, Workroom, WorkroomHelper } from '#server/models/index.ts';
import { phrasesOfWorkroom } from '#server/queries/bench/phrases-of.ts';
import { savePhrases } from '#server/use-cases/bench/save-phrases.ts';
import { savePromise } from '#server/use-cases/bench/save-promise.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildUser, buildWorkroom } from '../../support/factories.ts';

const written = (workroom: Workroom, phrases: string, before = '') => PhrasesForm.parse({ workroom: workroom.handle, phrases, before });
const ownerOf = async (workroom: Workroom): Promise<User> => User.findByPk(workroom.ownerId, { rejectOnEmpty: true });

describe('the phrases of a workroom', () => {
  test('are kept in the order they were written in, each once, without empty lines', async () => {
    const workroom = await buildWorkroom();
    await savePhrases(await contextFor(await ownerOf(workroom)), written(workroom, 'Tension is even.\n\n  Pluck and   listen once more. \nTension is even.\n'));
    expect(await phrasesOfWorkroom(workroom.id)).toEqual(['Tension is even.', 'Pluck and listen once more.']);
  });

  test('may be changed by a helper, and by nobody else', async () => {
    const [workroom, wren] = [await buildWorkroom(), await buildUser()];
    await WorkroomHelper.create({ workroomId: workroom.id, userId: wren.id });
    await savePhrases(await contextFor(wren), written(workroom, 'Card sits too high.'));
    const other = await ownerOf(await buildWorkroom());
    for (const user of [other, await buildUser()]) await expect(savePhrases(await contextFor(user), written(workroom, '', 'Card sits too high.'))).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(savePhrases(contextOf(null), written(workroom, ''))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    expect(await phrasesOfWorkroom(workroom.id)).toEqual(['Card sits too high.']);
  });

  test('are not written over when somebody changed them meanwhile', async () => {
    const workroom = await buildWorkroom();
    const ctx = await contextFor(await ownerOf(workroom));
    const results = await Promise.allSettled([savePhrases(ctx, written(workroom, 'One.')), savePhrases(ctx, written(workroom, 'Two.'))]);
    expect(results.map(({ status }) => status).toSorted()).toEqual(['fulfilled', 'rejected']);
    expect(await phrasesOfWorkroom(workroom.id)).toHaveLength(1);
  });

  test.each([
    ['more than twenty', Array.from({ length: 21 }, (_, index) => `Phrase ${index}.`).join('\n'), 'At most 20 phrases work. Take out those you say least.'],
    ['one too long', 'x'.repeat(301), 'One of them is longer than 300 characters. Say it in fewer, or in two lines.'],
  ])('%s are refused', (_words, phrases, sentence) => {
    expect(PhrasesForm.safeParse({ workroom: 'saltmarsh', phrases }).error?.issues[0]?.message).toBe(sentence);
  });
});

describe('the promise', () => {
  test('is the teacher’s to set, not her helper’s', async () => {
    const workroom = await buildWorkroom();
    await savePromise(await contextFor(await ownerOf(workroom)), { answerDays: 4 });
    const wren = await buildUser();
    await WorkroomHelper.create({ workroomId: workroom.id, userId: wren.id });
    await expect(savePromise(await contextFor(wren), { answerDays: 9 })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect((await workroom.reload()).answerDays).toBe(4);
    expect((await AuditEntry.findAll()).map(({ action, detail }) => [action, detail])).toEqual([['promise-set', { answerDays: 4 }]]);
  });

  test.each(['0', '31', '1.5', 'soon', ''])('of %j days is refused', (answerDays) => {
    expect(PromiseForm.safeParse({ answerDays }).success).toBe(false);
  });
});
