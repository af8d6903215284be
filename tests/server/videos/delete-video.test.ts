import { writeFile } from 'node:fs/promises';
import { beforeEach, describe, expect, test } from 'vitest';
import { factsOf } from '#core/lesson-text/lesson-facts.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { Lesson, LessonVersion, Media, SeriesMedia, VideoPlace, WorkroomHelper, type Series, type User } from '#server/models/index.ts';
import { videoDesk } from '#server/queries/videos/video-desk.ts';
import { deleteVideo } from '#server/use-cases/videos/delete-video.ts';
import { actorOf, contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';

let teacher: User;
let ctx: TestContext;
let series: Series;
let part: Lesson;

beforeEach(async () => {
  teacher = await buildUser();
  series = await buildSeries({ workroomId: (await buildWorkroom({ ownerId: teacher.id })).id });
  ctx = await contextFor(teacher);
  part = await buildLesson({ seriesId: series.id });
});

const WITH = '<Video name="wind"/>\n\nWind it.';

async function putFilm(given: { state?: 'ready' | 'processing' } = {}): Promise<Media> {
  const path = await ctx.services.media.temporaryPath('film.mp4');
  await writeFile(path, 'film');
  const key = `videos/film-${Date.now().toString(36)}/video.mp4`;
  await ctx.services.media.put(key, path);
  const media = await Media.create({ ownerId: teacher.id, kind: 'video', state: given.state ?? 'ready', originalName: 'film.mp4', byteCount: 4, files: { video: { key, contentType: 'video/mp4', byteCount: 4 } }, detail: {} });
  await SeriesMedia.create({ seriesId: series.id, name: 'wind', title: 'Winding', mediaId: media.id });
  return media;
}

async function read(source: string, as: 'draft' | 'published'): Promise<void> {
  const reading = parseLessonText(source);
  if (!reading.ok) throw new RangeError(source);
  if (as === 'draft') { await part.update({ draftSource: source, draftReading: reading }); return; }
  const version = await LessonVersion.create({ lessonId: part.id, number: 7 + (await LessonVersion.count()), source, tree: reading.tree, facts: factsOf(reading.tree) });
  await part.update({ publishedVersionId: version.id });
}

const remove = (as = ctx) => deleteVideo(as, { series: series.slug, name: 'wind' });

describe('a ready video', () => {
  test('is deleted by nobody but its teacher', async () => {
    await putFilm();
    const helper = await buildUser();
    await WorkroomHelper.create({ workroomId: series.workroomId, userId: helper.id });
    const other = await buildUser();
    await buildWorkroom({ ownerId: other.id });
    for (const stranger of [await contextFor(helper), await contextFor(other), contextOf(null)]) await expect(remove(stranger)).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await Media.count()).toBe(1);
  });

  test('stays while students see it, and while a draft speaks of it; the page says in which part', async () => {
    await putFilm();
    await read(WITH, 'draft');
    await read(WITH, 'published');
    await expect(remove()).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('Students see it in Part 1') });
    expect((await videoDesk(await actorOf(teacher), series.slug, 'wind'))?.uses).toMatchObject([{ number: 1, inDraft: true, isPublished: true }]);
    await read('Wind it.', 'published');
    await expect(remove()).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('The text of Part 1 speaks of it') });
    expect(await SeriesMedia.count()).toBe(1);
  });

  test('stays while another one arrives for its place', async () => {
    const media = await putFilm();
    const arriving = await Media.create({ ownerId: teacher.id, kind: 'video', state: 'processing', originalName: 'b.mp4', files: {}, detail: {} });
    await SeriesMedia.update({ draftMediaId: arriving.id }, { where: { mediaId: media.id } });
    await expect(remove()).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('on its way') });
  });

  test('goes with its files and the places students kept in it, in this series only', async () => {
    const media = await putFilm();
    const seat = await buildEnrolment({ seriesId: series.id });
    const elsewhere = await buildEnrolment();
    for (const { id } of [seat, elsewhere]) await VideoPlace.create({ enrolmentId: id, name: 'wind', placeMs: 1_000, furthestMs: 1_000 });
    const [key = ''] = Object.values(media.files).map((file) => file.key);
    await expect(remove()).resolves.toEqual({ title: 'Winding' });
    expect([await Media.count(), await SeriesMedia.count(), (await VideoPlace.findAll()).map(({ enrolmentId }) => enrolmentId)]).toEqual([0, 0, [elsewhere.id]]);
    expect(await ctx.services.media.byteCount(key)).toBeNull();
    await expect(remove()).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });
});
