import { describe, expect, test } from 'vitest';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { PatternPiece, User, WorkroomHelper, type Series } from '#server/models/index.ts';
import { patternPiece } from '#server/queries/workroom/pattern-piece.ts';
import { savePiece } from '#server/use-cases/workroom/save-piece.ts';
import { actorOf, contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildGatheringItem, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

async function scene(): Promise<{ teacher: User; series: Series; ctx: TestContext }> {
  const teacher = await buildUser({ name: 'Ilse Marrow' });
  const series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id });
  return { teacher, series, ctx: await contextFor(teacher) };
}

describe('a pattern piece', () => {
  test('is kept, and counted each time it is kept again', async () => {
    const { series, ctx, teacher } = await scene();
    const piece = await lowTide();
    expect(await savePiece(ctx, { series: series.slug, revision: 0, piece })).toEqual({ ok: true, revision: 1 });
    expect(await savePiece(ctx, { series: series.slug, revision: 1, piece: { ...piece, seed: 12 } })).toEqual({ ok: true, revision: 2 });
    expect(await patternPiece(await actorOf(teacher), series.slug)).toMatchObject({ revision: 2, piece: { ...piece, seed: 12 } });
  });

  test('that cannot be woven is told by its places, and nothing of it is kept', async () => {
    const { series, ctx } = await scene();
    const piece = await lowTide();
    const saved = await savePiece(ctx, { series: series.slug, revision: 0, piece: { ...piece, loom: { ...piece.loom, insideWidthMm: 200 } } });
    expect(saved.ok ? [] : saved.problems.map(({ path }) => path)).toContain('/loom/insideWidthMm');
    expect(await PatternPiece.count()).toBe(0);
  });

  test.each([null, 'a hanging', 7, [], { craft: 'frame-loom' }])('is none when it is %o', async (piece) => {
    const { series, ctx } = await scene();
    expect(await savePiece(ctx, { series: series.slug, revision: 0, piece })).toMatchObject({ ok: false });
  });

  test('saved in another window meanwhile is not written over', async () => {
    const { series, ctx } = await scene();
    const piece = await lowTide();
    await savePiece(ctx, { series: series.slug, revision: 0, piece });
    for (const revision of [0, 2]) await expect(savePiece(ctx, { series: series.slug, revision, piece })).rejects.toMatchObject({ code: 'CONFLICT' });
    expect((await PatternPiece.findOne())?.revision).toBe(1);
  });

  test('is nobody’s but its teacher’s', async () => {
    const { series } = await scene();
    const helper = await buildUser();
    await WorkroomHelper.create({ workroomId: series.workroomId, userId: helper.id });
    const other = await User.findByPk((await buildWorkroom()).ownerId, { rejectOnEmpty: true });
    for (const person of [helper, other, await buildUser()]) {
      await expect(savePiece(await contextFor(person), { series: series.slug, revision: 0, piece: await lowTide() })).rejects.toMatchObject({ code: 'NOT_FOUND' });
      expect(await patternPiece(await actorOf(person), series.slug)).toBeNull();
    }
    await expect(savePiece(contextOf(null), { series: series.slug, revision: 0, piece: await lowTide() })).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('whose bands lost a name says which parts ask for their amounts', async () => {
    const { series, ctx, teacher } = await scene();
    const asking = 'Weave <Amount of="band.dunes.rows"/>, then <Amount of="ends"/>.';
    await buildLesson({ seriesId: series.id, title: 'Gather' });
    await buildLesson({ seriesId: series.id, title: 'Slopes', draftSource: asking, draftReading: parseLessonText(asking), publishedVersionId: null });
    const listed = await buildLesson({ seriesId: series.id, title: 'Sky' });
    await buildGatheringItem({ lessonId: listed.id, amountKey: 'yarn.water' });
    const piece = await lowTide();
    await savePiece(ctx, { series: series.slug, revision: 0, piece });
    expect((await patternPiece(await actorOf(teacher), series.slug))?.asking).toEqual([]);
    await savePiece(ctx, { series: series.slug, revision: 1, piece: { ...piece, bands: piece.bands.map((band) => (band.name === 'dunes' ? { ...band, name: 'hills' } : band)) } });
    expect((await patternPiece(await actorOf(teacher), series.slug))?.asking).toEqual([{ part: 2, title: 'Slopes', keys: ['band.dunes.rows'] }]);
  });
});
