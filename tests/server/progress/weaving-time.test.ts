import { beforeEach, describe, expect, test } from 'vitest';
import { ChangeTimeForm, WriteTimeForm } from '#contracts/weaving-time.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { Enrolment, WeavingTime } from '#server/models/index.ts';
import { weavingTimes } from '#server/queries/loom/weaving-times.ts';
import { changeTime, writeDownTime } from '#server/use-cases/progress/write-down-time.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

let followed: Awaited<ReturnType<typeof buildFollowed>>;
beforeEach(async () => { followed = await buildFollowed(); });
const input = (given: Partial<{ day: string; woven: string; entry: string }> = {}) => WriteTimeForm.parse({ series: followed.series.slug, entry: newPublicId(), day: '2026-11-30', woven: '1 h 30', ...given });
const written = async () => (await weavingTimes([followed.seat.id])).map(({ day, minutes }) => [day, minutes]);

describe('time at the loom', () => {
  test('is what she writes down, the newest day first; a form that comes twice counts once', async () => {
    const ctx = await contextFor(followed.student);
    const once = input();
    await writeDownTime(ctx, once);
    await writeDownTime(ctx, once);
    await writeDownTime(ctx, input({ day: '2026-12-01', woven: '45 min' }));
    expect(await written()).toEqual([['2026-12-01', 45], ['2026-11-30', 90]]);
  });

  test('is changed and taken out by herself alone', async () => {
    const ctx = await contextFor(followed.student);
    const { entry, ...rest } = input();
    await writeDownTime(ctx, { entry, ...rest });
    const change = (woven: string | string[]) => ChangeTimeForm.parse({ entry, woven });
    await expect(changeTime(contextOf(null), change('2'))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(changeTime(await contextFor(await buildUser()), change('2'))).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await changeTime(ctx, change('2'))).toEqual({ isTakenOut: false });
    expect(await written()).toEqual([['2026-11-30', 120]]);
    expect(await changeTime(ctx, change(['2 h', '0']))).toEqual({ isTakenOut: true });
    expect(await WeavingTime.count()).toBe(0);
    await expect(changeTime(ctx, change('2'))).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('is written down for nobody without a seat, nor after it ended', async () => {
    await expect(writeDownTime(contextOf(null), input())).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(writeDownTime(await contextFor(await buildUser()), input())).rejects.toMatchObject({ code: 'NOT_FOUND' });
    const ctx = await contextFor(followed.student);
    const { entry, ...rest } = input();
    await writeDownTime(ctx, { entry, ...rest });
    await Enrolment.update({ state: 'closed' }, { where: { id: followed.seat.id } });
    await expect(changeTime(ctx, ChangeTimeForm.parse({ entry, woven: '0' }))).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('of a day to come is told at the day', async () => {
    const ctx = await contextFor(followed.student);
    await expect(writeDownTime(ctx, input({ day: '2031-01-01' }))).rejects.toMatchObject({ code: 'VALIDATION', fields: { day: 'That day is still to come.' } });
  });

  test.each([
    ['woven', { woven: 'long' }, 'Write one time, like 1 h 30, 90 min or 1.5.'],
    ['woven', { woven: '25 h' }, 'A day has 24 hours. Write down each day by itself.'],
    ['woven', { woven: '0' }, 'Write down at least a minute.'],
    ['day', { day: '1.12.2026' }, 'Write the day as year-month-day, such as 2026-12-01.'],
    ['day', { day: '2026-02-30' }, 'There is no such day.'],
  ])('that makes no sense is told at its field: %s %j', (field, given, says) => {
    const { error } = WriteTimeForm.safeParse({ series: 'low-tide', entry: newPublicId(), day: '2026-12-01', woven: '1', ...given });
    expect(error?.issues[0]).toMatchObject({ path: [field], message: says });
  });
});
