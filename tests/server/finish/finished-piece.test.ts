import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { FinishedForm } from '#contracts/finish.ts';
import { DiskMediaStore } from '#server/media/store.ts';
import { FinishedPiece, LessonVisit, Media, MyPieceRow, WeavingTime, type User } from '#server/models/index.ts';
import { finishedPiece } from '#server/queries/finish/finished-piece.ts';
import { mediaFor } from '#server/queries/media/media-for.ts';
import { saySo } from '#server/use-cases/finish/say-so.ts';
import { showFinished } from '#server/use-cases/finish/show-finished.ts';
import { takePhotoOut } from '#server/use-cases/finish/take-photo-out.ts';
import { writeDown } from '#server/use-cases/finish/write-down.ts';
import { actorOf, contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed, type Followed } from '../../support/followed.ts';

const NOW = new Date('2026-12-01T10:00:00Z');
let folder = '';
let followed: Followed;
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'fellmark-finish-'));
  followed = await buildFollowed();
});
afterEach(() => rm(folder, { recursive: true }));

const ctxOf = (user: User): Promise<TestContext> => contextFor(user, { media: new DiskMediaStore(join(folder, 'uploads')) });
const kept = async (): Promise<string[]> => (await readdir(join(folder, 'uploads', 'photos'), { recursive: true }).catch(() => [])).filter((name) => name.endsWith('.webp'));
const form = (fields: Record<string, string> = {}) => FinishedForm.parse({ series: followed.series.slug, ...fields });
async function finish(): Promise<void> {
  for (const { id } of followed.parts) await LessonVisit.create({ enrolmentId: followed.seat.id, lessonId: id, finishedAt: NOW });
}
async function photo(red = 120) {
  const path = join(folder, 'upload');
  await writeFile(path, await sharp({ create: { width: 640, height: 480, channels: 3, background: { r: red, g: 143, b: 153 } } }).withExif({ IFD0: { Copyright: 'Maud Ellery' } }).jpeg().toBuffer());
  return { series: followed.series.slug, file: { path, originalName: 'finished.jpg' } };
}
const seen = async () => {
  const piece = await finishedPiece(await actorOf(followed.student), followed.series.slug, NOW);
  if (piece === null) throw new RangeError('no piece');
  return piece;
};

describe('a finished piece is refused', () => {
  test('to a visitor, without a seat, and when the seat has ended', async () => {
    await finish();
    const stranger = await buildUser();
    for (const act of [(ctx: TestContext) => writeDown(ctx, form()), (ctx: TestContext) => saySo(ctx, { series: followed.series.slug }), (ctx: TestContext) => takePhotoOut(ctx, { series: followed.series.slug }), async (ctx: TestContext) => showFinished(ctx, await photo())]) {
      await expect(act(contextOf(null))).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
      await expect(act(await ctxOf(stranger))).rejects.toMatchObject({ code: 'NOT_FOUND' });
    }
    await followed.seat.update({ state: 'closed' });
    await expect(writeDown(await ctxOf(followed.student), form())).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect([await FinishedPiece.count(), await Media.count(), await kept()]).toEqual([0, 0, []]);
  });

  test('before it is finished or said to be', async () => {
    const ctx = await ctxOf(followed.student);
    await expect(writeDown(ctx, form())).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(showFinished(ctx, await photo())).rejects.toMatchObject({ code: 'CONFLICT' });
    expect([await FinishedPiece.count(), await kept()]).toEqual([0, []]);
    await saySo(ctx, { series: followed.series.slug });
    await writeDown(ctx, form({ took: '14' }));
    expect(await seen()).toMatchObject({ hasFinished: false, mayWriteDown: true, minutes: 840 });
  });

  test('where a field cannot be read: each says why, and nothing is kept', async () => {
    await finish();
    const ctx = await ctxOf(followed.student);
    await expect(writeDown(ctx, form({ 'grams:warp': 'much', 'fibre:warp': '80 % cotton', 'fibre:yarn.water': 'moonlight' }))).rejects.toMatchObject({
      code: 'VALIDATION',
      fields: { 'grams:warp': expect.any(String), 'fibre:warp': expect.stringContaining('comes to 80 %'), 'fibre:yarn.water': expect.stringContaining('“moonlight” is no fibre name') },
    });
    expect(await FinishedPiece.count()).toBe(0);
    expect(FinishedForm.safeParse({ series: 'low-tide', took: 'long' }).success).toBe(false);
  });

  test('a photo that is none, without a row or a file left', async () => {
    await finish();
    const given = await photo();
    await writeFile(given.file.path, '<svg xmlns="http://www.w3.org/2000/svg"/>');
    await expect(showFinished(await ctxOf(followed.student), given)).rejects.toMatchObject({ code: 'UNSUPPORTED' });
    expect([await Media.count(), await kept()]).toEqual([0, []]);
  });
});

