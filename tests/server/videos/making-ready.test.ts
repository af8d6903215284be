import { createServer } from 'node:http';
import { copyFile, mkdtemp, readdir, readFile, rm, stat, truncate, writeFile } from 'node:fs/promises';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import type { Context } from '#server/context.ts';
import { processVideo } from '#server/jobs/definitions/videos.ts';
import { REGISTERED } from '#server/jobs/handlers/index.ts';
import { runDueJobs, runLongJob } from '#server/jobs/run-due.ts';
import { DiskMediaStore } from '#server/media/store.ts';
import { probeVideo } from '#server/media/video/probe.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { Job, Media, SeriesMedia, User, VideoUpload } from '#server/models/index.ts';
import { makeVideoReady } from '#server/use-cases/videos/make-video-ready.ts';
import { takeVideoUpload } from '#server/use-cases/videos/take-upload.ts';
import { contextOf } from '../../support/context.ts';
import { buildSeries, buildWorkroom } from '../../support/factories.ts';
import { ffmpeg, makeClip } from '../../support/clips.ts';

const still = new AbortController().signal;
let folder = '';
let ctx: Context;
let store: DiskMediaStore;

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'fellmark-video-'));
  store = new DiskMediaStore(join(folder, 'uploads'));
  ctx = contextOf(null, { media: store });
});
afterEach(() => rm(folder, { recursive: true }));

/** A video whose last byte has come. */
async function arrived(path: string): Promise<Media> {
  const owner = await User.findByPk((await buildWorkroom()).ownerId, { rejectOnEmpty: true });
  const { size } = await stat(path);
  const media = await Media.create({ ownerId: owner.id, kind: 'video', originalName: 'film.mp4', byteCount: size, files: {}, detail: {} });
  await VideoUpload.create({ mediaId: media.id, byteCount: size });
  await copyFile(path, join(await store.temporaryFolder('videos'), media.publicId));
  await takeVideoUpload(media.publicId);
  return media;
}
const leftovers = async (): Promise<string[]> => (await readdir(join(folder, 'uploads'), { recursive: true, withFileTypes: true })).filter((entry) => entry.isFile()).map(({ name }) => name);

describe('an uploaded video', () => {
  test('becomes a film that begins while it loads, with stills to choose a poster from, and the upload goes', async () => {
    const media = await arrived(makeClip(folder, 'clip.mov'));
    await makeVideoReady(ctx, media.publicId, still);
    await media.reload();
    expect(media).toMatchObject({ state: 'ready', width: 320, height: 180, progressPermille: 1_000, failure: null, detail: { poster: 'still-2' } });
    expect(media.durationMs).toBeGreaterThan(1_900);
    expect(media.durationMs).toBeLessThan(2_200);
    expect(Object.keys(media.files).sort()).toEqual(['still-1', 'still-2', 'still-3', 'still-4', 'still-5', 'still-6', 'video']);
    const film = await readFile(store.pathOf(media.files['video']?.key ?? ''));
    expect(film.indexOf('moov')).toBeLessThan(film.indexOf('mdat'));
    expect((await probeVideo(join(folder, 'uploads', 'videos', media.publicId), 'video.mp4'))?.streams.map(({ codec }) => codec)).toEqual(['h264', 'aac']);
    expect((await leftovers()).filter((name) => !/^(?:video\.mp4|still-\d\.jpg)$/.test(name))).toEqual([]);
    expect(await VideoUpload.count()).toBe(0);
  });

  test('of more than 480 lines has a small one beside it for slow lines, made in the same run', async () => {
    const media = await arrived(makeClip(folder, 'large.mp4', { size: '1280x720' }));
    await makeVideoReady(ctx, media.publicId, still);
    await media.reload();
    expect(media).toMatchObject({ state: 'ready', width: 1280, height: 720 });
    const small = await probeVideo(join(folder, 'uploads', 'videos', media.publicId), 'small.mp4');
    expect(small?.streams.map(({ codec, width, height }) => [codec, width, height])).toEqual([['h264', 852, 480], ['aac', 0, 0]]);
    expect(small?.seconds).toBeCloseTo((media.durationMs ?? 0) / 1_000, 1);
    expect(media.files['small']?.byteCount).toBeLessThan(media.files['video']?.byteCount ?? 0);
    expect(media.byteCount).toBe(Object.values(media.files).reduce((sum, { byteCount }) => sum + byteCount, 0));
  });

  test.each([
    ['in WebM without sound', 'clip.webm', { codec: ['-c:v', 'libvpx', '-deadline', 'realtime'], sound: false }, [320, 180]],
    ['larger than it is shown', 'clip.mp4', { size: '2560x1440', seconds: 0.5 }, [1920, 1080]],
    ['upright, with odd sides', 'clip.mkv', { size: '1081x2161', seconds: 0.5, codec: ['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv444p'] }, [960, 1920]],
  ] as const)('%s is made to fit', async (_what, name, clip, size) => {
    const media = await arrived(makeClip(folder, name, clip));
    await makeVideoReady(ctx, media.publicId, still);
    await media.reload();
    expect([media.failure, media.state, media.width, media.height]).toEqual([null, 'ready', ...size]);
  });

  test('loses what else was in it: place, titles, chapters, cover and other tracks', async () => {
    makeClip(folder, 'plain.mp4');
    await writeFile(join(folder, 'words.srt'), '1\n00:00:00,000 --> 00:00:01,000\nhello\n');
    ffmpeg(folder, '-i', 'plain.mp4', '-i', 'words.srt', '-map', '0', '-map', '0:a', '-map', '1', '-c', 'copy', '-c:s', 'srt', '-metadata', 'location=+53.5+007.1/', '-metadata', 'title=At home', '-attach', 'words.srt', '-metadata:s:t', 'mimetype=font/ttf', 'clip.mkv');
    const media = await arrived(join(folder, 'clip.mkv'));
    await makeVideoReady(ctx, media.publicId, still);
    const film = await readFile(store.pathOf(`videos/${media.publicId}/video.mp4`));
    for (const word of ['At home', '+53.5', 'hello']) expect(film.includes(word)).toBe(false);
  });

  test('that replaces one of the same length keeps its captions and chapters; one of another length does not', async () => {
    const series = await buildSeries();
    const cues = [{ fromMs: 0, toMs: 900, words: 'Wind the warp.' }];
    for (const [durationMs, kept] of [[2_000, cues], [9_000, undefined]] as const) {
      const { id: ownerId } = await User.findOne({ rejectOnEmpty: true });
      const old = await Media.create({ ownerId, kind: 'video', state: 'ready', originalName: 'a.mp4', durationMs, files: {}, detail: { cues, chapters: [{ atMs: 0, title: 'Begin' }] } });
      const media = await arrived(makeClip(folder, 'clip.mp4'));
      await SeriesMedia.create({ seriesId: series.id, name: `film-${durationMs}`, mediaId: old.id, draftMediaId: media.id });
      await makeVideoReady(ctx, media.publicId, still);
      expect((await media.reload()).detail.cues).toEqual(kept);
    }
  });
});

