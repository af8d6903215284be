// A workroom's name and clock after its teacher was let in, and the dates that stand on that clock.
import { beforeEach, describe, expect, test } from 'vitest';
import { WorkroomForm } from '#contracts/workroom.ts';
import { AuditEntry, Workroom, type Lesson, type Series } from '#server/models/index.ts';
import { datedOpenings } from '#server/queries/workroom/dated-openings.ts';
import { saveWorkroom } from '#server/use-cases/workroom/save-workroom.ts';
import { contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

let ctx: TestContext;
let room: Workroom;
let series: Series;
let part: Lesson;

beforeEach(async () => {
  const teacher = await buildUser();
  room = await buildWorkroom({ ownerId: teacher.id, name: 'Marrow', timeZone: 'Europe/Berlin' });
  ctx = await contextFor(teacher);
  series = await buildSeries({ workroomId: room.id });
  part = await buildLesson({ seriesId: series.id, opens: { rule: 'on-date', wall: '2037-07-01T09:00', zone: 'Europe/Berlin' }, opensAt: new Date('2037-07-01T07:00:00Z') });
});

const form = (given: Record<string, string> = {}) => WorkroomForm.parse({ name: 'Salt Marsh', timeZone: 'Europe/London', ...given });

describe('a workroom', () => {
  test('gets its new name and keeps its address, and it is written down', async () => {
    const { handle } = room;
    await saveWorkroom(ctx, form());
    expect(await room.reload()).toMatchObject({ name: 'Salt Marsh', timeZone: 'Europe/London', handle });
    expect(await AuditEntry.findOne({ where: { action: 'workroom-changed' } })).toMatchObject({ detail: { before: { name: 'Marrow', timeZone: 'Europe/Berlin' }, after: { name: 'Salt Marsh', timeZone: 'Europe/London' }, moved: 0 } });
  });

  test('may keep the moments at which parts open, written on the new clock', async () => {
    await saveWorkroom(ctx, form());
    expect(await part.reload()).toMatchObject({ opens: { rule: 'on-date', wall: '2037-07-01T08:00', zone: 'Europe/London' }, opensAt: new Date('2037-07-01T07:00:00Z'), timetableRevision: 0 });
  });

  test('may keep the time of day, so that students see another moment; what is open stays so', async () => {
    const past = await buildLesson({ seriesId: series.id, position: 0, opens: { rule: 'on-date', wall: '2020-07-01T09:00', zone: 'Europe/Berlin' }, opensAt: new Date('2020-07-01T07:00:00Z') });
    await saveWorkroom(ctx, form({ dates: 'clock' }));
    expect(await part.reload()).toMatchObject({ opens: { wall: '2037-07-01T09:00', zone: 'Europe/London' }, opensAt: new Date('2037-07-01T08:00:00Z'), timetableRevision: 1 });
    expect(await past.reload()).toMatchObject({ opens: { wall: '2020-07-01T08:00', zone: 'Europe/London' }, opensAt: new Date('2020-07-01T07:00:00Z') });
    expect(await datedOpenings(room.id, new Date('2030-01-01'))).toEqual([{ seriesTitle: series.title, part: part.position, opensAt: new Date('2037-07-01T08:00:00Z') }]);
  });

  test('with its clock as it was moves nothing, whatever was chosen', async () => {
    await saveWorkroom(ctx, form({ timeZone: 'Europe/Berlin', dates: 'clock' }));
    expect(await part.reload()).toMatchObject({ opens: { wall: '2037-07-01T09:00', zone: 'Europe/Berlin' }, opensAt: new Date('2037-07-01T07:00:00Z') });
  });

  test('is changed by nobody without one, and every teacher changes her own', async () => {
    await expect(saveWorkroom(await contextFor(await buildUser()), form())).rejects.toMatchObject({ code: 'FORBIDDEN' });
    await expect(saveWorkroom(contextOf(null), form())).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    expect((await room.reload()).name).toBe('Marrow');
  });
});

test.each([['no name', { name: ' ' }, 'name'], ['a zone that is none', { timeZone: 'Middle/Sea' }, 'timeZone'], ['a way that is none', { dates: 'other' }, 'dates']])('%s is told at its field', (_what, given, field) => {
  const parsed = WorkroomForm.safeParse({ name: 'Salt Marsh', timeZone: 'Europe/London', ...given });
  expect(parsed.error?.issues.map(({ path }) => path[0])).toEqual([field]);
});
