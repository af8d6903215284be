import { expect, test } from 'vitest';
import { Enrolment, MyPieceRow } from '#server/models/index.ts';
import { studentLooms } from '#server/queries/workroom/student-looms.ts';
import { buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

test('looms of those with a seat, who said what they weave on, are there for the teacher of the series alone', async () => {
  const series = await buildSeries({ workroomId: (await buildWorkroom()).id });
  const seatOf = async (name: string, data: MyPieceRow['data'], state: 'active' | 'closed' = 'active'): Promise<void> => {
    const { id } = await Enrolment.create({ userId: (await buildUser({ name })).id, seriesId: series.id, source: 'granted', state, startedAt: new Date('2026-05-01T10:00:00Z') });
    await MyPieceRow.create({ enrolmentId: id, data });
  };
  await seatOf('Maud', { loom: { insideWidthMm: 360 } });
  await seatOf('Jonas', {});
  await seatOf('Orla', { loom: { insideWidthMm: 500 } }, 'closed');
  expect(await studentLooms(series.workroomId, series.slug)).toEqual([{ id: expect.stringMatching(/^[0-9a-z]{26}$/), name: 'Maud', mine: { loom: { insideWidthMm: 360 } } }]);
  expect(await studentLooms((await buildWorkroom()).id, series.slug)).toEqual([]);
  expect(await studentLooms(null, series.slug)).toEqual([]);
});
