import ICAL from 'ical.js';
import { beforeEach, describe, expect, test } from 'vitest';
import { LessonSettingsForm } from '#contracts/workroom.ts';
import { calendarKey, opensCalendar, seatOfKey } from '#server/auth/calendar-key.ts';
import { Enrolment, Lesson, Media, ProgressPhoto, WorkroomHelper, type Series, type User } from '#server/models/index.ts';
import { calendarFile } from '#server/web/calendar-file.ts';
import { planTimetable } from '#server/queries/timetable/plan-timetable.ts';
import { seatTimetable } from '#server/queries/timetable/seat-timetable.ts';
import { renewCalendar } from '#server/use-cases/timetable/renew-calendar.ts';
import { saveLessonSettings } from '#server/use-cases/workroom/save-lesson-settings.ts';
import { actorOf, contextFor, contextOf } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

const NOW = new Date('2026-12-01T10:00:00Z');
let teacher: User;
let student: User;
let series: Series;
let seat: Enrolment;
let asked: Lesson;
let dated: Lesson;

beforeEach(async () => {
  teacher = await buildUser();
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id, title: 'Low Tide: a woven wall hanging' });
  student = await buildUser();
  seat = await buildEnrolment({ seriesId: series.id, userId: student.id, startedAt: new Date('2026-11-30T09:00:00Z') });
  await buildLesson({ seriesId: series.id });
  asked = await buildLesson({ seriesId: series.id, checkpoint: { ask: 'Show your warped loom', look: [] }, opens: { rule: 'after-seat', days: 3 } });
  await buildLesson({ seriesId: series.id, opens: { rule: 'after-verdict', lesson: asked.publicId } });
  dated = await buildLesson({ seriesId: series.id, title: 'Wedges, slopes; and a long title with ŵ, “quotes” and \\ that does not fit into one line of the file', opens: { rule: 'on-date', wall: '2027-03-28T09:00', zone: 'Europe/Berlin' }, opensAt: new Date('2027-03-28T07:00:00Z') });
  await buildLesson({ seriesId: series.id, publishedVersionId: null, opens: { rule: 'after-seat', days: 4 } });
});

const file = async (): Promise<string> => {
  const timetable = await seatTimetable(seat.publicId, NOW);
  return timetable === null ? '' : calendarFile(timetable, 'https://fellmark.example', NOW);
};
const events = async (): Promise<ICAL.Event[]> => new ICAL.Component(ICAL.parse(await file()) as unknown[]).getAllSubcomponents('vevent').map((component) => new ICAL.Event(component)).filter(({ uid }) => uid.startsWith('opens-'));

