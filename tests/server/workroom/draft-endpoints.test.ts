import { beforeEach, describe, expect, test } from 'vitest';
import type { APIContext } from 'astro';
import { Lesson, User } from '#server/models/index.ts';
import { RATE_RULES } from '#server/web/rate-limit.ts';
import { POST as keep } from '../../../src/pages/api/workroom/lesson-draft.ts';
import { contextFor, type TestContext } from '../../support/context.ts';
import { buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

let ctx: TestContext;
let lesson: Lesson;

beforeEach(async () => {
  const teacher = await buildUser({ timeZone: 'Europe/Berlin' });
  const series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id });
  lesson = await buildLesson({ seriesId: series.id, publishedVersionId: null });
  ctx = await contextFor(teacher);
});

async function send(endpoint: typeof keep, body: string, as = ctx): Promise<{ status: number; told: unknown }> {
  const request = new Request('http://127.0.0.1/api/workroom', { method: 'POST', body });
  const answer = await endpoint({ request, locals: { ctx: as } } as unknown as APIContext);
  return { status: answer.status, told: await answer.json() };
}
const draft = (source: string, revision = 0): string => JSON.stringify({ lesson: lesson.publicId, revision, source });

describe('a text that is being written', () => {
  test('is kept with the time on the teacher’s own clock', async () => {
    expect(await send(keep, draft('Wind it.'))).toEqual({ status: 200, told: { revision: 1, savedAt: '11:00', problems: [], warnings: [] } });
  });

  test('is not kept over another window’s, which comes with the answer', async () => {
    await send(keep, draft('Theirs.'));
    expect(await send(keep, draft('Mine.'))).toEqual({ status: 409, told: { behind: { revision: 1, source: 'Theirs.' } } });
  });

  test('may be as long as a part may be, also in letters of three bytes', async () => {
    const long = `${'“Wind it.” '.repeat(20)}\n\n`.repeat(800);
    expect(long.length).toBeLessThan(200_000);
    expect((await send(keep, draft(long))).status).toBe(200);
    expect((await lesson.reload()).draftSource).toBe(long);
  });

  test.each([
    ['no JSON', () => '{', 422], ['no text', () => JSON.stringify({ lesson: lesson.publicId, revision: 0 }), 422],
    ['more than a part may hold', () => draft('x'.repeat(220_001)), 422], ['more than is taken at all', () => draft('x'.repeat(950_000)), 413],
    ['a part that is not there', () => JSON.stringify({ lesson: '0'.repeat(26), revision: 0, source: 'A' }), 404],
  ])('%s is refused in words', async (_words, body, status) => {
    expect(await send(keep, body())).toMatchObject({ status, told: { title: expect.stringMatching(/\w/) } });
  });

  test('of another teacher is not there', async () => {
    const other = await contextFor(await User.findByPk((await buildWorkroom()).ownerId, { rejectOnEmpty: true }));
    expect((await send(keep, draft('Mine.'), other)).status).toBe(404);
  });

  test('is kept so often and no more', async () => {
    const { limit } = RATE_RULES.lessonDraft;
    for (let count = 0; count < limit; count += 1) await send(keep, '{');
    expect((await send(keep, draft('A'))).status).toBe(429);
  });
});
