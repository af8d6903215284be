// A zip that arrives is judged by its list at once; the worker makes a series of it, once, or says why not.
import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import { dirname, resolve } from 'node:path';
import sharp from 'sharp';
import { beforeEach, describe, expect, test } from 'vitest';
import { importWords } from '#components/workroom/import-words.ts';
import type { ImportState, WrittenSeriesFile } from '#contracts/series-folder.ts';
import { listToYaml } from '#core/series-folder/list-as-yaml.ts';
import { config } from '#server/config.ts';
import { REGISTERED } from '#server/jobs/handlers/index.ts';
import { runDueJobs, runLongJob } from '#server/jobs/run-due.ts';
import { Job, Lesson, Media, NoticeReceipt, Series, SeriesImport } from '#server/models/index.ts';
import { importState } from '#server/queries/series-folder/import-state.ts';
import { bringInFolder, giveUpFolder } from '#server/use-cases/series-folder/bring-in-folder.ts';
import { receiveFolder } from '#server/use-cases/series-folder/receive-folder.ts';
import { contextFor, type TestContext } from '../../support/context.ts';
import { buildUser, buildWorkroom } from '../../support/factories.ts';
import { makeZip, type MadeEntry } from '../../support/zips.ts';

let teacher: TestContext;
const KEY = '0b0f8c0a-6a50-4a53-9d0a-5d7a2f6c1e11';
const still = new AbortController().signal;
const pathOf = (key: string): string => resolve(config().uploadsFolder, key);
const waitingZips = (): string[] => (existsSync(pathOf('temporary/arrived-folders')) ? readdirSync(pathOf('temporary/arrived-folders')) : []);
const zipOf = (publicId: string): string => pathOf(`temporary/arrived-folders/${publicId}`);

beforeEach(async () => {
  const user = await buildUser();
  await buildWorkroom({ ownerId: user.id });
  teacher = await contextFor(user);
});

const LIST: WrittenSeriesFile = { title: 'Salt Grass', craft: 'frame-loom', techniques: [], level: 'beginner', lessons: [{ file: '01-wind.mdx', title: 'Wind', minutes: 10, opens: { rule: 'at-once' } }] };
const listing = (more: Partial<WrittenSeriesFile> = {}): MadeEntry => ({ name: 'series.yaml', bytes: Buffer.from(listToYaml({ ...LIST, ...more })) });
const LESSON: MadeEntry = { name: '01-wind.mdx', bytes: Buffer.from('Wind it.') };
const picture = async (): Promise<MadeEntry> => ({ name: 'pictures/01-field.png', bytes: await sharp({ create: { width: 40, height: 40, channels: 3, background: '#446e9f' } }).png().toBuffer() });
const PICTURES = { pictures: [{ name: 'field', title: '', file: 'pictures/01-field.png' }] };

async function arrives(entries: MadeEntry[], pressKey = KEY): Promise<string> {
  const path = await teacher.services.media.temporaryPath('upload-test');
  const zip = makeZip(entries);
  writeFileSync(path, zip);
  return receiveFolder(teacher, { path, fileName: 'salt-grass.zip', byteCount: zip.length, pressKey });
}

const work = (): Promise<number> => runLongJob(teacher, 'folders', 'worker', REGISTERED, still);
async function stateOf(publicId: string): Promise<ImportState> {
  const state = teacher.actor === null ? null : await importState(teacher.actor, publicId);
  if (state === null) throw new Error('there is no such import');
  return state;
}

