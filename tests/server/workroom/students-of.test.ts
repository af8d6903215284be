import { expect, test } from 'vitest';
import { statementListeners } from '#server/db/sequelize.ts';
import { LessonVisit, Media, ProgressPhoto, Tick } from '#server/models/index.ts';
import { studentsOf } from '#server/queries/workroom/students-of.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser } from '../../support/factories.ts';

test('each student stands at her first part that is not done, whoever has waited longest first', async () => {
  const series = await buildSeries();
  const [one, two, three] = [await buildLesson({ seriesId: series.id }), await buildLesson({ seriesId: series.id, checkpoint: { ask: 'Show it', look: [] } }), await buildLesson({ seriesId: series.id })];
  const seatOf = async (name: string) => buildEnrolment({ userId: (await buildUser({ name })).id, seriesId: series.id, startedAt: new Date('2026-11-01T00:00:00Z') });
  const [fresh, moving, done] = [await seatOf('Jonas Pike'), await seatOf('Maud Ellery'), await seatOf('Amara Voss')];
  await buildEnrolment();
  await LessonVisit.create({ enrolmentId: moving.id, lessonId: one.id, finishedAt: new Date('2026-11-20T00:00:00Z') });
  await Tick.create({ enrolmentId: moving.id, subject: 'step', itemKey: 'x:y', isTicked: true, changedAt: new Date('2026-11-28T00:00:00Z') });
  const media = await Media.create({ ownerId: done.userId, kind: 'photo', originalName: 'a', files: {}, detail: {} });
  await ProgressPhoto.create({ enrolmentId: done.id, lessonId: two.id, mediaId: media.id, verdict: 'weave-on', createdAt: new Date('2026-11-10T00:00:00Z') });
  for (const lesson of [one, three]) await LessonVisit.create({ enrolmentId: done.id, lessonId: lesson.id, finishedAt: new Date('2026-11-12T00:00:00Z') });
  const statements: string[] = [];
  const listen = (sql: string): void => { statements.push(sql); };
  statementListeners.add(listen);
  const rows = await studentsOf(series.workroomId);
  statementListeners.delete(listen);
  expect(rows.map(({ name, atPart, atTitle, verdict }) => [name, atPart, atTitle, verdict])).toEqual([
    ['Jonas Pike', 1, one.title, null],
    ['Amara Voss', 4, null, 'weave-on'],
    ['Maud Ellery', 2, two.title, null],
  ]);
  expect(rows[2]?.lastStepAt?.toISOString()).toBe('2026-11-28T00:00:00.000Z');
  expect([fresh.id, rows[0]?.enrolmentId]).toEqual([fresh.id, fresh.id]);
  expect(statements).toHaveLength(1);
});