describe('a finished piece', () => {
  test('begins with the hours she wrote down and the yarn of her own plan', async () => {
    await finish();
    await MyPieceRow.create({ enrolmentId: followed.seat.id, data: { yarns: { water: { tex: 330 } } } });
    await WeavingTime.bulkCreate([{ enrolmentId: followed.seat.id, day: '2026-11-20', minutes: 90 }, { enrolmentId: followed.seat.id, day: '2026-11-21', minutes: 45 }]);
    const piece = await seen();
    expect([piece.minutes, piece.writtenDownMinutes, piece.note]).toEqual([null, 135, '']);
    expect(piece.yarns.map(({ key, toldFibre }) => [key, toldFibre])).toContainEqual(['warp', 'cotton']);
    // Of her own yarn nobody said what it is made of: it is not told as the pattern's.
    expect(piece.yarns.find(({ key }) => key === 'yarn.water')?.toldFibre).toBe('');
  });

  test('keeps what differs from the plan, and all of it can be changed later', async () => {
    await finish();
    const ctx = await ctxOf(followed.student);
    await writeDown(ctx, form({ took: '12 h 30', note: 'For Jonas.', 'grams:yarn.water': '88 g', 'fibre:yarn.water': '80 % wool, 20 % nylon', 'fibre:warp': 'cotton', 'fibre:yarn.sand': '' }));
    expect(await seen()).toMatchObject({ minutes: 750, note: 'For Jonas.', said: { 'yarn.water': { grams: 88, fibre: '80 % wool, 20 % nylon' }, 'yarn.sand': { fibre: '' } } });
    expect((await seen()).said).not.toHaveProperty('warp');
    await writeDown(ctx, form({ took: '' }));
    expect(await seen()).toMatchObject({ minutes: null, note: '' });
  });

  test('has one photo: another takes its place, nothing of the file but the picture is kept, and it is hers alone', async () => {
    await finish();
    const ctx = await ctxOf(followed.student);
    await showFinished(ctx, await photo(1));
    const first = (await seen()).photo;
    await showFinished(ctx, await photo(200));
    const second = (await seen()).photo;
    expect(second).toMatchObject({ width: 640, height: 480 });
    expect(second?.publicId).not.toBe(first?.publicId);
    expect([await Media.count(), (await kept()).length]).toEqual([1, 2]);
    for (const name of await kept()) expect((await sharp(join(folder, 'uploads', 'photos', name)).metadata()).exif).toBeUndefined();
    const asked = async (user: User | null) => (await mediaFor(user === null ? null : await actorOf(user), second?.publicId ?? '', NOW)) !== null;
    expect([await asked(followed.student), await asked(null), await asked(await buildUser())]).toEqual([true, false, false]);
    await takePhotoOut(ctx, { series: followed.series.slug });
    expect([(await seen()).photo, await Media.count(), await kept()]).toEqual([null, 0, []]);
  });
});
