import { mkdir, mkdtemp, readdir, utimes, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { beforeEach, describe, expect, test } from 'vitest';
import { VIDEO_LIMITS } from '#core/video/limits.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { DiskMediaStore } from '#server/media/store.ts';
import { Job, Media, SeriesMedia, User, type Lesson } from '#server/models/index.ts';
import { beginVideoUpload } from '#server/use-cases/videos/begin-upload.ts';
import { lookAfterUploads } from '#server/use-cases/videos/look-after-uploads.ts';
import { contextFor, type TestContext } from '../../support/context.ts';
import { buildLesson, buildSeries, buildWorkroom } from '../../support/factories.ts';

let ctx: TestContext;
let store: DiskMediaStore;
let folder: string;
let lesson: Lesson;

beforeEach(async () => {
  store = new DiskMediaStore(join(await mkdtemp(join(tmpdir(), 'fellmark-after-')), 'uploads'));
  const workroom = await buildWorkroom();
  ctx = await contextFor(await User.findByPk(workroom.ownerId, { rejectOnEmpty: true }), { media: store });
  ctx.clock.set(new Date());
  lesson = await buildLesson({ seriesId: (await buildSeries({ workroomId: workroom.id })).id });
  folder = await store.temporaryFolder('videos');
});

async function begun(bytes: number): Promise<string> {
  const publicId = newPublicId();
  await beginVideoUpload(ctx, publicId, { lesson: lesson.publicId, name: null, fileName: 'a.mp4', fileType: '', byteCount: 4 });
  await writeFile(join(folder, publicId), 'x'.repeat(bytes));
  return publicId;
}
const later = (hours: number): Promise<void> => {
  ctx.clock.set(new Date(Date.now() + hours * 3_600_000));
  return lookAfterUploads(ctx);
};

describe('looking after uploads', () => {
  test('sends on what came whole, and leaves what is still arriving', async () => {
    const [whole, half] = [await begun(4), await begun(2)];
    await lookAfterUploads(ctx);
    expect([(await Media.findOne({ where: { publicId: whole } }))?.state, (await Media.findOne({ where: { publicId: half } }))?.state]).toEqual(['uploaded', 'created']);
    expect(await Job.count()).toBe(1);
  });

  test('forgets what was not finished in a week, and gives its room back', async () => {
    await begun(2);
    await later(VIDEO_LIMITS.uploadHours - 1);
    expect(await Media.count()).toBe(1);
    await later(VIDEO_LIMITS.uploadHours + 1);
    expect([await Media.count(), await SeriesMedia.count(), await readdir(folder)]).toEqual([0, 0, []]);
  });

  test('sweeps away bytes no row speaks of, and what dead workers left, once they are old', async () => {
    const work = join(await store.temporaryFolder('video-work'), 'left-behind');
    await mkdir(work);
    await writeFile(join(folder, 'nobody'), 'x');
    await lookAfterUploads(ctx);
    expect(await readdir(folder)).toEqual(['nobody']);
    const old = new Date(Date.now() - 50 * 3_600_000);
    for (const path of [work, join(folder, 'nobody')]) await utimes(path, old, old);
    await lookAfterUploads(ctx);
    expect([await readdir(folder), await readdir(join(work, '..'))]).toEqual([[], []]);
  });

  test('removes films nothing shows any more after thirty days, and no others', async () => {
    const ownerId = ctx.actor?.userId ?? 0;
    const make = async (name: string): Promise<Media> => {
      const key = `videos/${name}/video.mp4`;
      const temporary = await store.temporaryPath(name);
      await writeFile(temporary, 'film');
      await store.put(key, temporary);
      return Media.create({ ownerId, kind: 'video', state: 'ready', originalName: 'a.mp4', files: { video: { key, contentType: 'video/mp4', byteCount: 4 } }, detail: {} });
    };
    const [shown, unused] = [await make('shown'), await make('unused')];
    await SeriesMedia.create({ seriesId: lesson.seriesId, name: 'film', mediaId: shown.id });
    await sequelize.query('UPDATE media SET updated_at = updated_at - INTERVAL 29 DAY');
    await lookAfterUploads(ctx);
    expect(await Media.count()).toBe(2);
    await sequelize.query('UPDATE media SET updated_at = updated_at - INTERVAL 2 DAY');
    await lookAfterUploads(ctx);
    expect((await Media.findAll()).map(({ id }) => id)).toEqual([shown.id]);
    expect([await store.byteCount('videos/shown/video.mp4'), await store.byteCount('videos/unused/video.mp4')]).toEqual([4, null]);
    expect(unused.files['video']).toBeDefined();
  });
});
