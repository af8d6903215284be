import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { DiskMediaStore } from '#server/media/store.ts';
import { Media, SeriesMedia, type Lesson, type Series, type User } from '#server/models/index.ts';
import { mediaFor } from '#server/queries/media/media-for.ts';
import { mediaOfSeries } from '#server/queries/media/media-of-series.ts';
import { putInPicture } from '#server/use-cases/pictures/put-in-picture.ts';
import { actorOf, contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

let folder = '';
let teacher: User;
let series: Series;
let lesson: Lesson;
let ctx: TestContext;
beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'fellmark-picture-'));
  teacher = await buildUser({ name: 'Ilse Marrow' });
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id });
  lesson = await buildLesson({ seriesId: series.id });
  ctx = await contextFor(teacher, { media: new DiskMediaStore(join(folder, 'uploads')) });
});
afterEach(() => rm(folder, { recursive: true }));

async function picture(bytes?: Buffer, originalName = 'Warped loom.JPG') {
  const path = join(folder, 'upload');
  await writeFile(path, bytes ?? (await sharp({ create: { width: 640, height: 480, channels: 3, background: '#7a8f99' } }).withExif({ IFD0: { Artist: 'Ilse' } }).jpeg().toBuffer()));
  return { lesson: lesson.publicId, alt: 'A frame with 66 ends', path, originalName };
}
const files = async (): Promise<string[]> => (await readdir(join(folder, 'uploads', 'pictures'), { recursive: true }).catch(() => [])).filter((name) => name.endsWith('.webp'));

describe('a picture for a text', () => {
  test('gets a name of its own, is written anew without what the camera noted, and stands among the series’ pictures', async () => {
    expect([await putInPicture(ctx, await picture()), await putInPicture(ctx, await picture())]).toEqual(['warped-loom', 'warped-loom-2']);
    const [first] = (await mediaOfSeries(series.id)).filter(({ name }) => name === 'warped-loom');
    expect(first).toMatchObject({ kind: 'picture', detail: { alt: 'A frame with 66 ends' } });
    const written = await sharp(join(folder, 'uploads', first?.files['large']?.key ?? '')).metadata();
    expect([written.format, written.exif]).toEqual(['webp', undefined]);
  });

  test('is seen by its teacher, and by students only once a published text speaks of it', async () => {
    await putInPicture(ctx, await picture());
    const media = await Media.findOne({ where: { kind: 'picture' }, rejectOnEmpty: true });
    const student = await buildUser();
    await buildEnrolment({ userId: student.id, seriesId: series.id });
    expect(await mediaFor(await actorOf(teacher), media.publicId, ctx.clock.now())).not.toBeNull();
    expect(await mediaFor(await actorOf(student), media.publicId, ctx.clock.now())).toBeNull();
    expect(await mediaFor(null, media.publicId, ctx.clock.now())).toBeNull();
  });

  test.each([
    ['a drawing with a script, called a photo', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>'), 'UNSUPPORTED'],
    ['a page', Buffer.from('<!DOCTYPE html><script>alert(1)</script>'), 'UNSUPPORTED'],
    ['nothing', Buffer.alloc(0), 'UNSUPPORTED'],
    ['half a photo', Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0x00, 0x10]), 'UNSUPPORTED'],
  ])('that is %s leaves neither row nor file', async (_words, bytes, code) => {
    await expect(putInPicture(ctx, await picture(bytes))).rejects.toMatchObject({ code, says: expect.stringMatching(/\w/) });
    expect([await Media.count(), await SeriesMedia.count(), await files()]).toEqual([0, 0, []]);
  });

  test('for another teacher’s part, a part that is not there, or from a visitor is refused', async () => {
    const other = await contextFor(await buildUser(), { media: ctx.services.media });
    await expect(putInPicture(other, await picture())).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(putInPicture(ctx, { ...(await picture()), lesson: '0'.repeat(26) })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(putInPicture(contextOf(null), await picture())).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    expect([await Media.count(), await files()]).toEqual([0, []]);
  });

  test('does not go over the teacher’s room, and leaves nothing behind', async () => {
    await Media.create({ ownerId: teacher.id, kind: 'picture', state: 'ready', originalName: 'many.jpg', byteCount: 1_999_999_999, files: {}, detail: {} });
    await expect(putInPicture(ctx, await picture())).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('2 GB') });
    expect([await Media.count(), await SeriesMedia.count(), await files()]).toEqual([1, 0, []]);
  });
});
