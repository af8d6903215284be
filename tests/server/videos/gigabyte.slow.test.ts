/**
 * Part of the slow set (`npm run test:slow`): a film of a gigabyte, cut three times on its way, through a server that is
 * started anew each time, made ready, and never held in memory.
 */
import { createReadStream } from 'node:fs';
import { appendFile, mkdtemp, open, rm, stat } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { Media, User } from '#server/models/index.ts';
import { services } from '#server/services.ts';
import { makeVideoReady } from '#server/use-cases/videos/make-video-ready.ts';
import { makeClip } from '../../support/clips.ts';
import { contextFor } from '../../support/context.ts';
import { buildLesson, buildSeries, buildWorkroom } from '../../support/factories.ts';
import { beginning, openVideoDoor, type UploadDoor } from '../../support/upload-door.ts';

const GIGABYTE = 1_000_000_000;
const PIECE = 8 * 1_048_576;
let folder = '';

beforeAll(async () => { folder = await mkdtemp(join(tmpdir(), 'fellmark-gigabyte-')); });
afterAll(() => rm(folder, { recursive: true }));

/** A short film with a box of nothing behind it, which every reader passes over (ISO/IEC 14496-12, 8.1.2 Free Space Box). */
async function bigFilm(): Promise<string> {
  const path = makeClip(folder, 'big.mp4');
  const { size } = await stat(path);
  const head = Buffer.alloc(8);
  head.writeUInt32BE(GIGABYTE - size, 0);
  head.write('free', 4, 'latin1');
  await appendFile(path, head);
  const file = await open(path, 'r+');
  await file.truncate(GIGABYTE);
  await file.close();
  return path;
}

describe('a film of a gigabyte', () => {
  test('arrives although it is cut three times, and is made ready without being held in memory', { timeout: 1_800_000 }, async () => {
    const path = await bigFilm();
    const workroom = await buildWorkroom();
    const ctx = await contextFor(await User.findByPk(workroom.ownerId, { rejectOnEmpty: true }));
    const lesson = await buildLesson({ seriesId: (await buildSeries({ workroomId: workroom.id })).id });
    let door: UploadDoor = await openVideoDoor(ctx);
    const at = (await door.send(beginning(lesson.publicId, GIGABYTE)))?.headers.location ?? '';
    const upload = join(await services().media.temporaryFolder('videos'), at.split('/').at(-1) ?? '');
    const offsetOf = async (): Promise<number> => Number((await door.send({ method: 'HEAD', path: at }))?.headers['upload-offset']);
    const began = Date.now();
    const memoryBefore = process.memoryUsage().rss;
    let most = memoryBefore;
    const cutAt = [200_000_000, 500_000_000, 900_000_000];
    for (let offset = 0; offset < GIGABYTE;) {
      most = Math.max(most, process.memoryUsage().rss);
      const cut = cutAt[0] !== undefined && offset > cutAt[0];
      const length = Math.min(PIECE, GIGABYTE - offset);
      const headers = { 'Upload-Offset': String(offset), 'Content-Type': 'application/offset+octet-stream', 'Content-Length': String(length) };
      if (cut) {
        cutAt.shift();
        const before = offset;
        const half = Buffer.alloc(PIECE / 2);
        const file = await open(path);
        await file.read(half, 0, half.length, offset);
        await file.close();
        await door.send({ method: 'PATCH', path: at, headers, body: half, cut: { after: half.length, hasArrived: async () => (await stat(upload)).size > before } });
        await door.stop();
        door = await openVideoDoor(ctx);
      } else {
        await door.send({ method: 'PATCH', path: at, headers, body: createReadStream(path, { start: offset, end: offset + length - 1 }) });
      }
      offset = await offsetOf();
    }
    const seconds = (Date.now() - began) / 1_000;
    await door.stop();
    const media = await Media.findOne({ rejectOnEmpty: true });
    expect(media.state).toBe('uploaded');
    const processing = Date.now();
    await makeVideoReady(ctx, media.publicId, new AbortController().signal);
    expect(await media.reload()).toMatchObject({ state: 'ready', failure: null, width: 320 });
    const grownMb = (most - memoryBefore) / 1e6;
    console.log(`1 GB in ${seconds.toFixed(0)} s over 3 cuts and 3 restarts; memory grew by ${grownMb.toFixed(0)} MB; made ready in ${((Date.now() - processing) / 1_000).toFixed(0)} s`);
    // Sender and server share this process; a film held in memory would show as a gigabyte.
    expect(grownMb).toBeLessThan(400);
  });
});
