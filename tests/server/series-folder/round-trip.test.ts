// A series that is taken along and brought in again is the same series.
import { createHash, randomBytes } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { mkdir, writeFile } from 'node:fs/promises';
import { dirname, resolve } from 'node:path';
import fc from 'fast-check';
import sharp from 'sharp';
import { beforeEach, describe, expect, test } from 'vitest';
import { config } from '#server/config.ts';
import { readShipped } from '#server/demo/series.ts';
import { takePhoto } from '#server/media/photo.ts';
import { GatheringItem, Job, Lesson, Media, PatternPiece, Series, SeriesMedia } from '#server/models/index.ts';
import { importSeries } from '#server/use-cases/series-folder/import-series.ts';
import { takeSeries } from '#server/use-cases/series-folder/take-series.ts';
import { contextFor, type TestContext } from '../../support/context.ts';
import { buildGatheringItem, buildLesson, buildSeries, buildUser, buildWorkroom } from '../../support/factories.ts';
import { bringInAtOnce } from '../../support/folders.ts';

let teacher: TestContext;
let other: TestContext;
const workroomOf = (ctx: TestContext): number => ctx.actor?.workroomId ?? 0;
const pathOf = (key: string): string => resolve(config().uploadsFolder, key);
const hashOf = (key: string): string => createHash('sha256').update(readFileSync(pathOf(key))).digest('hex');

beforeEach(async () => {
  const [one, two] = [await buildUser(), await buildUser()];
  await buildWorkroom({ ownerId: one.id });
  await buildWorkroom({ ownerId: two.id });
  [teacher, other] = [await contextFor(one), await contextFor(two)];
});

async function take(slug: string, withFilms = true, ctx = teacher): Promise<string> {
  return (await takeSeries(ctx, { slug, withFilms })).key;
}

async function thereAndBack(slug: string, withFilms = true): Promise<Series> {
  const { slug: back } = await bringInAtOnce(other, pathOf(await take(slug, withFilms)));
  return Series.findOne({ where: { slug: back }, rejectOnEmpty: true });
}

const SERIES = ['title', 'craft', 'level', 'summary', 'story', 'techniques', 'priceMinor', 'currency'] as const;
const LESSON = ['title', 'minutes', 'isPreview', 'opensAt', 'checkpoint', 'draftSource', 'draftReading'] as const;
const ITEM = ['kind', 'name', 'amountKey', 'amountText', 'standIn', 'untilPart', 'note'] as const;
function some(row: object, keys: readonly string[]): Record<string, unknown> {
  return Object.fromEntries(keys.map((key) => [key, (row as Record<string, unknown>)[key]]));
}

/** All that its teacher set, with parts named by their places. */
async function toldOf(series: Series): Promise<unknown> {
  await series.reload();
  const lessons = await Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null }, order: ['position', 'id'] });
  const placeOf = (id: string | number | null): number => lessons.findIndex((lesson) => lesson.publicId === id || lesson.id === id);
  const media = await Promise.all((await SeriesMedia.findAll({ where: { seriesId: series.id }, order: ['name'] })).map(async ({ name, title, lessonId, mediaId, draftMediaId }) => {
    const file = await Media.findByPk(draftMediaId ?? mediaId ?? 0, { rejectOnEmpty: true });
    const { cues = [], chapters = [], poster, alt } = file.draftDetail ?? file.detail;
    return { name, title, part: placeOf(lessonId), kind: file.kind, cues, chapters, poster, alt };
  }));
  return {
    ...some(series, SERIES),
    piece: (await PatternPiece.findByPk(series.id))?.data ?? null,
    media,
    lessons: await Promise.all(lessons.map(async (lesson) => ({
      ...some(lesson, LESSON),
      opens: lesson.opens.rule === 'after-verdict' ? { rule: 'after-verdict', part: placeOf(lesson.opens.lesson) } : lesson.opens,
      items: (await GatheringItem.findAll({ where: { lessonId: lesson.id }, order: ['position', 'id'] })).map((item) => some(item, ITEM)),
    }))),
  };
}

