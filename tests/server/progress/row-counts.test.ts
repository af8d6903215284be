import { beforeEach, describe, expect, test } from 'vitest';
import { CountRows, RowsForm } from '#contracts/rows.ts';
import { RowTally } from '#server/models/index.ts';
import { rowCounts, rowCountsOf } from '#server/queries/following/row-counts.ts';
import { countRows, sayRows } from '#server/use-cases/progress/count-rows.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

const PHONE = 'aaaaaaaaaaaaaaaa';
const TABLET = 'bbbbbbbbbbbbbbbb';
let followed: Awaited<ReturnType<typeof buildFollowed>>;
beforeEach(async () => { followed = await buildFollowed(); });

const send = async (device: string, tallies: Record<string, { rows: number; version: number }>, at?: Date) => {
  const ctx = await contextFor(followed.student);
  if (at !== undefined) ctx.clock.set(at);
  return countRows(ctx, { series: followed.series.slug, device, tallies });
};
const say = async (band: string, rows: number) => sayRows(await contextFor(followed.student), { series: followed.series.slug, part: 1, step: 1, band, rows });

describe('rows counted at the loom', () => {
  test('are counted for nobody without a seat', async () => {
    const input = { series: followed.series.slug, device: PHONE, tallies: { foot: { rows: 1, version: 1 } } };
    await expect(countRows(contextOf(null), input)).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(countRows(await contextFor(await buildUser()), input)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(sayRows(await contextFor(await buildUser()), { series: followed.series.slug, part: 1, step: 1, band: 'foot', rows: 2 })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await RowTally.count()).toBe(0);
  });

  test('of two devices add up, in whichever order they arrive and however often', async () => {
    expect(await send(PHONE, { foot: { rows: 5, version: 5 } })).toEqual({ own: { foot: { rows: 5, version: 5 } }, others: {} });
    expect(await send(TABLET, { foot: { rows: 3, version: 3 }, sky: { rows: 1, version: 1 } })).toEqual({ own: { foot: { rows: 3, version: 3 }, sky: { rows: 1, version: 1 } }, others: { foot: 5 } });
    await send(PHONE, { foot: { rows: 5, version: 5 } });
    await send(PHONE, { foot: { rows: 4, version: 4 } });
    expect(await rowCounts(followed.seat.id)).toEqual({ foot: 8, sky: 1 });
    expect(await rowCountsOf([followed.seat.id, 999_999])).toEqual(new Map([[followed.seat.id, { foot: 8, sky: 1 }]]));
  });

  test('do not ask any clock', async () => {
    await send(PHONE, { foot: { rows: 5, version: 5 } }, new Date('2031-01-01T00:00:00Z'));
    await send(PHONE, { foot: { rows: 7, version: 7 } }, new Date('2001-01-01T00:00:00Z'));
    expect(await rowCounts(followed.seat.id)).toEqual({ foot: 7 });
  });

  test('come back to a device that lost its last ones with its battery', async () => {
    await send(PHONE, { foot: { rows: 9, version: 9 } });
    expect(await send(PHONE, { foot: { rows: 7, version: 7 } })).toMatchObject({ own: { foot: { rows: 9, version: 9 } } });
  });

  test('of a band the pattern does not have are passed over, and the others are taken', async () => {
    expect(await send(PHONE, { gone: { rows: 2, version: 1 }, foot: { rows: 1, version: 1 } })).toMatchObject({ own: { foot: { rows: 1, version: 1 } } });
    expect(await rowCounts(followed.seat.id)).toEqual({ foot: 1 });
  });

  test('one device takes back what another one counted', async () => {
    await send(TABLET, { foot: { rows: 3, version: 3 } });
    await send(PHONE, { foot: { rows: -1, version: 1 } });
    expect(await rowCounts(followed.seat.id)).toEqual({ foot: 2 });
  });

  test('said outright by a form are so many, whatever devices counted, and a form sent twice changes nothing', async () => {
    await send(PHONE, { foot: { rows: 5, version: 5 } });
    await say('foot', 12);
    await say('foot', 12);
    expect(await rowCounts(followed.seat.id)).toEqual({ foot: 12 });
    await send(PHONE, { foot: { rows: 6, version: 6 } });
    expect(await rowCounts(followed.seat.id)).toEqual({ foot: 13 });
    await say('foot', 0);
    expect(await rowCounts(followed.seat.id)).toEqual({ foot: 0 });
    await expect(say('gone', 3)).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('that are no rows are refused in words', () => {
    const sent = { series: 'low-tide', part: '3', step: '2', band: 'foot' };
    const says = (rows: string) => RowsForm.safeParse({ ...sent, rows }).error?.issues[0]?.message;
    expect(RowsForm.parse({ ...sent, rows: ['4', ' 5 '] })).toMatchObject({ rows: 5 });
    for (const rows of ['', '-1', '1e9', '3,5', 'many']) expect(says(rows), rows).toBe('Give the rows as a number, from 0 to 20000.');
    expect(says('20001')).toBe('Up to 20000 rows can be counted in a band.');
    for (const body of [{}, { ...sent, device: 'x', tallies: {} }, { series: 'a', device: PHONE, tallies: { foot: { rows: 1.5, version: 1 } } }, { series: 'a', device: PHONE, tallies: { 'NOT A BAND': { rows: 1, version: 1 } } }]) {
      expect(CountRows.safeParse(body).success).toBe(false);
    }
  });
});
