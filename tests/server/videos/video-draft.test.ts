import { beforeEach, describe, expect, test } from 'vitest';
import type { Context } from '#server/context.ts';
import { signedIn } from '#server/errors.ts';
import { Job, Media, SeriesMedia, User, type Lesson, type Series } from '#server/models/index.ts';
import { captionsInHand } from '#server/queries/videos/captions-in-hand.ts';
import { videoDesk, videoInHand, videosOfPart } from '#server/queries/videos/video-desk.ts';
import { beginVideoUpload } from '#server/use-cases/videos/begin-upload.ts';
import { saveVideoDraft } from '#server/use-cases/videos/save-video-draft.ts';
import { takeVideoUpload } from '#server/use-cases/videos/take-upload.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { contextFor, contextOf } from '../../support/context.ts';
import { buildLesson, buildSeries, buildWorkroom } from '../../support/factories.ts';

const still = { key: 'videos/x/still-1.jpg', contentType: 'image/jpeg', byteCount: 1 };
const cues = [{ fromMs: 0, toMs: 900, words: 'Over one.' }];
let ctx: Context;
let stranger: Context;
let series: Series;
let lesson: Lesson;
let media: Media;

const teacherOf = async (ownerId: number): Promise<Context> => contextFor(await User.findByPk(ownerId, { rejectOnEmpty: true }));

beforeEach(async () => {
  const workroom = await buildWorkroom();
  ctx = await teacherOf(workroom.ownerId);
  stranger = await teacherOf((await buildWorkroom()).ownerId);
  series = await buildSeries({ workroomId: workroom.id });
  lesson = await buildLesson({ seriesId: series.id, title: 'Rya fringe' });
  media = await Media.create({ ownerId: workroom.ownerId, kind: 'video', state: 'ready', originalName: 'a.mp4', durationMs: 10_000, files: { 'still-1': still, video: { ...still, contentType: 'video/mp4' } }, detail: { poster: 'still-1' } });
  await SeriesMedia.create({ seriesId: series.id, name: 'rya', title: 'Rya', mediaId: media.id, lessonId: lesson.id });
});

describe('the draft of a video', () => {
  test('is kept beside what students see, part by part', async () => {
    const first = await saveVideoDraft(ctx, { video: media.publicId, revision: 0, change: { cues } });
    await saveVideoDraft(ctx, { video: media.publicId, revision: first.revision, change: { chapters: [{ atMs: 0, title: 'Begin' }] } });
    await media.reload();
    expect(media.draftDetail).toEqual({ poster: 'still-1', cues, chapters: [{ atMs: 0, title: 'Begin' }] });
    expect(media.detail).toEqual({ poster: 'still-1' });
    expect(await videoDesk(signedIn(ctx), series.slug, 'rya')).toMatchObject({ ready: { revision: 2, isDraft: true }, part: { number: 1 } });
  });

  test('is not written over what another window kept, and the other is told', async () => {
    await saveVideoDraft(ctx, { video: media.publicId, revision: 0, change: { cues } });
    await expect(saveVideoDraft(ctx, { video: media.publicId, revision: 0, change: { cues: [] } })).rejects.toMatchObject({ code: 'CONFLICT' });
    expect(await captionsInHand(signedIn(ctx), media.publicId)).toEqual({ revision: 1, cues });
    // The same again is no conflict: nothing would change.
    await expect(saveVideoDraft(ctx, { video: media.publicId, revision: 0, change: { cues } })).resolves.toMatchObject({ revision: 1 });
  });

  test('is its teacher’s only', async () => {
    for (const other of [stranger, contextOf(null)]) await expect(saveVideoDraft(other, { video: media.publicId, revision: 0, change: { cues } })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect([await videoDesk(signedIn(stranger), series.slug, 'rya'), await videoInHand(signedIn(stranger), media.publicId), await captionsInHand(signedIn(stranger), media.publicId)]).toEqual([null, null, null]);
  });

  test.each([
    ['lines after the end', { cues: [{ fromMs: 11_000, toMs: 12_000, words: 'x' }] }, 'cues'],
    ['chapters after the end', { chapters: [{ atMs: 10_000, title: 'x' }] }, 'chapters'],
    ['a poster that is none', { poster: 'video' }, 'poster'],
    ['a poster by an inherited name', { poster: 'constructor' }, 'poster'],
  ])('refuses %s at its field', async (_what, change, field) => {
    await expect(saveVideoDraft(ctx, { video: media.publicId, revision: 0, change })).rejects.toMatchObject({ code: 'VALIDATION', fields: { [field]: expect.any(String) } });
  });
});

describe('videos on their way', () => {
  const begun = async (name: string | null): Promise<string> => {
    const publicId = newPublicId();
    await beginVideoUpload(ctx, publicId, { lesson: lesson.publicId, name, fileName: 'film.mp4', fileType: 'video/mp4', byteCount: 1_000 });
    return publicId;
  };

  test('tell how many are made ready before them', async () => {
    const ids = [await begun(null), await begun(null), await begun(null)];
    for (const id of ids) await takeVideoUpload(id);
    const places = async () => Promise.all(ids.map(async (id) => (await videoInHand(signedIn(ctx), id))?.before));
    expect(await places()).toEqual([0, 1, 2]);
    await Job.update({ state: 'done' }, { where: { uniqueKey: `process-video:${ids[0] ?? ''}` } });
    expect((await places()).slice(1)).toEqual([0, 1]);
  });

  test('stand with their part: new ones, and those that shall replace one', async () => {
    await begun(null);
    await begun('rya');
    const rows = await videosOfPart(series.id, lesson.publicId, []);
    expect(rows.map(({ name, ready, arriving }) => [name, ready !== null, arriving?.state])).toEqual([['rya', true, 'created'], ['rya-fringe', false, 'created']]);
  });
});