async function putFilm(series: Series, name: string, lesson: Lesson, bytes: Buffer): Promise<Media> {
  const key = `videos/${randomBytes(8).toString('hex')}/video.mp4`;
  await mkdir(dirname(pathOf(key)), { recursive: true });
  await writeFile(pathOf(key), bytes);
  const media = await Media.create({
    ownerId: teacher.actor?.userId ?? 0, kind: 'video', state: 'ready', originalName: 'a.mp4', byteCount: bytes.length, durationMs: 9_000,
    files: { video: { key, contentType: 'video/mp4', byteCount: bytes.length } },
    detail: { poster: 'still-2' },
    draftDetail: { poster: 'still-4', chapters: [{ atMs: 0, title: 'Wind “it” & go' }], cues: [{ fromMs: 40, toMs: 2_000, words: 'Lay the frame flat, corks on the corner nails, <under> & over it.' }] },
  });
  await SeriesMedia.create({ seriesId: series.id, name, title: 'A film: of it', mediaId: media.id, lessonId: lesson.id });
  return media;
}

describe.each(['low-tide', 'three-knotted-cords'])('%s, taken along and brought in', (slug) => {
  const bringIn = () => importSeries(teacher, { workroomId: workroomOf(teacher), slug, read: (name) => readShipped(slug, name) });

  test('is the same, byte for byte in its texts', async () => {
    const series = await bringIn();
    const back = await thereAndBack(slug);
    expect(await toldOf(back)).toEqual(await toldOf(series));
    expect([back.state, back.workroomId, back.id === series.id]).toEqual(['draft', workroomOf(other), false]);
  });

  test('makes the same zip each time, from here and from there', async () => {
    await bringIn();
    const first = hashOf(await take(slug));
    expect(hashOf(await take(slug))).toBe(first);
    const back = await thereAndBack(slug);
    expect(hashOf(await take(back.slug, true, other))).toBe(first);
  });
});

describe('what belongs to a series', () => {
  test('comes along: films as they are, pictures, captions, chapters, poster', async () => {
    const series = await buildSeries({ workroomId: workroomOf(teacher), slug: 'with-media' });
    const lesson = await buildLesson({ seriesId: series.id });
    const bytes = randomBytes(300_000);
    await putFilm(series, 'con', lesson, bytes);
    const png = pathOf('temporary/a.png');
    await mkdir(dirname(png), { recursive: true });
    await sharp({ create: { width: 64, height: 48, channels: 3, background: '#a40' } }).png().toFile(png);
    const photo = await takePhoto(teacher.services.media, png, 'pictures/abc');
    const picture = await Media.create({ ownerId: teacher.actor?.userId ?? 0, kind: 'picture', state: 'ready', originalName: 'a.png', ...photo, detail: { alt: 'A warm field' } });
    await SeriesMedia.create({ seriesId: series.id, name: 'field', mediaId: picture.id });

    const back = await thereAndBack(series.slug);
    expect(await toldOf(back)).toEqual(await toldOf(series));
    const [film, shown] = [await Media.findOne({ where: { state: 'uploaded' }, rejectOnEmpty: true }), await Media.findOne({ where: { kind: 'picture' }, order: [['id', 'DESC']], rejectOnEmpty: true })];
    expect(readFileSync(pathOf(`temporary/videos/${film.publicId}`)).equals(bytes)).toBe(true);
    expect(await Job.count({ where: { type: 'process-video', uniqueKey: `process-video:${film.publicId}` } })).toBe(1);
    const { dominant } = await sharp(pathOf(shown.files['large']?.key ?? '')).stats();
    expect([shown.width, shown.height, dominant.r > 150, dominant.b < 20]).toEqual([64, 48, true, true]);
  });

  test('comes without films when they shall stay, and their words wait for them', async () => {
    const series = await buildSeries({ workroomId: workroomOf(teacher), slug: 'without-films' });
    await putFilm(series, 'winding', await buildLesson({ seriesId: series.id }), randomBytes(50_000));
    const back = await thereAndBack(series.slug, false);
    expect(await toldOf(back)).toEqual(await toldOf(series));
    expect(await Media.findOne({ where: { state: 'failed' } })).toMatchObject({ durationMs: 9_000, failure: expect.stringContaining('did not come with its series') });
    expect(await toldOf(await thereAndBack(series.slug, false))).toEqual(await toldOf(series));
  });

  test('may be half done: an empty part, a text with mistakes, a rule whose part was taken out', async () => {
    const series = await buildSeries({ workroomId: workroomOf(teacher), slug: 'half', priceMinor: null, currency: 'SEK' });
    const gone = await buildLesson({ seriesId: series.id, position: 1, takenOutAt: new Date() });
    const { draftReading } = await buildLesson({ seriesId: series.id, position: 2, draftSource: 'Wind {1} ends.', publishedVersionId: null, opens: { rule: 'after-verdict', lesson: gone.publicId } });
    expect(draftReading.ok).toBe(false);
    const { slug, toMend } = await bringInAtOnce(other, pathOf(await take(series.slug)));
    expect(toMend).toMatchObject([{ file: '01-part-2.mdx', says: expect.stringMatching(/^Line 1: /) }, { file: 'series.yaml', says: expect.stringContaining('Part 1 waits') }]);
    const back = await Lesson.findOne({ include: [], where: { seriesId: (await Series.findOne({ where: { slug }, rejectOnEmpty: true })).id } });
    expect([back?.draftSource, back?.opens]).toEqual(['Wind {1} ends.', { rule: 'after-verdict', lesson: '' }]);
  });

  test('is taken by nobody but its teacher', async () => {
    const series = await buildSeries({ workroomId: workroomOf(teacher), slug: 'mine' });
    await expect(takeSeries(other, { slug: series.slug, withFilms: false })).rejects.toMatchObject({ code: 'NOT_FOUND' });
  });
});