describe('a file that is hostile or broken is refused in words, before it costs anything, and leaves no file', () => {
  const hls = (to: string): string => `#EXTM3U\n#EXT-X-TARGETDURATION:1\n#EXTINF:1,\n${to}\n#EXT-X-ENDLIST\n`;
  const bytes = (content: string | Buffer) => async (name: string): Promise<void> => { await writeFile(join(folder, name), content); };
  const ftyp = Buffer.from('\0\0\0\x18ftypisom\0\0\x02\0isomiso2', 'latin1');

  test.each([
    ['a playlist that names a secret of the server', bytes(hls('file:///etc/passwd')), 'cannot be read as a video'],
    ['a list of files to join', bytes("ffconcat version 1.0\nfile '/etc/passwd'\n"), 'cannot be read as a video'],
    ['a session description', bytes('v=0\no=- 0 0 IN IP4 127.0.0.1\ns=x\nc=IN IP4 127.0.0.1\nm=video 5004 RTP/AVP 96\n'), 'cannot be read as a video'],
    ['a manifest', bytes('<?xml version="1.0"?><MPD xmlns="urn:mpeg:dash:schema:mpd:2011"></MPD>'), 'cannot be read as a video'],
    ['a drawing', bytes('<svg xmlns="http://www.w3.org/2000/svg"/>'), 'cannot be read as a video'],
    ['nothing but a beginning', bytes(ftyp), 'cannot be read as a video'],
    ['a beginning and a playlist after it', bytes(Buffer.concat([ftyp, Buffer.from(hls('file:///etc/passwd'))])), 'cannot be read as a video'],
    ['noise', bytes(Buffer.from(Array.from({ length: 5_000 }, (_, at) => (at * 7_919) % 256))), 'cannot be read as a video'],
    ['sound alone', async (name: string) => { ffmpeg(folder, '-f', 'lavfi', '-i', 'sine=d=1', '-f', 'mp4', name); }, 'no moving picture'],
    ['a picture larger than any camera’s', async (name: string) => { makeClip(folder, name, { size: '8192x8192', seconds: 0.2, rate: 5, sound: false, codec: ['-c:v', 'libx264', '-preset', 'ultrafast', '-f', 'mp4'] }); }, '8192 by 8192'],
    ['a film of a hundred hours in a few bytes', async (name: string) => { ffmpeg(folder, '-f', 'lavfi', '-i', 'color=s=64x64:r=1/3600:d=360000', '-c:v', 'libx264', '-preset', 'ultrafast', '-f', 'mp4', name); }, 'hours long'],
    ['a thousand pictures a second', async (name: string) => { makeClip(folder, name, { rate: 1_000, seconds: 0.5, size: '64x64', sound: false, codec: ['-c:v', 'libx264', '-preset', 'ultrafast', '-f', 'mp4'] }); }, 'pictures a second'],
    ['forty tracks', async (name: string) => { makeClip(folder, 'one.mp4'); ffmpeg(folder, '-i', 'one.mp4', ...Array.from({ length: 40 }, () => ['-map', '0:v']).flat(), '-c', 'copy', '-f', 'mp4', name); }, '40 tracks'],
    ['a codec nobody’s camera writes', async (name: string) => { makeClip(folder, name, { codec: ['-c:v', 'ffv1', '-f', 'matroska'], sound: false }); }, 'ffv1'],
    ['a film cut off in its middle', async (name: string) => { makeClip(folder, name, { seconds: 4, codec: ['-c:v', 'libx264', '-preset', 'ultrafast', '-f', 'mp4'] }); await truncate(join(folder, name), 20_000); }, 'cannot be read as a video'],
    ['a film whose middle is noise', async (name: string) => { makeClip(folder, name, { more: ['-movflags', '+faststart'], codec: ['-c:v', 'libx264', '-preset', 'ultrafast', '-f', 'mp4'] }); const film = await readFile(join(folder, name)); film.fill(0x5a, film.indexOf('mdat') + 4); await writeFile(join(folder, name), film); }, 'video'],
  ])('%s', async (_what, make, says) => {
    await make('hostile');
    const media = await arrived(join(folder, 'hostile'));
    await makeVideoReady(ctx, media.publicId, still);
    await media.reload();
    expect([media.state, media.failure]).toEqual(['failed', expect.stringContaining(says)]);
    expect(await leftovers()).toEqual([]);
  });

  test('a playlist that names an address: nobody calls there', async () => {
    let called = 0;
    const server = createServer((_request, response) => { called += 1; response.end(); });
    await new Promise<void>((resolve) => { server.listen(0, '127.0.0.1', resolve); });
    const { port } = server.address() as AddressInfo;
    for (const start of ['', ftyp.toString('latin1')]) {
      await writeFile(join(folder, 'hostile'), start + hls(`http://127.0.0.1:${port}/a.ts`), 'latin1');
      const media = await arrived(join(folder, 'hostile'));
      await makeVideoReady(ctx, media.publicId, still);
      expect((await media.reload()).state).toBe('failed');
    }
    server.close();
    expect(called).toBe(0);
  });
});

