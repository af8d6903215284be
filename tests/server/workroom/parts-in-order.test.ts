import { beforeEach, describe, expect, test } from 'vitest';
import { Lesson, type Series, type User } from '#server/models/index.ts';
import { addLesson, moveLesson, putBackLesson, takeOutLesson } from '#server/use-cases/workroom/change-lessons.ts';
import { contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

let teacher: User;
let ctx: TestContext;
let series: Series;
let parts: Lesson[];

async function titles(): Promise<string[]> {
  const inOrder = await Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null }, order: ['position'] });
  expect(inOrder.map(({ position }) => position)).toEqual(inOrder.map((_part, index) => index + 1));
  return inOrder.map(({ title }) => title);
}

function part(index: number): Lesson {
  const found = parts[index];
  if (found === undefined) throw new RangeError(`no part ${index}`);
  return found;
}

beforeEach(async () => {
  teacher = await buildUser({ name: 'Ilse Marrow' });
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id, state: 'draft' });
  ctx = await contextFor(teacher);
  parts = [];
  for (const title of ['A', 'B', 'C', 'D']) parts.push(await buildLesson({ seriesId: series.id, title }));
});

describe('the order of the parts', () => {
  test('a new part goes to the end', async () => {
    await expect(addLesson(ctx, { series: series.slug, title: 'E' })).resolves.toMatchObject({ number: 5 });
    expect(await titles()).toEqual(['A', 'B', 'C', 'D', 'E']);
  });

  test.each([[1, 'CABD'], [2, 'ACBD'], [3, 'ABCD'], [4, 'ABDC'], [99, 'ABDC']])('the third can be made number %i', async (to, order) => {
    await moveLesson(ctx, { lesson: part(2).publicId, to });
    expect((await titles()).join('')).toBe(order);
  });

  test.each([[0, 'up', 'ABCD'], [0, 'down', 'BACD'], [3, 'up', 'ABDC'], [3, 'down', 'ABCD']] as const)('part %i moves %s by one place, and stays at an end', async (index, by, order) => {
    await moveLesson(ctx, { lesson: part(index).publicId, by });
    expect((await titles()).join('')).toBe(order);
  });

  test('a part taken out leaves no gap and comes back where it stood', async () => {
    await expect(takeOutLesson(ctx, part(1).publicId)).resolves.toMatchObject({ title: 'B', number: 2 });
    expect(await titles()).toEqual(['A', 'C', 'D']);
    await expect(putBackLesson(ctx, part(1).publicId)).resolves.toMatchObject({ number: 2 });
    expect(await titles()).toEqual(['A', 'B', 'C', 'D']);
  });

  test('taking out or putting back twice changes nothing', async () => {
    await takeOutLesson(ctx, part(0).publicId);
    await takeOutLesson(ctx, part(0).publicId);
    expect(await titles()).toEqual(['B', 'C', 'D']);
    await putBackLesson(ctx, part(0).publicId);
    await putBackLesson(ctx, part(0).publicId);
    expect(await titles()).toEqual(['A', 'B', 'C', 'D']);
  });

  test('a part that was taken out does not move', async () => {
    await takeOutLesson(ctx, part(0).publicId);
    await expect(moveLesson(ctx, { lesson: part(0).publicId, to: 2 })).rejects.toMatchObject({ code: 'CONFLICT', says: 'This part was taken out. Put it back first.' });
  });

  describe('that would let a part open too early', () => {
    beforeEach(async () => {
      await part(1).update({ opens: { rule: 'after-seat', days: 4 } });
      await part(2).update({ opens: { rule: 'after-seat', days: 7 } });
      await part(3).update({ opens: { rule: 'after-seat', days: 9 } });
    });

    test('is told before anything is moved, and moved when it is wanted all the same', async () => {
      await expect(moveLesson(ctx, { lesson: part(2).publicId, to: 2 })).rejects.toMatchObject({ code: 'VALIDATION', fields: { anyway: 'Nothing was moved yet. Part 3 would open 3 days before Part 2.' } });
      expect((await titles()).join('')).toBe('ABCD');
      await expect(moveLesson(ctx, { lesson: part(2).publicId, to: 2, anyway: 'yes' })).resolves.toMatchObject({ number: 2, from: 3 });
      expect((await titles()).join('')).toBe('ACBD');
    });

    test('is not told again of what was so before, nor when a part comes to its place', async () => {
      await moveLesson(ctx, { lesson: part(2).publicId, to: 2, anyway: 'yes' });
      await moveLesson(ctx, { lesson: part(0).publicId, to: 1 });
      await moveLesson(ctx, { lesson: part(2).publicId, to: 3 });
      expect((await titles()).join('')).toBe('ABCD');
    });
  });

  test('a series holds sixty parts', async () => {
    for (let count = 4; count < 60; count += 1) await Lesson.create({ seriesId: series.id, position: count + 1, title: `Part ${count + 1}`, opens: { rule: 'at-once' } });
    await expect(addLesson(ctx, { series: series.slug, title: 'One more' })).rejects.toMatchObject({ code: 'CONFLICT', says: 'A series holds at most 60 parts.' });
  });
});

describe('in an open series with people in it', () => {
  beforeEach(async () => {
    await series.update({ state: 'published' });
    await buildEnrolment({ seriesId: series.id });
  });

  test('a part that belongs to their seats is not taken out', async () => {
    await expect(takeOutLesson(ctx, part(1).publicId)).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('One person has a seat') });
    expect(await titles()).toEqual(['A', 'B', 'C', 'D']);
  });

  test('one that was never published is', async () => {
    const fresh = await addLesson(ctx, { series: series.slug, title: 'E' });
    await takeOutLesson(ctx, fresh.publicId);
    expect(await titles()).toEqual(['A', 'B', 'C', 'D']);
  });

  test('a move that would leave a part shut for ever is refused and undone', async () => {
    await part(1).update({ checkpoint: { ask: 'Show your warped loom', look: [] } });
    await part(2).update({ opens: { rule: 'after-verdict', lesson: part(1).publicId } });
    await expect(moveLesson(ctx, { lesson: part(1).publicId, to: 4 })).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('Part 2 would be stuck: It waits for Part 4') });
    expect(await titles()).toEqual(['A', 'B', 'C', 'D']);
  });
});

describe('the parts of another’s series', () => {
  test('are moved by nobody else: another teacher, a student inside, a visitor', async () => {
    const student = await buildUser();
    await buildEnrolment({ seriesId: series.id, userId: student.id });
    const other = await buildUser();
    await buildWorkroom({ ownerId: other.id });
    for (const foreign of [await contextFor(other), await contextFor(student), contextOf(null)]) {
      for (const act of [
        () => addLesson(foreign, { series: series.slug, title: 'Mine' }),
        () => moveLesson(foreign, { lesson: part(0).publicId, to: 2 }),
        () => takeOutLesson(foreign, part(0).publicId),
        () => putBackLesson(foreign, part(0).publicId),
      ]) await expect(act()).rejects.toMatchObject({ code: 'NOT_FOUND' });
    }
    expect(await titles()).toEqual(['A', 'B', 'C', 'D']);
  });
});
