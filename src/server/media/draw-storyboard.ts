/**
 * From a storyboard to a short film: frames drawn from the piece, encoded as they are made, with captions and chapters.
 *
 * Needs ffmpeg on the path. Frames go to it through a pipe, so no picture is ever written to disk, and a frame that looks
 * like the one before it is not drawn again.
 */
import { spawn } from 'node:child_process';
import { rename, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import sharp from 'sharp';
import { load } from 'js-yaml';
import { StoryboardFile } from '#contracts/storyboard.ts';
import type { Chapter, Cue } from '#core/captions/cues.ts';
import { FRAME, drawFrame } from '#core/captions/draw-frame.ts';
import { progressAt, timeStoryboard, type Storyboard, type TimedScene, type Timing } from '#core/captions/storyboard.ts';
import { captionsToVtt, chaptersToVtt } from '#core/captions/web-vtt.ts';
import type { AnyFigureInput } from '#core/craft/figures/figures.ts';
import { withOwnDrawings } from '#server/media/decoders.ts';

export interface DrawnVideo {
  /** H.264 and a silent AAC track in an MP4 that can be played while it loads. */
  readonly videoPath: string;
  readonly captionsPath: string;
  readonly chaptersPath: string;
  /** JPEG of a moment when much can be seen. */
  readonly posterPath: string;
  readonly cues: readonly Cue[];
  readonly chapters: readonly Chapter[];
  readonly durationMs: number;
  readonly width: number;
  readonly height: number;
}

/** Hands move slowly: more pictures in a second would cost time and show nothing more. */
const FRAMES_PER_SECOND = 6;
/** A key frame every two seconds, so that jumping to a place is quick. */
const KEY_FRAME_EVERY = 2 * FRAMES_PER_SECOND;

/** Reads a storyboard file. Throws with every problem named: storyboards ship with the program or are checked before. */
export function readStoryboard(yaml: string): Storyboard {
  return StoryboardFile.parse(load(yaml));
}

/** Makes `<name>.mp4`, `.vtt`, `.chapters.vtt` and `.jpg` in `folder`, which must exist. */
export async function drawStoryboard(storyboard: Storyboard, input: AnyFigureInput, folder: string, name: string): Promise<DrawnVideo> {
  const timing = timeStoryboard(storyboard);
  const at = (ending: string): string => join(folder, `${name}${ending}`);
  const files = { videoPath: at('.mp4'), captionsPath: at('.vtt'), chaptersPath: at('.chapters.vtt'), posterPath: at('.jpg') };
  const frames = frameMaker(storyboard.title, timing, input);
  await withOwnDrawings(async () => {
    await encode(frames, timing.durationMs, files.videoPath);
    await writeFile(files.posterPath, await posterOf(timing, storyboard.title, input));
  });
  await writeFile(files.captionsPath, captionsToVtt(timing.cues));
  await writeFile(files.chaptersPath, chaptersToVtt(timing.chapters, timing.durationMs));
  const { cues, chapters, durationMs } = timing;
  return { ...files, cues, chapters, durationMs, ...FRAME };
}

/** The frame at a moment as raw RGB; the same buffer again while nothing changes. */
function frameMaker(title: string, timing: Timing, input: AnyFigureInput): (atMs: number) => Promise<Buffer> {
  let before: { readonly svg: string; readonly pixels: Promise<Buffer> } | undefined;
  return (atMs) => {
    const timed = sceneAt(timing, atMs);
    const svg = drawFrame(timed.scene, progressAt(timed, atMs), input, { title, chapter: timed.chapter });
    if (before?.svg !== svg) before = { svg, pixels: sharp(Buffer.from(svg)).removeAlpha().raw().toBuffer() };
    return before.pixels;
  };
}

function sceneAt(timing: Timing, atMs: number): TimedScene {
  const found = timing.scenes.find((scene) => atMs < scene.toMs) ?? timing.scenes.at(-1);
  if (found === undefined) throw new RangeError('A storyboard has at least one scene');
  return found;
}

/** The scene that moves longest, nearly done. */
async function posterOf(timing: Timing, title: string, input: AnyFigureInput): Promise<Buffer> {
  const longest = timing.scenes.reduce((best, scene) => (scene.toMs - scene.fromMs > best.toMs - best.fromMs ? scene : best), sceneAt(timing, 0));
  const progress = progressAt(longest, longest.fromMs + (longest.toMs - longest.fromMs) * 0.6);
  const svg = drawFrame(longest.scene, progress, input, { title, chapter: longest.chapter });
  return sharp(Buffer.from(svg)).flatten().jpeg({ quality: 86 }).toBuffer();
}

async function encode(frameAt: (atMs: number) => Promise<Buffer>, durationMs: number, path: string): Promise<void> {
  const unfinished = `${path}.part`;
  const encoder = spawn('ffmpeg', encoderArguments(durationMs / 1000, unfinished), { stdio: ['pipe', 'ignore', 'pipe'] });
  let said = '';
  encoder.stderr.setEncoding('utf8').on('data', (text: string) => (said = (said + text).slice(-2000)));
  const ended = new Promise<number | null>((resolve, reject) => encoder.once('error', reject).once('close', resolve));
  const fed = pipeline(Readable.from(framesOf(frameAt, durationMs), { objectMode: true, highWaterMark: 2 }), encoder.stdin);
  try {
    /* A pipe that closes early is only a sign of failure; the reason is in what the encoder said. */
    const [end, feeding] = await Promise.allSettled([ended, fed]);
    if (end.status === 'rejected') throw end.reason;
    if (end.value !== 0) throw new Error(`ffmpeg ended with ${String(end.value)}: ${said.trim()}`);
    if (feeding.status === 'rejected') throw feeding.reason;
    await rename(unfinished, path);
  } catch (error) {
    await rm(unfinished, { force: true });
    throw error;
  }
}

/** Every frame in order. The next one is being drawn while its forerunner is encoded. */
async function* framesOf(frameAt: (atMs: number) => Promise<Buffer>, durationMs: number): AsyncGenerator<Buffer> {
  const count = Math.ceil((durationMs / 1000) * FRAMES_PER_SECOND);
  const begin = (atMs: number): Promise<Buffer> => {
    const drawing = frameAt(atMs);
    /* The encoder may have had enough while one is drawn; what was drawn for nobody may fail unheard. */
    drawing.catch(() => undefined);
    return drawing;
  };
  let next = begin(0);
  for (let frame = 1; frame <= count; frame++) {
    const pixels = await next;
    if (frame < count) next = begin((frame * 1000) / FRAMES_PER_SECOND);
    yield pixels;
  }
}

function encoderArguments(seconds: number, path: string): string[] {
  const { width, height } = FRAME;
  return [
    '-hide_banner', '-loglevel', 'error', '-y',
    '-f', 'rawvideo', '-pix_fmt', 'rgb24', '-s', `${width}x${height}`, '-r', String(FRAMES_PER_SECOND), '-i', 'pipe:0',
    '-f', 'lavfi', '-i', 'anullsrc=channel_layout=mono:sample_rate=44100',
    '-t', String(seconds),
    '-vf', 'scale=out_color_matrix=bt709:out_range=tv,format=yuv420p',
    '-colorspace', 'bt709', '-color_primaries', 'bt709', '-color_trc', 'bt709',
    '-c:v', 'libx264', '-preset', 'superfast', '-tune', 'animation', '-crf', '23', '-profile:v', 'high', '-g', String(KEY_FRAME_EVERY),
    '-c:a', 'aac', '-b:a', '32k',
    '-map', '0:v', '-map', '1:a', '-map_metadata', '-1', '-movflags', '+faststart',
    '-f', 'mp4', path,
  ];
}
