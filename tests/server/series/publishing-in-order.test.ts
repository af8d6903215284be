import { beforeEach, describe, expect, test } from 'vitest';
import { Lesson, LessonVersion, PatternPiece, WorkroomHelper, type Enrolment, type Series, type User } from '#server/models/index.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { publishPart } from '#server/use-cases/series/publish-part.ts';
import { publishSeries } from '#server/use-cases/series/publish-series.ts';
import { takeOutLesson } from '#server/use-cases/workroom/change-lessons.ts';
import { saveLessonDraft } from '#server/use-cases/workroom/save-lesson-draft.ts';
import { actorOf, contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

const NOW = new Date('2026-12-01T10:00:00Z');
let teacher: User;
let ctx: TestContext;
let series: Series;
let student: User;
let seat: Enrolment;
let parts: Lesson[];

const part = (index: number): Lesson => {
  const found = parts[index];
  if (found === undefined) throw new RangeError(`no part ${index}`);
  return found;
};
async function write(index: number, source = '<Step id="weave">Weave.</Step>'): Promise<void> {
  await saveLessonDraft(ctx, { lesson: part(index).publicId, revision: (await part(index).reload()).draftRevision, source });
}
const seen = async () => {
  const all = await seriesFor(await actorOf(student), series.slug, NOW);
  return [all?.parts.map(({ number, title }) => [number, title]), all?.toCome.map(({ number, title }) => [number, title])];
};

beforeEach(async () => {
  teacher = await buildUser({ name: 'Ilse Marrow' });
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id, state: 'draft', publishedAt: null, summary: 'Weave the shore.' });
  await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
  ctx = await contextFor(teacher);
  parts = [];
  for (const title of ['A', 'B', 'C', 'D']) parts.push(await buildLesson({ seriesId: series.id, title, publishedVersionId: null }));
  student = await buildUser();
  seat = await buildEnrolment({ seriesId: series.id, userId: student.id });
});

describe('publishing one part is refused', () => {
  beforeEach(async () => {
    for (const index of [0, 1, 2]) await write(index);
  });

  test('to everybody but the teacher', async () => {
    await publishSeries(ctx, series.slug);
    const helper = await buildUser();
    await WorkroomHelper.create({ workroomId: series.workroomId, userId: helper.id });
    const other = await buildUser();
    await buildWorkroom({ ownerId: other.id });
    for (const foreign of [await contextFor(helper), await contextFor(student), await contextFor(other), contextOf(null)]) await expect(publishPart(foreign, part(0).publicId)).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('while the series is a draft', async () => {
    await expect(publishPart(ctx, part(0).publicId)).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('Publish the series first') });
  });

  test('before an earlier part is out, while it lacks something, or after it was taken out', async () => {
    await (await part(1).reload()).update({ draftSource: '' });
    await publishSeries(ctx, series.slug);
    await expect(publishPart(ctx, part(2).publicId)).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('Part 2 is not published yet') });
    await expect(publishPart(ctx, part(3).publicId)).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('Nothing is written yet') });
    await takeOutLesson(ctx, part(3).publicId);
    await expect(publishPart(ctx, part(3).publicId)).rejects.toMatchObject({ code: 'CONFLICT', says: 'This part was taken out. Put it back first.' });
    expect(await LessonVersion.count()).toBe(1);
  });
});

describe('a series that goes out part by part', () => {
  beforeEach(async () => {
    for (const index of [0, 1, 3]) await write(index);
  });

  test('shows what is out, and what is still being written', async () => {
    await expect(publishSeries(ctx, series.slug)).resolves.toEqual({ out: [1, 2], held: [3, 4] });
    expect(await seen()).toEqual([[[1, 'A'], [2, 'B']], [[3, 'C'], [4, 'D']]]);
    await write(2);
    await publishPart(ctx, part(2).publicId);
    expect(await seen()).toEqual([[[1, 'A'], [2, 'B'], [3, 'C']], [[4, 'D']]]);
    await publishPart(ctx, part(3).publicId);
    expect(await seen()).toEqual([[[1, 'A'], [2, 'B'], [3, 'C'], [4, 'D']], []]);
  });

  test('nobody reads a part that is being written, with a seat or without', async () => {
    await publishSeries(ctx, series.slug);
    expect((await seriesFor(await actorOf(student), series.slug, NOW))?.parts).toHaveLength(2);
    expect((await seriesFor(null, series.slug, NOW))?.parts).toHaveLength(2);
    expect(seat.state).toBe('active');
  });

  test('a part put in among those that are out shows nothing before it is published', async () => {
    await publishSeries(ctx, series.slug);
    await part(2).update({ position: 1 });
    await part(0).update({ position: 2 });
    expect(await seen()).toEqual([[[1, 'A'], [2, 'B']], [[3, 'D']]]);
  });

  test('the changes of one part go out without those of another', async () => {
    await publishSeries(ctx, series.slug);
    await write(0, '<Step id="weave">Weave more.</Step>');
    await write(1, '<Step id="weave">Weave less.</Step>');
    await publishPart(ctx, part(1).publicId);
    const versions = await LessonVersion.findAll({ where: { number: 2 } });
    expect(versions.map(({ lessonId, source }) => [lessonId, source])).toEqual([[part(1).id, '<Step id="weave">Weave less.</Step>']]);
  });

  test('publishing a part twice makes one version', async () => {
    await publishSeries(ctx, series.slug);
    await write(2);
    await Promise.all([publishPart(ctx, part(2).publicId), publishPart(ctx, part(2).publicId)]);
    expect(await LessonVersion.count({ where: { lessonId: part(2).id } })).toBe(1);
  });
});