describe('the worker', () => {
  test('keeps films apart from quick work, and does one at a time', async () => {
    await arrived(makeClip(folder, 'clip.mp4'));
    expect(await runDueJobs(ctx, 'quick', REGISTERED)).toBe(0);
    expect(await runLongJob(ctx, 'films', 'long', REGISTERED, still)).toBe(1);
    expect([await Media.count({ where: { state: 'ready' } }), await Job.count({ where: { state: 'done' } })]).toEqual([1, 1]);
  });

  test('that is stopped leaves nothing of the try behind, and the next one begins anew and ends it', async () => {
    const media = await arrived(makeClip(folder, 'clip.mp4', { seconds: 12, size: '640x360', rate: 30 }));
    const stop = new AbortController();
    const run = runLongJob(ctx, 'films', 'first', REGISTERED, stop.signal);
    await expect.poll(async () => (await media.reload()).state, { timeout: 30_000 }).toBe('processing');
    stop.abort(new Error('the worker stops'));
    await run;
    expect(await leftovers()).toEqual([media.publicId]);
    expect(await runLongJob(ctx, 'films', 'second', REGISTERED, still)).toBe(0);
    // As when the first one's lease has run out.
    await sequelize.query("UPDATE jobs SET lease_until = UTC_TIMESTAMP(3) - INTERVAL 1 SECOND WHERE state = 'ready'");
    expect(await runLongJob(ctx, 'films', 'second', REGISTERED, still)).toBe(1);
    expect((await media.reload()).state).toBe('ready');
  });

  test('writes down how much is done while it goes on', async () => {
    const media = await arrived(makeClip(folder, 'clip.mp4', { seconds: 60, size: '640x360', rate: 30 }));
    const enough = new AbortController();
    const run = makeVideoReady(ctx, media.publicId, enough.signal).catch((error: unknown) => error);
    const seen = new Set<number>();
    await expect.poll(async () => { seen.add((await media.reload()).progressPermille); return seen.size; }, { timeout: 50_000, interval: 300 }).toBeGreaterThan(2);
    enough.abort(new Error('seen enough'));
    await run;
    expect([...seen].every((permille) => permille >= 0 && permille <= 1_000)).toBe(true);
  });

  test('gives up in words for the teacher when every try took it down', async () => {
    const media = await arrived(makeClip(folder, 'clip.mp4'));
    await Job.update({ attempts: processVideo.maxAttempts }, { where: {} });
    await runLongJob(ctx, 'films', 'long', REGISTERED, still);
    expect(await media.reload()).toMatchObject({ state: 'failed', failure: expect.stringContaining('could not make this video ready') });
    expect((await Job.findOne())?.state).toBe('dead');
  });
});
