import { beforeEach, describe, expect, test } from 'vitest';
import { Media, SeriesMedia } from '#server/models/index.ts';
import { keptPlaces } from '#server/queries/videos/kept-places.ts';
import { keepPlace } from '#server/use-cases/progress/keep-place.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed } from '../../support/followed.ts';

let followed: Awaited<ReturnType<typeof buildFollowed>>;
beforeEach(async () => {
  followed = await buildFollowed();
  const media = await Media.create({ ownerId: followed.student.id, kind: 'video', state: 'ready', originalName: 'a.mp4', files: {}, detail: {} });
  await SeriesMedia.create({ seriesId: followed.series.id, name: 'film', mediaId: media.id });
});
const at = (placeMs: number, part = 0) => ({ series: followed.series.slug, lesson: followed.parts[part]?.publicId ?? '', name: 'film', placeMs });

describe('the place in a film', () => {
  test('is where she stopped last; how far she ever was only grows', async () => {
    const ctx = await contextFor(followed.student);
    for (const placeMs of [5_000, 60_000, 20_000]) await keepPlace(ctx, at(placeMs));
    expect(await keptPlaces(followed.seat.id)).toEqual({ film: { placeMs: 20_000, furthestMs: 60_000 } });
  });

  test('is kept for nobody else, for no part that is closed, and for no film that is none', async () => {
    await expect(keepPlace(contextOf(null), at(1))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(keepPlace(await contextFor(await buildUser()), at(1))).rejects.toMatchObject({ code: 'NOT_FOUND' });
    const ctx = await contextFor(followed.student);
    await expect(keepPlace(ctx, at(1, 2))).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(keepPlace(ctx, { ...at(1), name: 'other' })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await keptPlaces(followed.seat.id)).toEqual({});
  });
});
