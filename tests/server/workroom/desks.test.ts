import { beforeEach, describe, expect, test } from 'vitest';
import { statementListeners } from '#server/db/sequelize.ts';
import { MyPieceRow, PatternPiece, WorkroomHelper, type Series, type User } from '#server/models/index.ts';
import { draftOf } from '#server/queries/workroom/draft-of.ts';
import { lessonDesk } from '#server/queries/workroom/lesson-desk.ts';
import { lessonText, lessonTexts } from '#server/queries/workroom/lesson-texts.ts';
import { seenAs } from '#server/queries/workroom/seen-as.ts';
import { seriesDesk } from '#server/queries/workroom/series-desk.ts';
import { takeOutLesson } from '#server/use-cases/workroom/change-lessons.ts';
import { saveLessonDraft } from '#server/use-cases/workroom/save-lesson-draft.ts';
import { actorOf, contextFor } from '../../support/context.ts';
import { buildEnrolment, buildGatheringItem, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

let teacher: User;
let series: Series;

beforeEach(async () => {
  teacher = await buildUser({ name: 'Ilse Marrow' });
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id });
});

async function statementsOf(work: () => Promise<unknown>): Promise<number> {
  let count = 0;
  const listener = (): void => { count += 1; };
  statementListeners.add(listener);
  try {
    await work();
  } finally {
    statementListeners.delete(listener);
  }
  return count;
}

describe('a series on its teacher’s table', () => {
  test('tells how each text stands to what students read, letters in another case included', async () => {
    const same = await buildLesson({ seriesId: series.id });
    const changed = await buildLesson({ seriesId: series.id });
    await changed.update({ draftSource: 'weave **one row**.' });
    const fresh = await buildLesson({ seriesId: series.id, publishedVersionId: null, draftSource: 'New.' });
    const empty = await buildLesson({ seriesId: series.id, publishedVersionId: null });
    const out = await buildLesson({ seriesId: series.id, title: 'Gone' });
    await takeOutLesson(await contextFor(teacher), out.publicId);
    await buildGatheringItem({ lessonId: same.id });
    const desk = await seriesDesk(await actorOf(teacher), series.slug);
    expect(desk?.parts.map(({ publicId, textState, lineCount }) => [publicId, textState, lineCount])).toEqual([
      [same.publicId, 'as-published', 1], [changed.publicId, 'changed', 0], [fresh.publicId, 'never-published', 0], [empty.publicId, 'empty', 0],
    ]);
    expect(desk?.takenOut.map(({ title }) => title)).toEqual(['Gone']);
  });

  test('asks the database no more often for many parts than for one', async () => {
    await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
    const one = await buildLesson({ seriesId: series.id });
    const actor = await actorOf(teacher);
    const [few, fewOfPart] = [await statementsOf(() => seriesDesk(actor, series.slug)), await statementsOf(() => lessonDesk(actor, series.slug, one.publicId))];
    for (let count = 0; count < 12; count += 1) {
      await buildGatheringItem({ lessonId: (await buildLesson({ seriesId: series.id })).id });
      await buildEnrolment({ seriesId: series.id });
    }
    expect(await statementsOf(() => seriesDesk(actor, series.slug))).toBe(few);
    expect(await statementsOf(() => lessonDesk(actor, series.slug, one.publicId))).toBe(fewOfPart);
    expect(few).toBeLessThanOrEqual(9);
    expect(fewOfPart).toBeLessThanOrEqual(9);
  });

  test('is not there for anybody else: another teacher, a helper, a student', async () => {
    const lesson = await buildLesson({ seriesId: series.id });
    const other = await buildUser();
    await buildWorkroom({ ownerId: other.id });
    const helper = await buildUser();
    await WorkroomHelper.create({ workroomId: series.workroomId, userId: helper.id });
    const student = await buildUser();
    await buildEnrolment({ seriesId: series.id, userId: student.id });
    for (const user of [other, helper, student]) {
      const actor = await actorOf(user);
      expect([await seriesDesk(actor, series.slug), await lessonDesk(actor, series.slug, lesson.publicId), await draftOf(actor, lesson.publicId)]).toEqual([null, null, null]);
    }
  });

  test('a part is found in its own series only', async () => {
    const elsewhere = await buildLesson({ seriesId: (await buildSeries({ workroomId: series.workroomId })).id });
    expect(await lessonDesk(await actorOf(teacher), series.slug, elsewhere.publicId)).toBeNull();
  });
});

describe('a preview', () => {
  test('is seen with a student’s piece and units, and with the pattern when the seat is not of this series', async () => {
    const own = { id: series.id, pattern: null };
    const maud = await buildUser({ name: 'Maud Ellery', units: 'in' });
    const seat = await buildEnrolment({ seriesId: series.id, userId: maud.id });
    await MyPieceRow.create({ enrolmentId: seat.id, data: { widthMm: 300 } });
    expect(await seenAs(own, seat.publicId, 'cm')).toEqual({ as: seat.publicId, studentName: 'Maud Ellery', loom: null, mine: { widthMm: 300 }, woven: { bandsDone: 0 }, units: 'in' });
    const foreign = await buildEnrolment();
    const closed = await buildEnrolment({ seriesId: series.id, state: 'closed' });
    for (const as of [foreign.publicId, closed.publicId, 'nobody', null]) expect(await seenAs(own, as, 'cm')).toMatchObject({ as: 'pattern', studentName: null });
  });
});

describe('an example loom', () => {
  test('is seen with its own measures where the piece is woven on a frame, and in the other units anywhere', async () => {
    const pattern = await lowTide();
    expect(await seenAs({ id: series.id, pattern }, 'loom-small', 'cm')).toMatchObject({ loom: 'A small loom, 30 cm inside', mine: { widthMm: 200 }, units: 'cm' });
    expect(await seenAs({ id: series.id, pattern }, 'other-units', 'cm')).toMatchObject({ mine: {}, units: 'in' });
    expect(await seenAs({ id: series.id, pattern: null }, 'loom-small', 'cm')).toMatchObject({ as: 'pattern', loom: null });
  });
});

describe('the versions of a part', () => {
  test('come newest first, with their texts', async () => {
    const lesson = await buildLesson({ seriesId: series.id });
    await saveLessonDraft(await contextFor(teacher), { lesson: lesson.publicId, revision: 0, source: 'Weave two rows.' });
    expect((await lessonTexts(lesson.publicId)).map(({ key, number }) => [key, number])).toEqual([['v1', 1]]);
    expect([await lessonText(lesson.publicId, 'v1'), await lessonText(lesson.publicId, 'v2')]).toEqual(['Weave **one row**.', null]);
    expect(await draftOf(await actorOf(teacher), lesson.publicId)).toEqual({ revision: 1, source: 'Weave two rows.' });
  });
});