test('any words and rules a teacher may set come back as they were', async () => {
  const words = (most: number) => fc.string({ unit: 'grapheme', minLength: 1, maxLength: Math.floor(most / 4) }).filter((text) => text.trim() !== '' && !text.includes('\0') && text.length <= most);
  const maybe = (most: number) => fc.option(words(most));
  const prose = fc.array(fc.constantFrom('Wind **it**.\n', '\r\n', '# Part: one\n', '- a\n  - b\n', '\t', '“ä–🧶”', ' --- \n', '&amp; *', '\uFEFF'), { maxLength: 20 }).map((lines) => lines.join(''));
  const item = fc.record({ kind: fc.constantFrom('tool' as const, 'yarn' as const, 'material' as const), name: words(100), amountKey: maybe(60), amountText: maybe(60), standIn: maybe(100), untilPart: fc.option(fc.integer({ min: 1, max: 99 })), note: maybe(200) });
  const opens = fc.oneof(
    fc.constant({ rule: 'at-once' } as const),
    fc.record({ rule: fc.constant('after-seat' as const), days: fc.integer({ min: 0, max: 365 }) }),
    fc.constant({ rule: 'on-date', wall: '2027-03-28T02:30', zone: 'Europe/Berlin' } as const),
  );
  const lesson = fc.record({ title: words(100), minutes: fc.integer({ min: 1, max: 6_000 }), isPreview: fc.boolean(), opens, draftSource: prose, checkpoint: fc.option(fc.record({ ask: words(150), look: fc.array(words(100), { maxLength: 3 }) })), items: fc.array(item, { maxLength: 3 }) });
  const made = fc.record({ title: words(100), summary: prose, story: prose, techniques: fc.array(words(30), { maxLength: 3 }), priceMinor: fc.option(fc.nat()), lessons: fc.array(lesson, { maxLength: 3 }) });
  let number = 0;
  await fc.assert(fc.asyncProperty(made, async ({ lessons, ...told }) => {
    number += 1;
    const series = await buildSeries({ workroomId: workroomOf(teacher), slug: `made-${number}`, ...told });
    for (const { items, ...one } of lessons) {
      const { id: lessonId } = await buildLesson({ seriesId: series.id, ...one, publishedVersionId: null });
      for (const [index, row] of items.entries()) await buildGatheringItem({ lessonId, position: index + 1, ...row });
    }
    const back = await thereAndBack(series.slug);
    const same = (told: unknown) => JSON.parse(JSON.stringify(told, (key, value: unknown) => (key === 'draftReading' || key === 'opensAt' ? undefined : value))) as unknown;
    expect(same(await toldOf(back))).toEqual(same(await toldOf(series)));
  }), { numRuns: 25 });
}, 120_000);
