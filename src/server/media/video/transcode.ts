/** From whatever a camera wrote to what every browser plays: H.264 and AAC in an MP4 that begins to play while it loads. */
import { open, stat } from 'node:fs/promises';
import { join } from 'node:path';
import type { ProbeVerdict } from '#core/video/judge-probe.ts';
import { CAREFULLY, runTool, type ToolEnd } from './run-tool.ts';

export interface Transcoding {
  /** The try's own folder; `source` and what is written are names in it. */
  readonly folder: string;
  readonly source: string;
  readonly verdict: Extract<ProbeVerdict, { ok: true }>;
  readonly signal: AbortSignal;
  /** Told how much is done, 0 to 1, as it goes on. */
  readonly onProgress: (done: number) => void;
}

export const TRANSCODED = 'video.mp4';
/** The same film for slow lines, made in the same run. */
export const SMALL = 'small.mp4';
/** Lines of the small film. */
export const SMALL_LINES = 480;
const MOST_BYTES = 8_000_000_000;

/** Fits into so many points by so many lines either way up, never made larger, with even sides and square points. */
function scaleTo(points: number, lines: number): string {
  const fit = `min(1,min(${points}/max(iw,ih),${lines}/min(iw,ih)))`;
  return [
    "scale='trunc(iw*sar/2)*2':'trunc(ih/2)*2'", 'setsar=1',
    `scale='trunc(iw*${fit}/2)*2':'trunc(ih*${fit}/2)*2':out_color_matrix=bt709:out_range=tv`, 'format=yuv420p',
  ].join(',');
}

interface Rendition {
  readonly name: string;
  readonly scale: string;
  /** x264's measure of loss, its most bits a second, and those of the sound. */
  readonly crf: string;
  readonly most: string;
  readonly buffer: string;
  readonly sound: string;
}

const RENDITIONS: readonly Rendition[] = [
  { name: TRANSCODED, scale: scaleTo(1920, 1080), crf: '22', most: '6M', buffer: '12M', sound: '128k' },
  // Under a megabit a second in all, so that it plays on a line that carries one.
  { name: SMALL, scale: scaleTo(854, SMALL_LINES), crf: '26', most: '800k', buffer: '1600k', sound: '96k' },
];

/** Writes TRANSCODED and SMALL into the folder, on the disk for good when this is over. */
export async function transcode({ folder, source, verdict, signal, onProgress }: Transcoding): Promise<ToolEnd> {
  const { picture, sound, seconds } = verdict;
  const end = await runTool('ffmpeg', [
    ...CAREFULLY, '-nostdin', '-y', '-max_alloc', '500000000', '-threads', '2', '-i', `file:${source}`,
    '-progress', 'pipe:1', '-stats_period', '1',
    ...RENDITIONS.flatMap((rendition) => writing(rendition, { picture, sound, seconds })),
  ], {
    folder, signal, maxFileBytes: MOST_BYTES, seconds: Math.ceil(seconds * 8) + 300,
    onLine: (line) => {
      const reached = /^out_time_us=(\d+)$/.exec(line)?.[1];
      if (reached !== undefined) onProgress(Math.min(1, Number(reached) / 1_000_000 / seconds));
    },
  });
  if (end.ended === 'well') for (const { name } of RENDITIONS) await keepOnDisk(join(folder, name));
  return end;
}

function writing({ name, scale, crf, most, buffer, sound: soundBits }: Rendition, { picture, sound, seconds }: Pick<Transcoding['verdict'], 'picture' | 'sound' | 'seconds'>): string[] {
  return [
    // A file may hold more than it says.
    '-t', String(Math.ceil(seconds) + 1),
    '-map', `0:${picture}`, ...(sound === null ? [] : ['-map', `0:${sound}`]), '-sn', '-dn', '-map_metadata', '-1', '-map_chapters', '-1',
    '-vf', scale, '-fpsmax', '60',
    '-c:v', 'libx264', '-preset', 'veryfast', '-profile:v', 'high', '-crf', crf, '-maxrate', most, '-bufsize', buffer, '-threads', '2',
    '-colorspace', 'bt709', '-color_primaries', 'bt709', '-color_trc', 'bt709',
    // A picture to begin at every two seconds, so that a chapter begins at once.
    '-force_key_frames', 'expr:gte(t,n_forced*2)',
    '-c:a', 'aac', '-b:a', soundBits, '-ac', '2', '-ar', '48000',
    '-movflags', '+faststart', '-f', 'mp4', name,
  ];
}

/** Pictures from all through a finished film of ours, `still-1.jpg` and on; shorter ones may give fewer. @returns their names. */
export async function takeStills(folder: string, film: string, seconds: number, count: number, signal: AbortSignal): Promise<string[]> {
  const names: string[] = [];
  for (let number = 1; number <= count; number += 1) {
    const name = `still-${number}.jpg`;
    const at = ((number - 0.5) * seconds) / count;
    await runTool('ffmpeg', [...CAREFULLY, '-nostdin', '-y', '-ss', at.toFixed(3), '-i', `file:${film}`, '-frames:v', '1', '-vf', 'scale=w=1280:h=1280:force_original_aspect_ratio=decrease', '-q:v', '4', '-f', 'image2', '-update', '1', name], { folder, signal, seconds: 60, maxFileBytes: 20_000_000 });
    if (await stat(join(folder, name)).then(({ size }) => size > 0, () => false)) names.push(name);
  }
  return names;
}

async function keepOnDisk(path: string): Promise<void> {
  const file = await open(path);
  try {
    await file.sync();
  } finally {
    await file.close();
  }
}
