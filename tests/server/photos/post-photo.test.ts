import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { DiskMediaStore } from '#server/media/store.ts';
import { Media, ProgressPhoto } from '#server/models/index.ts';
import { photoThread } from '#server/queries/photos/photo-thread.ts';
import { postPhoto } from '#server/use-cases/photos/post-photo.ts';
import { contextFor, contextOf, type TestContext } from '../../support/context.ts';
import { buildUser } from '../../support/factories.ts';
import { buildFollowed, type Followed } from '../../support/followed.ts';
import type { User } from '#server/models/index.ts';

let folder = '';
beforeEach(async () => { folder = await mkdtemp(join(tmpdir(), 'fellmark-post-')); });
afterEach(() => rm(folder, { recursive: true }));

const contextWithStore = (user: User): Promise<TestContext> => contextFor(user, { media: new DiskMediaStore(join(folder, 'uploads')) });
const picture = (red = 120) => sharp({ create: { width: 640, height: 480, channels: 3, background: { r: red, g: 143, b: 153 } } }).jpeg().toBuffer();
async function upload(...bytes: readonly Buffer[]) {
  const given = bytes.length === 0 ? [await picture()] : bytes;
  const files = await Promise.all(given.map(async (one, index) => {
    const path = join(folder, `upload-${index}`);
    await writeFile(path, one);
    return { path, originalName: 'warped-loom.jpg' };
  }));
  return { files, words: 'Is the left edge slack?' };
}
const files = async (): Promise<string[]> => (await readdir(join(folder, 'uploads', 'photos'), { recursive: true }).catch(() => [])).filter((name) => name.endsWith('.webp'));

describe('a progress photo', () => {
  test('joins the thread and waits', async () => {
    const { series, parts: [, second], student, seat } = await buildFollowed();
    await postPhoto(await contextWithStore(student), { series: series.slug, lesson: second.publicId, ...(await upload()) });
    expect(await photoThread(seat.id, second.id)).toMatchObject([{ words: 'Is the left edge slack?', verdict: 'waits', shots: [{ width: 640, height: 480 }] }]);
    expect(await files()).toHaveLength(2);
  });

  test('may be several, shown together: one entry of the thread with its shots in order', async () => {
    const { series, parts: [, second], student, seat } = await buildFollowed();
    await postPhoto(await contextWithStore(student), { series: series.slug, lesson: second.publicId, ...(await upload(await picture(1), await sharp(await picture(99)).resize(300, 400).jpeg().toBuffer())) });
    expect(await photoThread(seat.id, second.id)).toMatchObject([{ shots: [{ width: 640, height: 480 }, { width: 300, height: 400 }] }]);
    expect(await files()).toHaveLength(4);
  });

  test('sent twice, even at the same moment, is one', async () => {
    const { series, parts: [, second], student } = await buildFollowed();
    const ctx = await contextWithStore(student);
    const input = { series: series.slug, lesson: second.publicId, ...(await upload()) };
    const [one, two] = await Promise.all([postPhoto(ctx, input), postPhoto(ctx, input)]);
    expect(one.id).toBe(two.id);
    expect((await postPhoto(ctx, input)).id).toBe(one.id);
    expect([await ProgressPhoto.count(), await Media.count(), (await files()).length]).toEqual([1, 1, 2]);
  });

  test('that was answered already is told so, not asked about again', async () => {
    const { series, parts: [, second], student } = await buildFollowed();
    const ctx = await contextWithStore(student);
    const input = { series: series.slug, lesson: second.publicId, ...(await upload()) };
    await (await postPhoto(ctx, input)).update({ verdict: 'mend-first' });
    await expect(postPhoto(ctx, input)).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('shown this photo already') });
  });

  test('of a seat that ended while she read the page is refused in clear words', async () => {
    const { series, parts: [, second], student, seat } = await buildFollowed();
    await seat.update({ state: 'closed' });
    await expect(postPhoto(await contextWithStore(student), { series: series.slug, lesson: second.publicId, ...(await upload()) })).rejects.toMatchObject({ code: 'GONE', says: expect.stringContaining('Your seat in this series has ended') });
  });

  test('is refused to a visitor, without a seat, and in a part that is not open', async () => {
    const { series, parts: [, second, third], student } = await buildFollowed();
    const photo = await upload();
    await expect(postPhoto(contextOf(null), { series: series.slug, lesson: second.publicId, ...photo })).rejects.toMatchObject({ code: 'UNAUTHENTICATED' });
    await expect(postPhoto(await contextWithStore(await buildUser()), { series: series.slug, lesson: second.publicId, ...photo })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    await expect(postPhoto(await contextWithStore(student), { series: series.slug, lesson: third.publicId, ...photo })).rejects.toMatchObject({ code: 'NOT_FOUND' });
    expect(await files()).toEqual([]);
  });

  test('is refused where the part asks for none', async () => {
    const { series, parts: [first], student } = await buildFollowed();
    await expect(postPhoto(await contextWithStore(student), { series: series.slug, lesson: first.publicId, ...(await upload()) })).rejects.toMatchObject({ code: 'VALIDATION', says: 'This part asks for no photo.' });
  });

  test('that is none leaves neither a row nor a file', async () => {
    const { series, parts: [, second], student } = await buildFollowed();
    const hostile = await upload(Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>'));
    await expect(postPhoto(await contextWithStore(student), { series: series.slug, lesson: second.publicId, ...hostile })).rejects.toMatchObject({ code: 'UNSUPPORTED', says: expect.stringContaining('JPEG, PNG or WebP') });
    expect([await ProgressPhoto.count(), await Media.count(), await files()]).toEqual([0, 0, []]);
  });

  test('the seventh that would wait is told to wait its turn, and leaves nothing behind', async () => {
    const { series, parts: [, second], student } = await buildFollowed();
    const ctx = await contextWithStore(student);
    const post = async (number: number) => postPhoto(ctx, { series: series.slug, lesson: second.publicId, ...(await upload(await picture(number * 30))) });
    for (let number = 1; number <= 6; number += 1) await post(number);
    await expect(post(7)).rejects.toMatchObject({ code: 'CONFLICT', says: expect.stringContaining('6 photos of yours wait already') });
    expect(await ProgressPhoto.count()).toBe(6);
    expect(await files()).toHaveLength(12);
  });

  test.each([
    ['the part was taken out', async ({ parts: [, second] }: Followed) => { await second.update({ takenOutAt: new Date() }); }, 'Your teacher took this part out'],
    ['the part asks for no photo any more', async ({ parts: [, second] }: Followed) => { await second.update({ checkpoint: null }); }, 'Your teacher took this part out'],
    ['the seat was closed', async ({ seat }: Followed) => { await seat.update({ state: 'closed' }); }, 'Your seat ended'],
    ['the whole series is gone', async ({ seat }: Followed) => { await seat.destroy(); }, 'Your seat ended'],
  ])('is told when %s while it was on its way, and leaves neither a row nor a file', async (_what, goes, says) => {
    const followed = await buildFollowed();
    const { series, parts: [, second], student } = followed;
    const store = new DiskMediaStore(join(folder, 'uploads'));
    const requireRoom = store.requireRoom.bind(store);
    store.requireRoom = async () => { await goes(followed); await requireRoom(); };
    await expect(postPhoto(await contextFor(student, { media: store }), { series: series.slug, lesson: second.publicId, ...(await upload()) })).rejects.toMatchObject({ code: 'GONE', says: expect.stringContaining(says) });
    expect([await ProgressPhoto.count(), await Media.count(), await files()]).toEqual([0, 0, []]);
  });
});