describe('the calendar file of a seat', () => {
  test('holds the parts whose day is known, in UTC, whatever clock the machine has', async () => {
    expect((await events()).map(({ summary, startDate }) => [summary.slice(0, 24), startDate.toString()])).toEqual([
      ['Part 2 of Low Tide opens', '2026-12-03T09:00:00Z'],
      ['Part 4 of Low Tide opens', '2027-03-28T07:00:00Z'],
    ]);
  });

  test('keeps every character of a title, escaped and folded at 75 octets (RFC 5545, 3.1 and 3.3.11)', async () => {
    const text = await file();
    expect(text.split('\r\n').every((line) => Buffer.byteLength(line) <= 75)).toBe(true);
    expect(text.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
    expect((await events())[1]?.summary).toBe(`Part 4 of Low Tide opens: ${dated.title}`);
  });

  test('has what the standard asks for: version, product, stamp and an id for each event', async () => {
    const calendar = new ICAL.Component(ICAL.parse(await file()) as unknown[]);
    expect([calendar.getFirstPropertyValue('version'), calendar.getFirstPropertyValue('method'), calendar.getFirstPropertyValue('prodid')]).toEqual(['2.0', 'PUBLISH', '-//Fellmark//Timetable//EN']);
    for (const event of calendar.getAllSubcomponents('vevent')) for (const name of ['uid', 'dtstamp', 'dtstart', 'sequence']) expect(event.hasProperty(name)).toBe(true);
  });

  test('an event keeps its id and its number rises when the teacher moves its day; other changes leave it', async () => {
    const ctx = await contextFor(teacher);
    const save = (given: Record<string, string>) => saveLessonSettings(ctx, LessonSettingsForm.parse({ lesson: dated.publicId, title: dated.title, minutes: '90', rule: 'on-date', wall: '2027-03-28T09:00', ...given }));
    const [, before] = await events();
    await save({ minutes: '120' });
    expect((await events())[1]?.sequence).toBe(before?.sequence);
    await save({ wall: '2027-03-29T09:00' });
    const [, after] = await events();
    expect([after?.uid, after?.startDate.toString(), (after?.sequence ?? 0) - (before?.sequence ?? 0)]).toEqual([before?.uid, '2027-03-29T07:00:00Z', 1]);
  });

  test('a part that waited for a verdict comes in when the verdict is given', async () => {
    const media = await Media.create({ ownerId: student.id, kind: 'photo', state: 'ready', originalName: 'loom.jpg', width: 4, height: 3, files: {}, detail: {} });
    await ProgressPhoto.create({ enrolmentId: seat.id, lessonId: asked.id, mediaId: media.id, verdict: 'weave-on', verdictAt: new Date('2026-12-05T17:30:00Z') });
    expect((await events()).map(({ startDate }) => startDate.toString())).toContain('2026-12-05T17:30:00Z');
  });

  test('is never without an event, though no part has a day', async () => {
    await Lesson.update({ opens: { rule: 'at-once' }, opensAt: null }, { where: { seriesId: series.id } });
    expect(new ICAL.Component(ICAL.parse(await file()) as unknown[]).getAllSubcomponents('vevent').map((component) => new ICAL.Event(component).summary)).toEqual(['Low Tide begins: your seat is yours']);
  });

  test('ends with the seat', async () => {
    await seat.update({ state: 'closed' });
    expect(await seatTimetable(seat.publicId, NOW)).toBeNull();
  });
});

describe('the private address', () => {
  const of = async () => ({ seat: seat.publicId, revision: (await seat.reload()).calendarRevision });

  test('opens one calendar, until a new one is made', async () => {
    const key = calendarKey(await of());
    expect([seatOfKey(key), opensCalendar(key, await of())]).toEqual([seat.publicId, true]);
    await renewCalendar(await contextFor(student), series.slug);
    expect(opensCalendar(key, await of())).toBe(false);
    expect(opensCalendar(calendarKey(await of()), await of())).toBe(true);
  });

  test('of another seat, or one that was made up, opens nothing', async () => {
    const other = await buildEnrolment({ seriesId: series.id });
    const theirs = calendarKey({ seat: other.publicId, revision: 0 });
    expect(opensCalendar(theirs, await of())).toBe(false);
    expect(opensCalendar(`${seat.publicId}${theirs.slice(26)}`, await of())).toBe(false);
    for (const nonsense of ['', 'x', `${seat.publicId}-`, '../etc', `${seat.publicId}-${'é'.repeat(43)}`]) expect(seatOfKey(nonsense)).toBeNull();
  });

  test('is renewed by nobody but who has the seat', async () => {
    const helper = await buildUser();
    await WorkroomHelper.create({ workroomId: series.workroomId, userId: helper.id });
    for (const [ctx, code] of [[await contextFor(teacher), 'NOT_FOUND'], [await contextFor(helper), 'NOT_FOUND'], [await contextFor(await buildUser()), 'NOT_FOUND'], [contextOf(null), 'UNAUTHENTICATED']] as const) {
      await expect(renewCalendar(ctx, series.slug)).rejects.toMatchObject({ code });
    }
    expect((await seat.reload()).calendarRevision).toBe(0);
  });
});

describe('the timetable of somebody who starts on a chosen day', () => {
  test('is seen by its teacher only', async () => {
    for (const user of [student, await buildUser()]) expect(await planTimetable(await actorOf(user), series.slug, null, NOW)).toBeNull();
  });

  test('counts from nine in the morning of that day in the workroom, and takes today for what is no day', async () => {
    const planned = await planTimetable(await actorOf(teacher), series.slug, '2026-10-24', NOW);
    expect([planned?.start.at.toISOString(), planned?.notDated, planned?.days.map(({ when }) => when)]).toEqual(['2026-10-24T07:00:00.000Z', false, ['from-the-start', 'at', 'verdict', 'at', 'at']]);
    expect(await planTimetable(await actorOf(teacher), series.slug, '2026-02-30', NOW)).toMatchObject({ notDated: true, start: { date: '2026-12-01' } });
  });
});
