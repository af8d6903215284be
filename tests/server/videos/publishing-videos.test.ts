import { beforeEach, describe, expect, test } from 'vitest';
import { factsOf } from '#core/lesson-text/lesson-facts.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import type { Context } from '#server/context.ts';
import { LessonVersion, Media, PatternPiece, SeriesMedia, User, WorkroomHelper, type Lesson, type Series } from '#server/models/index.ts';
import { mediaFor } from '#server/queries/media/media-for.ts';
import { mediaOfSeries, mediaOnDesk } from '#server/queries/media/media-of-series.ts';
import { seriesDesk } from '#server/queries/workroom/series-desk.ts';
import { signedIn } from '#server/errors.ts';
import { publishSeries } from '#server/use-cases/series/publish-series.ts';
import { actorOf, contextFor } from '../../support/context.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { lowTide } from '../../support/low-tide.ts';

const file = { key: 'videos/x/video.mp4', contentType: 'video/mp4', byteCount: 1 };
const said = (words: string) => ({ cues: [{ fromMs: 0, toMs: 900, words }] });
const now = new Date('2026-12-01T10:00:00Z');
let teacher: Context;
let student: User;
let helper: User;
let series: Series;
let lesson: Lesson;

async function film(words: string): Promise<Media> {
  return Media.create({ ownerId: signedIn(teacher).userId, kind: 'video', state: 'ready', originalName: 'a.mp4', durationMs: 2_000, files: { video: file }, detail: said(words) });
}
const shown = async () => (await mediaOfSeries(series.id)).map(({ detail }) => detail.cues?.[0]?.words);
const onDesk = async () => (await mediaOnDesk(series.id)).map(({ detail, isDraft }) => [detail.cues?.[0]?.words, isDraft]);
const sees = async (who: User, media: Media) => (await mediaFor(await actorOf(who), media.publicId, now))?.looksAfter ?? null;

beforeEach(async () => {
  const workroom = await buildWorkroom();
  teacher = await contextFor(await User.findByPk(workroom.ownerId, { rejectOnEmpty: true }));
  helper = await buildUser();
  await WorkroomHelper.create({ userId: helper.id, workroomId: workroom.id });
  series = await buildSeries({ workroomId: workroom.id, summary: 'A hanging.' });
  await PatternPiece.create({ seriesId: series.id, data: await lowTide() });
  lesson = await buildLesson({ seriesId: series.id });
  const source = 'Look.\n\n<Video name="film"/>';
  const reading = parseLessonText(source);
  if (!reading.ok) throw new RangeError(source);
  const version = await LessonVersion.create({ lessonId: lesson.id, number: 2, source, tree: reading.tree, facts: factsOf(reading.tree) });
  await lesson.update({ draftSource: source, draftReading: reading, publishedVersionId: version.id });
  student = await buildUser();
  await buildEnrolment({ userId: student.id, seriesId: series.id });
});

describe('a video that takes the place of another', () => {
  test('waits for publishing: students see the old one, who looks after the series both', async () => {
    const [old, fresh] = [await film('old'), await film('new')];
    await SeriesMedia.create({ seriesId: series.id, name: 'film', mediaId: old.id, draftMediaId: fresh.id });
    expect([await shown(), await onDesk()]).toEqual([['old'], [['new', true]]]);
    expect([await sees(student, old), await sees(student, fresh), await sees(helper, fresh)]).toEqual([false, null, true]);
    expect((await seriesDesk(signedIn(teacher), series.slug))?.parts[0]?.textState).toBe('changed');
    await publishSeries(teacher, series.slug);
    expect([await shown(), await onDesk()]).toEqual([['new'], [['new', false]]]);
    expect([await sees(student, old), await sees(student, fresh)]).toEqual([null, false]);
    expect((await seriesDesk(signedIn(teacher), series.slug))?.parts[0]?.textState).toBe('as-published');
  });

  test('and is not ready stays where it is when the series is published', async () => {
    const [old, fresh] = [await film('old'), await film('new')];
    await fresh.update({ state: 'processing' });
    await SeriesMedia.create({ seriesId: series.id, name: 'film', mediaId: old.id, draftMediaId: fresh.id });
    await publishSeries(teacher, series.slug);
    expect([await shown(), await onDesk()]).toEqual([['old'], [['old', false]]]);
    expect((await SeriesMedia.findOne())?.draftMediaId).toBe(fresh.id);
  });
});

describe('captions that were changed', () => {
  test('wait for publishing too', async () => {
    const media = await film('old');
    await SeriesMedia.create({ seriesId: series.id, name: 'film', mediaId: media.id });
    expect((await seriesDesk(signedIn(teacher), series.slug))?.parts[0]?.textState).toBe('as-published');
    await media.update({ draftDetail: said('new') });
    expect([await shown(), await onDesk()]).toEqual([['old'], [['new', true]]]);
    expect((await seriesDesk(signedIn(teacher), series.slug))?.parts[0]?.textState).toBe('changed');
    await publishSeries(teacher, series.slug);
    expect([await shown(), await onDesk()]).toEqual([['new'], [['new', false]]]);
    expect((await media.reload()).draftDetail).toBeNull();
  });

  test('are asked for before a video can be published at all', async () => {
    const media = await film('');
    await media.update({ detail: {} });
    await SeriesMedia.create({ seriesId: series.id, name: 'film', draftMediaId: media.id });
    await expect(publishSeries(teacher, series.slug)).rejects.toMatchObject({ says: expect.stringContaining('no captions') });
    await media.update({ draftDetail: said('new') });
    await publishSeries(teacher, series.slug);
    expect(await shown()).toEqual(['new']);
  });
});
