// Zips from outside that mean harm, or are merely broken: refused with a sentence, and nothing of them is left.
import { readdirSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import sharp from 'sharp';
import { beforeEach, describe, expect, test } from 'vitest';
import type { WrittenSeriesFile } from '#contracts/series-folder.ts';
import { config } from '#server/config.ts';
import { Job, Lesson, Media, PatternPiece, Series, SeriesMedia } from '#server/models/index.ts';
import { listToYaml } from '#core/series-folder/list-as-yaml.ts';
import { contextFor, type TestContext } from '../../support/context.ts';
import { buildUser, buildWorkroom } from '../../support/factories.ts';
import { bringInAtOnce } from '../../support/folders.ts';
import { lowTide } from '../../support/low-tide.ts';
import { makeZip, type MadeEntry } from '../../support/zips.ts';

let teacher: TestContext;
let zipPath: string;

beforeEach(async () => {
  const user = await buildUser();
  await buildWorkroom({ ownerId: user.id });
  teacher = await contextFor(user);
  await teacher.services.media.temporaryFolder('videos');
  zipPath = await teacher.services.media.temporaryPath('came.zip');
});

const LIST: WrittenSeriesFile = { title: 'Low Tide', craft: 'frame-loom', techniques: [], level: 'beginner', lessons: [{ file: '01-wind.mdx', title: 'Wind', minutes: 10, opens: { rule: 'at-once' } }] };
const listing = (more: Partial<WrittenSeriesFile> = {}): MadeEntry => ({ name: 'series.yaml', bytes: Buffer.from(listToYaml({ ...LIST, ...more })) });
const LESSON: MadeEntry = { name: '01-wind.mdx', bytes: Buffer.from('Wind it.') };
const GOOD = [listing(), LESSON];

function filesLeft(): string[] {
  return readdirSync(resolve(config().uploadsFolder), { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile()).map((entry) => join(entry.parentPath, entry.name)).filter((path) => path !== zipPath);
}

async function bringIn(zip: Buffer): Promise<unknown> {
  writeFileSync(zipPath, zip);
  return bringInAtOnce(teacher, zipPath);
}

async function isRefused(zip: Buffer, where: string, says: RegExp): Promise<void> {
  const before = filesLeft();
  const error = await bringIn(zip).then(() => null, (thrown: unknown) => thrown);
  expect(error).toMatchObject({ code: 'VALIDATION', fields: { [where]: expect.stringMatching(says) } });
  expect(await Promise.all([Series, Lesson, Media, SeriesMedia, Job, PatternPiece].map((model) => (model as typeof Series).count()))).toEqual([0, 0, 0, 0, 0, 0]);
  expect(filesLeft()).toEqual(before);
}

const more = (...entries: MadeEntry[]): Buffer => makeZip([...GOOD, ...entries]);

test('a plain zip of any make comes in, packed or not, with its folders or without', async () => {
  const packed = makeZip([{ name: 'videos/', bytes: Buffer.alloc(0) }, ...GOOD.map((entry) => ({ ...entry, packed: true }))]);
  expect(await bringIn(packed)).toMatchObject({ slug: 'low-tide', partCount: 1, toMend: [] });
  expect(await bringIn(makeZip(GOOD))).toMatchObject({ slug: expect.stringMatching(/^low-tide-[a-z0-9]{5}$/) });
});

describe('a name', () => {
  test.each([
    ['that goes up', '../../evil.mdx', /leads out/], ['that goes up on the way', 'videos/../../evil', /leads out/], ['from the root', '/abs', /leads out/],
    ['with a drive', 'C:/evil.mdx', /leads out/], ['with backslashes', 'a\\..\\b', /leads out/], ['with a nought byte', '01-wind\0.mdx', /sign in it/],
    ['of a device', 'con.mdx', /no file of this name/], ['of a kind that runs', 'run.html', /no file of this name/], ['too deep', 'a/b/c/d/e/f.mdx', /no file of this name/],
    ['that differs by case', '01-WIND.mdx', /no file of this name/], ['that differs by composed letters', '01-wi\u0301nd.mdx', /no file of this name/], ['of a zip in the zip', 'videos/01-more.zip', /packed file within/],
  ])('%s is refused', async (_words, name, says) => {
    const shown = Buffer.from(name).toString('latin1').replace(/[\p{C}]/gu, '\uFFFD');
    await isRefused(more({ name, bytes: Buffer.from('x') }), shown, says);
  });

  test('that is there twice is refused', () => isRefused(more({ ...LESSON, bytes: Buffer.from('Another.') }), '01-wind.mdx', /twice/));
  test('that series.yaml does not speak of is refused', () => isRefused(more({ name: '02-more.mdx', bytes: Buffer.from('x') }), '02-more.mdx', /says nothing of this file/));
});

describe('a zip', () => {
  test('whose entry is a link is refused', () => isRefused(more({ name: '02-link.mdx', bytes: Buffer.from('/etc/passwd'), unixMode: 0o120777 }), '02-link.mdx', /link or a device/));
  test('whose entry is a device is refused', () => isRefused(more({ name: '02-device.mdx', bytes: Buffer.alloc(0), unixMode: 0o020666 }), '02-device.mdx', /link or a device/));
  test('that is locked is refused', () => isRefused(more({ name: '02-locked.mdx', bytes: Buffer.from('x'), packed: true, flags: 1 }), '02-locked.mdx', /password/));
  test('of 200 MB out of 200 kB is refused before it is unpacked', () => isRefused(more({ name: 'videos/01-bomb.mp4', bytes: Buffer.alloc(200_000_000), packed: true }), 'videos/01-bomb.mp4', /hundredfold/));
  test('of 20,000 entries is refused', () => isRefused(makeZip(Array.from({ length: 20_000 }, (_, index) => ({ name: `${index}`, bytes: Buffer.alloc(0) }))), 'zip', /more than 500 files/));
  test('that says less than it holds is stopped while it is unpacked', () => isRefused(makeZip([listing(), { ...LESSON, bytes: Buffer.alloc(900_000, 'wind '), packed: true, saysBytes: 8 }]), '01-wind.mdx', /damaged/));
  test('that says far more than it may is refused by what it says', () => isRefused(more({ name: 'videos/01-long.mp4', bytes: Buffer.from('x'), packed: true, saysBytes: 3_000_000_000 }), 'videos/01-long.mp4', /At most/));
  test('that lies about its length with the long form is refused', () => isRefused(more({ name: 'videos/01-long.mp4', bytes: Buffer.from('x'), packed: true, saysLongBytes: 2n ** 52n }), 'videos/01-long.mp4', /At most/));
  test('whose entries lie over each other is refused', () => isRefused(makeZip([...GOOD, { name: '02-same.mdx', bytes: LESSON.bytes, sharesPlaceOf: 1 }]), 'zip', /lie over each other/));
  test('whose bytes were changed is refused', () => {
    const zip = makeZip(GOOD);
    zip.write('Mend', zip.indexOf('Wind it.'));
    return isRefused(zip, '01-wind.mdx', /damaged/);
  });
  test('that was cut is refused', () => isRefused(makeZip(GOOD).subarray(0, 300), 'zip', /no zip we can read/));
  test('that is something else is refused', () => isRefused(Buffer.from('<html>'), 'zip', /no zip we can read/));
  test('that is empty of a series is refused', () => isRefused(makeZip([LESSON]), 'zip', /no series\.yaml/));
  test('with an unknown packing is refused', () => isRefused(more({ name: '02-odd.mdx', bytes: Buffer.from('x'), method: 14 }), '02-odd.mdx', /a way we do not read/));
});

describe('a file in the zip', () => {
  const picture = { name: 'field', title: '', file: 'pictures/01-field.png' };
  const film = { name: 'wind', title: 'Wind', film: 'videos/01-wind.mp4', captions: 'videos/01-wind.vtt' };
  const FILM = { name: 'videos/01-wind.mp4', bytes: Buffer.alloc(5_000, 7) };

  test('that is no picture under a picture’s name is refused, and the film before it goes too', () => isRefused(
    makeZip([listing({ videos: [{ ...film, captions: undefined }], pictures: [picture] }), LESSON, FILM, { name: picture.file, bytes: Buffer.from('<svg onload="x"/>') }]),
    picture.file, /not a photo/,
  ));
  test('with captions that cannot be read is refused with the line', () => isRefused(
    makeZip([listing({ videos: [film] }), LESSON, FILM, { name: film.captions, bytes: Buffer.from('WEBVTT\n\n00:09.000 --> 00:01.000\nBack') }]),
    film.captions, /Line 3: /,
  ));
  test('that is missing is named', () => isRefused(makeZip([listing({ videos: [film] }), LESSON, FILM]), film.captions, /not in the folder/));
  test('that is no UTF-8 is refused', () => isRefused(makeZip([listing(), { ...LESSON, bytes: Buffer.from([0x57, 0xff, 0xfe]) }]), '01-wind.mdx', /UTF-8/));
  test('with a piece that cannot be woven is refused', async () => isRefused(more({ name: 'piece.json', bytes: Buffer.from(JSON.stringify({ ...(await lowTide()), bands: [] })) }), 'piece.json', /bands/));
  test('with a piece nested ten thousand deep is refused', () => isRefused(more({ name: 'piece.json', bytes: Buffer.from(`${'['.repeat(10_000)}${']'.repeat(10_000)}`) }), 'piece.json', /\w/));
  test('with a list that refers to itself is refused', () => isRefused(makeZip([{ name: 'series.yaml', bytes: Buffer.from('a: &a [x]\nb: [*a, *a, *a]\n') }, LESSON]), 'series.yaml', /\w/));
  test.each([['brackets', '['], ['braces', '{a: '], ['brackets closed in remarks', '[ #]\n'], ['dashes', '- '], ['question marks', '? '], ['anchors', '&a '], ['tags', '!a '], ['dashes in lines', '-\n']])('with a list nested without end by %s is refused', (_words, sign) =>
    isRefused(makeZip([{ name: 'series.yaml', bytes: Buffer.from(sign.repeat(100_000)) }, LESSON]), 'series.yaml', /nests deeper/));
  test('with a list of endless lines is refused', () => isRefused(makeZip([{ name: 'series.yaml', bytes: Buffer.from('- a\n'.repeat(100_000)) }, LESSON]), 'series.yaml', /\w/));
  test('with a word in the list that it does not know is refused', () => isRefused(makeZip([listing({ state: 'published' } as Partial<WrittenSeriesFile>), LESSON]), 'series.yaml', /state/));
});

test('pictures that would go over the teacher’s room are told, and nothing of the series is kept', async () => {
  const actor = teacher.actor;
  await Media.create({ ownerId: actor?.userId ?? 0, kind: 'picture', state: 'ready', originalName: 'old.webp', byteCount: 1_999_999_990, files: {}, detail: {} });
  const bytes = await sharp({ create: { width: 40, height: 40, channels: 3, background: '#446e9f' } }).png().toBuffer();
  const before = filesLeft();
  await expect(bringIn(makeZip([listing({ pictures: [{ name: 'field', title: '', file: 'pictures/01-field.png' }] }), LESSON, { name: 'pictures/01-field.png', bytes }]))).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('may be 2 GB') });
  expect([await Series.count(), await Media.count(), filesLeft()]).toEqual([0, 1, before]);
});
