/**
 * Whether a video may be decoded at all, judged from what its container says of itself: nothing is decoded for it.
 * A small file can promise a hundred hours or a picture of a billion points, and the work would be ours.
 */
import { VIDEO_LIMITS } from '#core/video/limits.ts';

export interface ProbedStream {
  readonly index: number;
  readonly kind: string;
  readonly codec: string;
  readonly width: number;
  readonly height: number;
  /** As the container tells it; 0 when it does not. */
  readonly framesPerSecond: number;
  /** A picture that came with the file, such as a cover, and not a film. */
  readonly isStill: boolean;
}

export interface ProbedFile {
  /** Null when the container does not say. */
  readonly seconds: number | null;
  readonly streams: readonly ProbedStream[];
}

export type ProbeVerdict =
  | { readonly ok: true; readonly picture: number; readonly sound: number | null; readonly seconds: number }
  | { readonly ok: false; readonly says: string };

/** What cameras, phones and cutting programs write. */
const PICTURES: ReadonlySet<string> = new Set(['h264', 'hevc', 'vp8', 'vp9', 'av1', 'mpeg4', 'mpeg2video', 'prores', 'dnxhd', 'mjpeg']);
const SOUNDS: ReadonlySet<string> = new Set(['aac', 'mp3', 'opus', 'vorbis', 'flac', 'alac', 'ac3', 'eac3', 'pcm_s16le', 'pcm_s16be', 'pcm_s24le', 'pcm_s24be', 'pcm_s32le', 'pcm_f32le']);

const EXPORT_AGAIN = 'Export it once more as MP4 with H.264, the form every cutting program offers.';

const no = (says: string): ProbeVerdict => ({ ok: false, says });

export function judgeProbe({ seconds, streams }: ProbedFile): ProbeVerdict {
  if (streams.length > VIDEO_LIMITS.maxStreams) return no(`This file holds ${streams.length} tracks. At most ${VIDEO_LIMITS.maxStreams} work. ${EXPORT_AGAIN}`);
  const picture = streams.find(({ kind, isStill }) => kind === 'video' && !isStill);
  if (picture === undefined) return no('There is no moving picture in this file, only sound or nothing. Choose the video itself.');
  if (!PICTURES.has(picture.codec)) return no(`The picture in this file is written in a way we do not read (${wordOf(picture.codec)}). ${EXPORT_AGAIN}`);
  const { width, height, framesPerSecond } = picture;
  if (Math.max(width, height) > VIDEO_LIMITS.maxSide) return no(`This video is ${width} by ${height} points. At most ${VIDEO_LIMITS.maxSide} on a side work: export it smaller.`);
  if (Math.min(width, height) < VIDEO_LIMITS.minSide) return no(`This video is ${width} by ${height} points, too small to see anything in it.`);
  if (framesPerSecond > VIDEO_LIMITS.maxFramesPerSecond) return no(`This video has ${Math.round(framesPerSecond)} pictures a second. At most ${VIDEO_LIMITS.maxFramesPerSecond} work. ${EXPORT_AGAIN}`);
  if (seconds === null || !(seconds > 0)) return no(`This file does not say how long it is. ${EXPORT_AGAIN}`);
  if (seconds > VIDEO_LIMITS.maxSeconds) return no(`This video says it is ${Math.round(seconds / 3_600)} hours long. At most three hours work: make parts of it.`);
  const sound = streams.find(({ kind }) => kind === 'audio');
  if (sound !== undefined && !SOUNDS.has(sound.codec)) return no(`The sound in this file is written in a way we do not read (${wordOf(sound.codec)}). ${EXPORT_AGAIN}`);
  return { ok: true, picture: picture.index, sound: sound?.index ?? null, seconds };
}

/** A codec's name comes out of the file; what is shown of it is short and plain. */
function wordOf(codec: string): string {
  const word = codec.replace(/[^a-z0-9_]/gi, '').slice(0, 20);
  return word === '' ? 'unknown' : word;
}

/** The container told by a file's first bytes; null when it is none that we open. */
export function containerOfHead(head: Uint8Array): 'mov' | 'matroska' | null {
  const ascii = (from: number, to: number): string => String.fromCharCode(...head.subarray(from, to));
  if (['ftyp', 'moov', 'mdat', 'wide', 'free', 'skip'].includes(ascii(4, 8))) return 'mov';
  return head[0] === 0x1a && head[1] === 0x45 && head[2] === 0xdf && head[3] === 0xa3 ? 'matroska' : null;
}
