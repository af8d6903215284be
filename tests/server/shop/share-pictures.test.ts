import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { Context } from '#server/context.ts';
import { withOnlyPhotos, withOwnDrawings } from '#server/media/decoders.ts';
import { DiskMediaStore } from '#server/media/store.ts';
import { PatternPiece, SharePicture, User, type Series } from '#server/models/index.ts';
import { sharePictureOf } from '#server/queries/shop/share-pictures.ts';
import { drawSharePictures } from '#server/use-cases/shop/draw-share-pictures.ts';
import { contextOf } from '../../support/context.ts';
import { buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

let folder = '';
let store: DiskMediaStore;
let ctx: Context;

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'share-'));
  store = new DiskMediaStore(folder);
  ctx = contextOf(null, { media: store });
});
afterEach(() => rm(folder, { recursive: true, force: true }));

const files = async (series: Series): Promise<string[]> => readdir(join(folder, 'share', series.publicId)).catch(() => []);
/** Moves what is on record into the past, so that a change of this very millisecond is later. */
const aWhileAgo = (): Promise<unknown> => SharePicture.update({ drawnOf: new Date('2026-11-02T00:00:00Z') }, { where: {} });

describe('the picture that goes along where a series is passed on', () => {
  test('is drawn from the piece, once, in the size that is asked for everywhere', async () => {
    const series = await buildSeries({ slug: 'low-tide' });
    await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
    await drawSharePictures(ctx);
    const { fileKey } = (await sharePictureOf('low-tide')) ?? { fileKey: '' };
    const picture = await readFile(store.pathOf(fileKey));
    expect(await sharp(picture).metadata()).toMatchObject({ format: 'png', width: 1200, height: 630 });
    expect(picture.byteLength).toBeLessThan(600_000);
    const first = (await sharp(picture).stats()).channels.map(({ stdev }) => stdev);
    expect(Math.min(...first)).toBeGreaterThan(10);
    const before = await SharePicture.findByPk(series.id);
    await drawSharePictures(ctx);
    expect((await SharePicture.findByPk(series.id))?.updatedAt).toEqual(before?.updatedAt);
  }, 30_000);

  test('is made anew when name, piece or teacher change, and the old file goes; not when only the price does', async () => {
    const owner = await buildUser({ name: 'Ilse Marrow' });
    const series = await buildSeries({ slug: 'low-tide', workroomId: (await buildWorkroom({ ownerId: owner.id })).id });
    await drawSharePictures(ctx);
    const [first] = await files(series);
    await aWhileAgo();
    await series.update({ priceMinor: 1 });
    await drawSharePictures(ctx);
    expect(await files(series)).toEqual([first]);
    await aWhileAgo();
    await User.update({ name: 'Ilse Marrow-Pike' }, { where: { id: owner.id } });
    await drawSharePictures(ctx);
    const [second, ...more] = await files(series);
    expect(more).toEqual([]);
    expect(second).not.toBe(first);
  }, 30_000);

  test('is never made of a draft, and goes when a series is taken back', async () => {
    const draft = await buildSeries({ slug: 'secret', state: 'draft' });
    const open = await buildSeries({ slug: 'open' });
    await drawSharePictures(ctx);
    expect([await files(draft), await sharePictureOf('secret')]).toEqual([[], null]);
    await open.update({ state: 'draft' });
    expect(await sharePictureOf('open')).toBeNull();
    await drawSharePictures(ctx);
    expect([await files(open), await SharePicture.count()]).toEqual([[], 0]);
  }, 30_000);

  test('is of words alone where the piece cannot be made', async () => {
    const series = await buildSeries({ slug: 'odd' });
    await PatternPiece.create({ seriesId: series.id, data: { ...(await lowTide()), size: { widthMm: -1, heightMm: 0 } } });
    await drawSharePictures(ctx);
    expect(await sharePictureOf('odd')).not.toBeNull();
  }, 30_000);

  test('that cannot be written is not tried at each look', async () => {
    const series = await buildSeries({ slug: 'low-tide' });
    vi.spyOn(console, 'error').mockImplementation(() => undefined);
    const put = vi.spyOn(store, 'put').mockRejectedValue(new Error('no'));
    await drawSharePictures(ctx);
    await drawSharePictures(ctx);
    expect(put).toHaveBeenCalledTimes(1);
    expect([await sharePictureOf('low-tide'), (await SharePicture.findByPk(series.id))?.fileKey]).toEqual([null, null]);
    vi.restoreAllMocks();
  }, 30_000);

  test('comes a few at a time', async () => {
    for (let count = 0; count < 4; count += 1) await buildSeries();
    await drawSharePictures(ctx);
    expect(await SharePicture.count()).toBe(3);
    await drawSharePictures(ctx);
    expect(await SharePicture.count()).toBe(4);
  }, 30_000);
});

test('photos of people and our own drawings are never read at once', async () => {
  const seen: string[] = [];
  const slowly = (name: string) => async (): Promise<void> => {
    seen.push(`${name} begins`);
    await new Promise((resolve) => { setTimeout(resolve, 5); });
    seen.push(`${name} ends`);
  };
  const svg = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"/>');
  const first = [withOnlyPhotos(slowly('photo 1')), withOnlyPhotos(slowly('photo 2'))];
  await vi.waitUntil(() => seen.length >= 2);
  const work = [...first, withOwnDrawings(slowly('drawing 1')), withOnlyPhotos(slowly('photo 3')), withOwnDrawings(() => Promise.reject(new Error('no'))), withOnlyPhotos(() => sharp(svg).metadata())];
  const ended = await Promise.allSettled(work);
  expect(ended.map(({ status }) => status)).toEqual(['fulfilled', 'fulfilled', 'fulfilled', 'fulfilled', 'rejected', 'rejected']);
  expect(seen.slice(0, 2)).toEqual(['photo 1 begins', 'photo 2 begins']);
  expect(seen.indexOf('drawing 1 begins')).toBeGreaterThan(seen.indexOf('photo 2 ends'));
  expect(seen.indexOf('photo 3 begins')).toBeGreaterThan(seen.indexOf('drawing 1 ends'));
});