describe('a folder that arrives', () => {
  test('waits, comes in once the worker has it, and its zip goes', async () => {
    const folder = await arrives([listing(PICTURES), LESSON, await picture()]);
    expect([await Series.count(), existsSync(zipOf(folder)), importWords(await stateOf(folder))]).toEqual([0, true, 'It is next.']);
    expect(await runDueJobs(teacher, 'quick', REGISTERED)).toBe(0);
    expect(await work()).toBe(1);
    expect(await stateOf(folder)).toMatchObject({ state: 'done', slug: 'salt-grass', title: 'Salt Grass', told: { partCount: 1, filmCount: 0, toMend: [] } });
    expect([await Media.count({ where: { kind: 'picture', state: 'ready' } }), existsSync(zipOf(folder))]).toEqual([1, false]);
    const told = await NoticeReceipt.findOne({ where: { userId: teacher.actor?.userId ?? 0 }, rejectOnEmpty: true });
    expect(told.said).toMatchObject({ title: '“Salt Grass” has come in', act: { href: `/workroom/series/bring-in/${folder}` } });
  });

  test('comes in once though its form was pressed twice, before and after', async () => {
    const folder = await arrives([listing(), LESSON]);
    expect(await arrives([listing(), LESSON])).toBe(folder);
    await work();
    expect(await arrives([listing(), LESSON])).toBe(folder);
    expect([await work(), await Series.count(), await Job.count()]).toEqual([0, 1, 1]);
  });

  test('knows how many are before it', async () => {
    await arrives([listing(), LESSON]);
    const second = await arrives([listing(), LESSON], KEY.replace('0b', '0c'));
    expect(importWords(await stateOf(second))).toBe('It waits. One other folder comes first.');
  });

  test('is refused at once for what its list tells, and nothing is kept', async () => {
    const before = waitingZips();
    await expect(arrives([listing(), LESSON, { name: '02-more.mdx', bytes: Buffer.from('a') }])).rejects.toMatchObject({ code: 'VALIDATION', fields: { '02-more.mdx': expect.stringContaining('says nothing of this file') } });
    expect([await SeriesImport.count(), await Job.count(), waitingZips()]).toEqual([0, 0, before]);
  });

  test('is refused by the worker with file and reason, and nothing is left of it', async () => {
    const folder = await arrives([listing(PICTURES), { name: 'pictures/01-field.png', bytes: Buffer.from('no picture') }, LESSON]);
    await work();
    expect(await stateOf(folder)).toMatchObject({ state: 'refused', told: { says: expect.stringContaining('Nothing of it was kept'), faults: [{ file: 'pictures/01-field.png', says: expect.stringContaining('not a photo') }] } });
    expect([await Series.count(), await Media.count(), existsSync(zipOf(folder))]).toEqual([0, 0, false]);
    expect((await NoticeReceipt.findOne({ rejectOnEmpty: true })).said.title).toBe('salt-grass.zip did not come in');
  });

  test('is nobody else’s to see, and comes from nobody without a workroom', async () => {
    const folder = await arrives([listing(), LESSON]);
    const other = await contextFor(await buildUser());
    expect(other.actor !== null && await importState(other.actor, folder)).toBeNull();
    await expect(receiveFolder(other, { path: '', fileName: '', byteCount: 1, pressKey: KEY })).rejects.toMatchObject({ code: 'FORBIDDEN' });
  });
});

describe('a worker that dies on the way', () => {
  test('leaves the zip, and the next one makes one whole series, without what the first had put', async () => {
    const folder = await arrives([listing(PICTURES), LESSON, await picture()]);
    const left = pathOf('pictures/00000000000000000000000000/large.webp');
    mkdirSync(dirname(left), { recursive: true });
    writeFileSync(left, 'half');
    await SeriesImport.update({ round: 1, mediaIds: ['00000000000000000000000000'], filesAll: 1 }, { where: { publicId: folder } });
    expect(importWords(await stateOf(folder))).toBe('Its pictures and films are being taken over: 0 of 1.');
    await work();
    expect([await Series.count(), await Lesson.count(), existsSync(left), (await stateOf(folder)).state]).toEqual([1, 1, false, 'done']);
  });

  test('or is told to stop makes nothing, and the folder still waits', async () => {
    const folder = await arrives([listing(), LESSON]);
    await expect(bringInFolder(teacher, { folder }, { signal: AbortSignal.abort(new Error('stop')) })).rejects.toThrow('stop');
    expect([await Series.count(), existsSync(zipOf(folder)), (await stateOf(folder)).state]).toEqual([0, true, 'working']);
  });

  test('after it came in does no harm: it is not made again', async () => {
    const folder = await arrives([listing(), LESSON]);
    await bringInFolder(teacher, { folder }, { signal: still });
    await bringInFolder(teacher, { folder }, { signal: still });
    expect(await Series.count()).toBe(1);
  });

  test('each time ends in words, not in waiting', async () => {
    const folder = await arrives([listing(), LESSON]);
    await giveUpFolder(teacher, { folder });
    expect(await stateOf(folder)).toMatchObject({ state: 'refused', told: { says: expect.stringContaining('do not know why') } });
    expect(existsSync(zipOf(folder))).toBe(false);
  });
});

test('two workers at once make one series', async () => {
  const folder = await arrives([listing(PICTURES), LESSON, await picture()]);
  await Promise.allSettled([bringInFolder(teacher, { folder }, { signal: still }), bringInFolder(teacher, { folder }, { signal: still })]);
  if ((await stateOf(folder)).state !== 'done') await bringInFolder(teacher, { folder }, { signal: still });
  expect([await Series.count(), await Media.count()]).toEqual([1, 1]);
  const [media] = await Media.findAll();
  expect(Object.values(media?.files ?? {}).every(({ key }) => existsSync(pathOf(key)))).toBe(true);
});
