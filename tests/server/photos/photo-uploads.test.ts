/** Photos that come in pieces, over real connections behind the real front. */
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { PHOTO_LIMITS } from '#core/photo/limits.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { Media, PhotoUpload, ProgressPhoto } from '#server/models/index.ts';
import { mediaFor } from '#server/queries/media/media-for.ts';
import { photoThread } from '#server/queries/photos/photo-thread.ts';
import { services } from '#server/services.ts';
import { lookAfterPhotoUploads } from '#server/use-cases/photos/look-after-photo-uploads.ts';
import { showPhotos } from '#server/use-cases/photos/show-photos.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed, type Followed } from '../../support/followed.ts';
import { beginningPhoto, going, openPhotoDoor, type UploadDoor } from '../../support/upload-door.ts';

let followed: Followed;
let door: UploadDoor;
let at: { series: string; lesson: string };

beforeEach(async () => {
  followed = await buildFollowed();
  at = { series: followed.series.slug, lesson: followed.parts[1].publicId };
  door = await openPhotoDoor(await contextFor(followed.student));
});
afterEach(() => door.stop());

const picture = (red = 120): Promise<Buffer> => sharp({ create: { width: 640, height: 480, channels: 3, background: { r: red, g: 90, b: 60 }, noise: { type: 'gaussian', mean: 120, sigma: 40 } } }).jpeg().toBuffer();
const begin = async (byteCount: number): Promise<string> => (await door.send(beginningPhoto(at, byteCount)))?.headers.location ?? '';
const idIn = (path: string): string => path.split('/').at(-1) ?? '';
const bytesLeft = async (): Promise<string[]> => readdir(await services().media.temporaryFolder('photos'));
const offsetOf = async (path: string): Promise<number> => Number((await door.send({ method: 'HEAD', path }))?.headers['upload-offset']);
const show = async (shots: readonly string[], words = '') => showPhotos(await contextFor(followed.student), { ...at, words, shots: [...shots] });

async function arrived(bytes?: Buffer): Promise<string> {
  const photo = bytes ?? (await picture());
  const path = await begin(photo.length);
  expect((await door.send(going(path, 0, photo)))?.status).toBe(204);
  return idIn(path);
}

describe('a photo in pieces', () => {
  test('cut off in the middle goes on from the last byte, also at a server just started', async () => {
    const photo = await picture();
    const path = await begin(photo.length);
    const half = Math.floor(photo.length / 2);
    await door.send(going(path, 0, photo, { after: half, hasArrived: async () => (await offsetOf(path)) >= half }));
    await door.stop();
    door = await openPhotoDoor(await contextFor(followed.student));
    const offset = await offsetOf(path);
    expect(offset).toBeGreaterThanOrEqual(half);
    expect((await door.send(going(path, offset, photo.subarray(offset))))?.status).toBe(204);
    await show([idIn(path)], 'From the left.');
    expect(await photoThread(followed.seat.id, followed.parts[1].id)).toMatchObject([{ words: 'From the left.', verdict: 'waits', shots: [{ width: 640, height: 480 }] }]);
    expect([await PhotoUpload.count(), await bytesLeft()]).toEqual([0, []]);
  });

  test('whose last answer was lost is whole when its sender asks again', async () => {
    const photo = await picture();
    const path = await begin(photo.length);
    await door.send(going(path, 0, photo));
    expect(await offsetOf(path)).toBe(photo.length);
  });

  test('is nobody else’s to look at, to send on, or to show', async () => {
    const shot = await arrived();
    const other = await contextFor(await buildUser());
    door.ctx = other;
    expect((await door.send({ method: 'HEAD', path: `/api/photos/pieces/${shot}` }))?.status).toBe(404);
    await expect(showPhotos(other, { ...at, words: '', shots: [shot] })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await mediaFor(other.actor, shot, new Date())).toBeNull();
    door.ctx = contextOf(null);
    expect((await door.send(beginningPhoto(at, 10)))?.status).toBe(401);
  });

  test.each([
    [0, 415, 'This file is empty'],
    [60_000_000, 413, 'larger than 25 MB'],
  ])('of %i bytes is refused before a byte comes', async (byteCount, status, says) => {
    const answer = await door.send(beginningPhoto(at, byteCount));
    expect([answer?.status, answer?.text]).toEqual([status, expect.stringContaining(says)]);
    expect(await Media.count()).toBe(0);
  });

  test('that is no photo is refused with a sentence, and nothing of it stays', async () => {
    const path = await begin(11);
    const answer = await door.send(going(path, 0, Buffer.from('not a photo')));
    expect([answer?.status, answer?.text]).toEqual([415, expect.stringContaining('not a photo we can read')]);
    expect([await Media.count(), await bytesLeft()]).toEqual([0, []]);
  });

  test('is not begun without a seat, and told so in words when the seat has ended', async () => {
    await followed.seat.update({ state: 'closed' });
    const answer = await door.send(beginningPhoto(at, 100));
    expect([answer?.status, answer?.text]).toEqual([410, expect.stringContaining('Your seat in this series has ended')]);
    door.ctx = await contextFor(await buildUser());
    expect((await door.send(beginningPhoto(at, 100)))?.status).toBe(404);
  });

  test('one too many on their way waits its turn', async () => {
    for (let number = 0; number < PHOTO_LIMITS.maxUnshown; number += 1) await begin(100);
    expect((await door.send(beginningPhoto(at, 100)))?.status).toBe(409);
  });
});

describe('showing what has come', () => {
  test('several are one entry of the thread, each seen by the student and her teacher', async () => {
    const shots = [await arrived(await picture(1)), await arrived(await picture(2)), await arrived(await picture(3))];
    await show(shots);
    const [entry, ...more] = await photoThread(followed.seat.id, followed.parts[1].id);
    expect([more, entry?.shots.map(({ mediaId }) => mediaId)]).toEqual([[], shots]);
    const student = (await contextFor(followed.student)).actor;
    for (const shot of shots) expect(await mediaFor(student, shot, new Date())).not.toBeNull();
  });

  test('asked twice is one showing; the same file sent once more is that one too, and its copy goes', async () => {
    const photo = await picture();
    const shot = await arrived(photo);
    const first = await show([shot]);
    expect((await show([shot])).id).toBe(first.id);
    const again = await arrived(photo);
    expect((await show([again])).id).toBe(first.id);
    expect([await ProgressPhoto.count(), await Media.count()]).toEqual([1, 1]);
  });

  test('after the seat was refunded meanwhile it is told so, and nothing is kept', async () => {
    const shot = await arrived();
    await followed.seat.update({ state: 'closed' });
    await expect(show([shot])).rejects.toMatchObject({ code: 'GONE' });
    expect(await ProgressPhoto.count()).toBe(0);
  });

  test('one that is not whole is waited for', async () => {
    const path = await begin(100);
    await expect(show([idIn(path)])).rejects.toMatchObject({ code: 'CONFLICT' });
    await expect(show(['0'.repeat(26)])).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });
});

test('what is not shown within a week is forgotten, what is shown stays', async () => {
  await show([await arrived(await picture(1))]);
  const unshown = await arrived(await picture(2));
  await begin(100);
  await sequelize.query('UPDATE photo_uploads SET created_at = created_at - INTERVAL 8 DAY');
  await lookAfterPhotoUploads(await contextFor(followed.student));
  expect([await ProgressPhoto.count(), await Media.count()]).toEqual([1, 1]);
  expect(await services().media.byteCount(join('photos', unshown, 'large.webp'))).toBeNull();
});
