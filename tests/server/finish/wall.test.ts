import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { HangForm, HidePieceForm } from '#contracts/finish.ts';
import { DiskMediaStore } from '#server/media/store.ts';
import { AuditEntry, LessonVisit, User, WallPiece, Workroom, WorkroomHelper } from '#server/models/index.ts';
import { finishedPiece } from '#server/queries/finish/finished-piece.ts';
import { wallPieces } from '#server/queries/finish/wall-pieces.ts';
import { mediaFor } from '#server/queries/media/media-for.ts';
import { hangPiece } from '#server/use-cases/finish/hang-piece.ts';
import { hidePiece, showPiece } from '#server/use-cases/finish/hide-piece.ts';
import { saySo } from '#server/use-cases/finish/say-so.ts';
import { showFinished } from '#server/use-cases/finish/show-finished.ts';
import { takeOffWall } from '#server/use-cases/finish/take-off-wall.ts';
import { takePhotoOut } from '#server/use-cases/finish/take-photo-out.ts';
import { sendFile } from '#server/web/send-file.ts';
import { actorOf, contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildUser, buildWorkroom } from '../../support/factories.ts';
import { buildFollowed, type Followed } from '../../support/followed.ts';

const NOW = new Date('2026-12-01T10:00:00Z');
let folder = '';
let followed: Followed;
let teacher: User;
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'fellmark-wall-'));
  followed = await buildFollowed();
  const { ownerId } = await Workroom.findByPk(followed.series.workroomId, { rejectOnEmpty: true });
  teacher = await User.findByPk(ownerId, { rejectOnEmpty: true });
});
afterEach(() => rm(folder, { recursive: true }));

const ctxOf = (user: User): Promise<TestContext> => contextFor(user, { media: new DiskMediaStore(join(folder, 'uploads')) });
const asked = (given: Record<string, string> = {}) => HangForm.parse({ series: followed.series.slug, name: 'Maud', words: 'For the stairs.', agreed: 'yes', ...given });
async function finish(): Promise<void> {
  for (const { id } of followed.parts) await LessonVisit.create({ enrolmentId: followed.seat.id, lessonId: id, finishedAt: NOW });
}
async function photograph(red = 120): Promise<void> {
  const path = join(folder, 'upload');
  await writeFile(path, await sharp({ create: { width: 64, height: 48, channels: 3, background: { r: red, g: 143, b: 153 } } }).jpeg().toBuffer());
  await showFinished(await ctxOf(followed.student), { series: followed.series.slug, file: { path, originalName: 'finished.jpg' } });
}
async function hung(): Promise<{ readonly piece: string; readonly photo: string }> {
  await finish();
  await photograph();
  await hangPiece(await ctxOf(followed.student), asked());
  const [piece] = (await wallPieces(null, { limit: 10 })).shown;
  if (piece === undefined) throw new RangeError('nothing hangs');
  return { piece: piece.publicId, photo: piece.photo.publicId };
}
const names = async (user: User | null = null): Promise<string[]> => (await wallPieces(user === null ? null : await actorOf(user), { limit: 10 })).shown.map(({ name }) => name);
const sees = async (user: User | null, photo: string): Promise<boolean> => (await mediaFor(user === null ? null : await actorOf(user), photo, NOW)) !== null;

describe('the wall refuses', () => {
  test('what nobody agreed to', () => {
    for (const given of [{}, { agreed: 'no' }, { agreed: '' }]) {
      const parsed = HangForm.safeParse({ series: 'low-tide', name: 'Maud', ...given });
      expect(parsed.error?.issues.map(({ path }) => path[0])).toEqual(['agreed']);
    }
    expect(HangForm.safeParse({ series: 'low-tide', name: ' ', agreed: 'yes' }).success).toBe(false);
  });

  test('a visitor, a stranger, who has not finished, whoever only says so, and a piece without a photo', async () => {
    await expect(hangPiece(contextOf(null), asked())).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(hangPiece(await ctxOf(await buildUser()), asked())).rejects.toMatchObject({ code: 'NOT_FOUND' });
    const ctx = await ctxOf(followed.student);
    await expect(hangPiece(ctx, asked())).rejects.toMatchObject({ code: 'CONFLICT' });
    await saySo(ctx, { series: followed.series.slug });
    await photograph();
    await expect(hangPiece(ctx, asked())).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('pieces of finishers') });
    await finish();
    await takePhotoOut(ctx, { series: followed.series.slug });
    await expect(hangPiece(ctx, asked())).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('shows your photo') });
    expect([await names(), await WallPiece.count()]).toEqual([[], 0]);
  });

  test('another teacher, a helper and the maker the right to take down or put back', async () => {
    const { piece } = await hung();
    const wren = await buildUser();
    await WorkroomHelper.create({ workroomId: followed.series.workroomId, userId: wren.id });
    const other = await User.findByPk((await buildWorkroom()).ownerId, { rejectOnEmpty: true });
    for (const ctx of [contextOf(null), await contextFor(followed.student), await contextFor(wren), await contextFor(other)]) {
      await expect(hidePiece(ctx, { piece, reason: 'No.' })).rejects.toMatchObject({ code: 'NOT_FOUND' });
      await expect(showPiece(ctx, { piece })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    }
    expect(await names()).toEqual(['Maud']);
  });
});

