import { beforeEach, describe, expect, test, vi } from 'vitest';
import { uploadLocker } from '#server/db/upload-lock.ts';
import { Media, VideoUpload } from '#server/models/index.ts';
import { buildUser } from '../../support/factories.ts';

const TIMES = { holdMs: 800, renewMs: 100, waitMs: 5_000 };
const never = new AbortController().signal;
let id = '';

beforeEach(async () => {
  const media = await Media.create({ ownerId: (await buildUser()).id, kind: 'video', originalName: 'a.mp4', files: {}, detail: {} });
  await VideoUpload.create({ mediaId: media.id, byteCount: 1 });
  id = media.publicId;
});

describe('who writes to an upload', () => {
  test('is one at a time, among any number of processes: who comes next asks the holder to let go', async () => {
    const [first, second] = [uploadLocker('video_uploads', TIMES).newLock(id), uploadLocker('video_uploads', TIMES).newLock(id)];
    const letGo = vi.fn(() => first.unlock());
    await first.lock(never, letGo);
    await second.lock(never, vi.fn());
    expect(letGo).toHaveBeenCalled();
    await second.unlock();
    expect(await VideoUpload.findOne()).toMatchObject({ heldBy: null, isWanted: false });
  });

  test('lets go when its process died: nobody renews the hold', async () => {
    const dead = uploadLocker('video_uploads', { ...TIMES, renewMs: 1_000_000 }).newLock(id);
    await dead.lock(never, vi.fn());
    const next = uploadLocker('video_uploads', TIMES).newLock(id);
    await next.lock(never, vi.fn());
    await next.unlock();
    await dead.unlock();
  });

  test('holds on as long as it writes, and who waited too long is told to come again', async () => {
    const first = uploadLocker('video_uploads', TIMES).newLock(id);
    await first.lock(never, vi.fn());
    await expect(uploadLocker('video_uploads', { ...TIMES, waitMs: 1_500 }).newLock(id).lock(never, vi.fn())).rejects.toMatchObject({ status_code: 423 });
    await first.unlock();
  });
});
