import { expect, test } from 'vitest';
import { whatNext } from '#server/queries/finish/what-next.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { actorOf } from '../../support/context.ts';
import { buildEnrolment, buildSeries } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

test('what comes next is open, by the same teacher or with the same techniques, and not hers yet', async () => {
  const { series, student } = await buildFollowed();
  await series.update({ techniques: ['tabby', 'rya'] });
  const hers = await buildSeries({ workroomId: series.workroomId, title: 'High Water' });
  const alike = await buildSeries({ title: 'Three Rugs', techniques: ['rya'] });
  const owned = await buildSeries({ workroomId: series.workroomId });
  await buildEnrolment({ userId: student.id, seriesId: owned.id });
  await buildSeries({ workroomId: series.workroomId, state: 'draft', publishedAt: null });
  await buildSeries({ techniques: ['felting'] });
  const actor = await actorOf(student);
  const finished = await seriesFor(actor, series.slug, new Date('2026-12-01T10:00:00Z'));
  if (finished === null) throw new RangeError('no series');
  expect((await whatNext(actor, finished)).map(({ series: { slug }, byTeacher }) => [slug, byTeacher])).toEqual([[hers.slug, true], [alike.slug, false]]);
});