describe('a piece on the wall', () => {
  test('is seen by everybody with its photo, as she agreed; before that the photo is hers alone', async () => {
    await finish();
    await photograph();
    const kept = (await finishedPiece(await actorOf(followed.student), followed.series.slug, NOW))?.photo?.publicId ?? '';
    expect([await sees(null, kept), await sees(teacher, kept), await sees(followed.student, kept)]).toEqual([false, false, true]);
    await hangPiece(await ctxOf(followed.student), asked());
    expect([await sees(null, kept), await sees(teacher, kept), await sees(await buildUser(), kept)]).toEqual([true, true, true]);
    expect((await wallPieces(null, { limit: 10 })).shown).toMatchObject([{ name: 'Maud', words: 'For the stairs.', seriesTitle: 'Low Tide', mayTakeDown: false }]);
    expect(await WallPiece.findOne()).toMatchObject({ agreedTo: 'wall-1', agreedAt: NOW, withdrawnAt: null });
  });

  test('is gone at once when she takes it down, also for whoever kept the address of the photo', async () => {
    const { photo } = await hung();
    // A browser asks each time, so that no copy outlives her word.
    const found = await mediaFor(null, photo, NOW);
    expect(found?.mayBeWithdrawn).toBe(true);
    expect(sendFile({ key: 'photos/x', contentType: 'image/webp', byteCount: 1 }, 'ask-each-time').headers.get('Cache-Control')).toBe('private, no-cache, no-transform');
    await takeOffWall(await ctxOf(followed.student), { series: followed.series.slug });
    expect([await names(), await sees(null, photo), await sees(teacher, photo), await sees(followed.student, photo)]).toEqual([[], false, false, true]);
    expect((await WallPiece.findOne())?.withdrawnAt).toEqual(NOW);
    await hangPiece(await ctxOf(followed.student), asked({ name: 'M.' }));
    expect(await names()).toEqual(['M.']);
  });

  test.each([
    ['another photo takes the place of the one she agreed to', () => photograph(9)],
    ['the photo is taken out', async () => takePhotoOut(await ctxOf(followed.student), { series: followed.series.slug })],
    ['her seat has ended, as by a refund', () => followed.seat.update({ state: 'closed' })],
    ['the series is a draft again', () => followed.series.update({ state: 'draft' })],
    ['the seat is gone with its person', () => followed.seat.destroy()],
  ])('is gone when %s', async (_what, ends) => {
    const { photo } = await hung();
    await ends();
    expect([await names(), await sees(null, photo)]).toEqual([[], false]);
  });

  test('can be taken down by her even when her seat has ended', async () => {
    await hung();
    await followed.seat.update({ state: 'closed' });
    await takeOffWall(await ctxOf(followed.student), { series: followed.series.slug });
    await followed.seat.update({ state: 'active' });
    expect(await names()).toEqual([]);
    await expect(takeOffWall(await ctxOf(await buildUser()), { series: followed.series.slug })).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });

  test('is hidden by the teacher or the steward with a reason that its maker reads, and stays so when she hangs it anew', async () => {
    const { piece, photo } = await hung();
    const pell = await buildUser({ isSteward: true });
    for (const who of [teacher, pell]) {
      const ctx = await contextFor(who);
      await hidePiece(ctx, HidePieceForm.parse({ piece, reason: 'Somebody’s face is in it.' }));
      expect([await names(), await sees(null, photo), await sees(who, photo)]).toEqual([[], false, false]);
      expect((await finishedPiece(await actorOf(followed.student), followed.series.slug, NOW))?.wall).toMatchObject({ hiddenWhy: 'Somebody’s face is in it.' });
      await hangPiece(await ctxOf(followed.student), asked());
      expect(await names()).toEqual([]);
      expect((await wallPieces(await actorOf(who), { limit: 10 })).takenDown).toMatchObject([{ publicId: piece, why: 'Somebody’s face is in it.' }]);
      expect((await wallPieces(await actorOf(followed.student), { limit: 10 })).takenDown).toEqual([]);
      await showPiece(ctx, { piece });
      expect(await names()).toEqual(['Maud']);
    }
    expect((await AuditEntry.findAll({ order: ['id'] })).map(({ action }) => action)).toEqual(['hide-wall-piece', 'show-wall-piece', 'hide-wall-piece', 'show-wall-piece']);
  });
});
