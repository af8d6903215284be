import { execFile } from 'node:child_process';
import { readFile, readdir, mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { timeStoryboard } from '#core/captions/storyboard.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { drawStoryboard, readStoryboard, type DrawnVideo } from '#server/media/draw-storyboard.ts';

const run = promisify(execFile);
const VIDEOS = 'content/series/low-tide/videos';

interface Probe {
  readonly streams: readonly unknown[];
  readonly format: { readonly duration: string };
}

async function lowTide() {
  const piece: FrameLoomPiece = JSON.parse(await readFile('content/series/low-tide/piece.json', 'utf8'));
  const plan = planPiece(piece);
  if (!plan.ok) throw new Error('the demo piece has no plan');
  return { piece, plan: plan.value, units: 'cm' as const };
}

describe('a storyboard drawn as a film', () => {
  let folder: string;
  let video: DrawnVideo;

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'storyboard-'));
    const board = readStoryboard(
      'title: Tabby\nscenes:\n  - { figure: tabby, from: 0, to: 1, seconds: 3, chapter: Rows, caption: "Over one, under the next." }\n  - { cloth: loom, from: 0.1, to: 0.1, seconds: 2, caption: "So it grows." }\n',
    );
    video = await drawStoryboard(board, await lowTide(), folder, 'tabby');
  }, 60_000);
  afterAll(() => rm(folder, { recursive: true, force: true }));

  it('plays anywhere: H.264 in 4:2:0 with a silent AAC track, as long as its scenes', async () => {
    const { stdout } = await run('ffprobe', ['-v', 'error', '-show_entries', 'stream=codec_name,pix_fmt,width,height:format=duration', '-of', 'json', video.videoPath]);
    const found: Probe = JSON.parse(stdout);
    expect(found.streams).toMatchObject([{ codec_name: 'h264', pix_fmt: 'yuv420p', width: 960, height: 540 }, { codec_name: 'aac' }]);
    expect(Number(found.format.duration)).toBeCloseTo(5, 0);
  });

  it('can be played while it loads, and jumps to any two seconds', async () => {
    const bytes = await readFile(video.videoPath);
    expect(bytes.indexOf('moov')).toBeLessThan(bytes.indexOf('mdat'));
    const { stdout } = await run('ffprobe', ['-v', 'error', '-select_streams', 'v', '-skip_frame', 'nokey', '-show_entries', 'frame=pts_time', '-of', 'csv=p=0', video.videoPath]);
    const times = stdout.trim().split('\n').map((line) => Number(line.replace(',', '')));
    times.forEach((time, index) => expect(time - (times[index - 1] ?? 0)).toBeLessThanOrEqual(2));
    expect(times.length).toBeGreaterThanOrEqual(3);
  });

  it('has captions, chapters and a poster beside it, and nothing half-made', async () => {
    expect(await readFile(video.captionsPath, 'utf8')).toContain('00:00:00.000 --> 00:00:03.000\nOver one, under the next.');
    expect(await readFile(video.chaptersPath, 'utf8')).toContain('00:00:00.000 --> 00:00:05.000\nRows');
    expect((await readFile(video.posterPath)).subarray(0, 2)).toEqual(Buffer.from([0xff, 0xd8]));
    expect((await readdir(folder)).sort()).toEqual(['tabby.chapters.vtt', 'tabby.jpg', 'tabby.mp4', 'tabby.vtt']);
  });
});

describe('a storyboard that cannot be drawn', () => {
  it('is refused with the place of the fault', () => {
    expect(() => readStoryboard('title: X\nscenes:\n  - { figure: juggling, seconds: 3, caption: Hm. }\n')).toThrow(/figure/);
    expect(() => readStoryboard('title: X\nscenes: []\n')).toThrow(/scenes/);
  });

  it('leaves nothing behind when the encoder cannot write', async () => {
    const board = readStoryboard('title: X\nscenes:\n  - { figure: tabby, seconds: 1, caption: Hm. }\n');
    await expect(drawStoryboard(board, await lowTide(), join(tmpdir(), 'no-such-folder-here'), 'x')).rejects.toThrow(/ffmpeg ended with/);
  });
});

describe('the videos of Low Tide', () => {
  it('are seven, each told in 40 to 90 seconds with chapters and captions that can be read in time', async () => {
    const files = (await readdir(VIDEOS)).filter((file) => file.endsWith('.yaml'));
    expect(files).toHaveLength(7);
    for (const file of files) {
      const timing = timeStoryboard(readStoryboard(await readFile(join(VIDEOS, file), 'utf8')));
      expect(timing.durationMs, file).toBeGreaterThanOrEqual(40_000);
      expect(timing.durationMs, file).toBeLessThanOrEqual(90_000);
      expect(timing.chapters.length, file).toBeGreaterThanOrEqual(3);
      for (const cue of timing.cues) expect(cue.words.length / ((cue.toMs - cue.fromMs) / 1000), `${file}: ${cue.words}`).toBeLessThan(18);
    }
  });
});
