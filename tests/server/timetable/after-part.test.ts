import { beforeEach, describe, expect, test } from 'vitest';
import { LessonSettingsForm } from '#contracts/workroom.ts';
import { AppError } from '#server/errors.ts';
import { Lesson, Mail, PartOpening, User, Workroom } from '#server/models/index.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { planTimetable } from '#server/queries/timetable/plan-timetable.ts';
import { finishPart } from '#server/use-cases/progress/finish-part.ts';
import { tellOpenings } from '#server/use-cases/openings/tell-openings.ts';
import { moveLesson, takeOutLesson } from '#server/use-cases/workroom/change-lessons.ts';
import { saveLessonSettings } from '#server/use-cases/workroom/save-lesson-settings.ts';
import { actorOf, contextFor, type TestContext } from '../../support/context.ts';
import { buildFollowed, type Followed } from '../../support/followed.ts';

let followed: Followed;
let student: TestContext;
let teacher: TestContext;

beforeEach(async () => {
  followed = await buildFollowed();
  const { series, student: user } = followed;
  student = await contextFor(user);
  const { ownerId } = await Workroom.findByPk(series.workroomId, { rejectOnEmpty: true });
  teacher = await contextFor(await User.findByPk(ownerId, { rejectOnEmpty: true }));
});

const settings = (lesson: Lesson, given: Record<string, string>) => saveLessonSettings(teacher, LessonSettingsForm.parse({ lesson: lesson.publicId, title: lesson.title, minutes: '30', rule: 'after-part', ...given }));
const standing = async (number: number) => (await seriesFor(student.actor, followed.series.slug, new Date()))?.parts[number - 1]?.access;
const finish = (lesson: Lesson, done = true) => finishPart(student, { series: followed.series.slug, lesson: lesson.publicId, done });

describe('a part that opens when another is done', () => {
  test('is refused for itself, a later part, one that waits for it, another series’ and none, with the reason at the field', async () => {
    const { series, parts: [first, second, third] } = followed;
    await series.update({ state: 'draft' });
    const elsewhere = (await buildFollowed()).parts[0];
    const refusal = (afterPart: string) => settings(second, { afterPart }).then(() => '', (error: unknown) => (error instanceof AppError ? error.fields['afterPart'] : 'a bug'));
    expect(await refusal(second.publicId)).toMatch(/cannot wait for itself/);
    expect(await refusal(third.publicId)).toMatch(/waits for this part already, so neither could ever open/);
    await third.update({ opens: { rule: 'at-once' } });
    expect(await refusal(third.publicId)).toMatch(/comes later/);
    expect([await refusal(elsewhere.publicId), await refusal('')]).toEqual(['Choose an earlier part.', 'Choose an earlier part.']);
    await expect(settings(second, { rule: 'at-once', afterPart: first.publicId })).rejects.toMatchObject({ fields: { afterPart: expect.stringContaining('When an earlier part is done') } });
    expect((await second.reload()).opens).toEqual({ rule: 'at-once' });
  });

  test('opens at the student’s word, without a letter about what she has just done, and closes if she takes it back', async () => {
    const { parts: [first, second], seat } = followed;
    await settings(second, { afterPart: first.publicId, asksForPhoto: 'yes', ask: 'Show your warped loom' });
    await tellOpenings(student);
    expect(await standing(2)).toEqual({ may: 'wait', standing: { open: false, until: 'part', lesson: first.publicId } });
    await finish(first);
    expect(await standing(2)).toEqual({ may: 'follow' });
    expect(await PartOpening.findOne({ where: { enrolmentId: seat.id, lessonId: second.id } })).toMatchObject({ toldBy: 'seat' });
    await tellOpenings(student);
    expect(await Mail.count({ where: { template: 'parts-opened' } })).toBe(0);
    await finish(first, false);
    expect(await standing(2)).toMatchObject({ may: 'wait' });
  });

  test('keeps its order: moved in front of it, or with that one taken out, an open series refuses in words', async () => {
    const { parts: [first, second] } = followed;
    await settings(second, { afterPart: first.publicId, asksForPhoto: 'yes', ask: 'Show your warped loom' });
    await expect(moveLesson(teacher, { lesson: second.publicId, by: 'up' })).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('It waits for Part 2, which comes later') });
    expect((await second.reload()).position).toBeLessThanOrEqual(2);
    await first.update({ publishedVersionId: null });
    await expect(takeOutLesson(teacher, first.publicId)).rejects.toMatchObject({ says: expect.stringContaining('waits for a part that was taken out') });
  });

  test('stands in the timetable with the day on which it can open, and what would open before it', async () => {
    const { series, parts: [first, second] } = followed;
    await first.update({ opens: { rule: 'after-seat', days: 5 } });
    await second.update({ opens: { rule: 'after-part', lesson: first.publicId } });
    const plan = await planTimetable(await actorOf(await User.findByPk(teacher.actor?.userId ?? 0, { rejectOnEmpty: true })), series.slug, '2027-03-01', new Date());
    expect(plan?.days.slice(0, 2)).toMatchObject([{ when: 'at' }, { when: 'part', after: 1, earliest: new Date('2027-03-06T08:00:00Z') }]);
    await second.update({ opens: { rule: 'after-seat', days: 2 } });
    const early = await planTimetable(await actorOf(await User.findByPk(teacher.actor?.userId ?? 0, { rejectOnEmpty: true })), series.slug, '2027-03-01', new Date());
    expect(early?.early[0]?.says).toBe('Part 2 would open 3 days before Part 1.');
  });
});
