/**
 * What is taken as a video, in one place: the page says it, the browser judges by it before it sends, the door when an
 * upload begins, and the worker before anything is decoded.
 */
const MIB = 1_048_576;

export const VIDEO_LIMITS = {
  /** 4 GiB: the most one file on a camera's card can be. */
  maxBytes: 4_096 * MIB,
  maxSeconds: 3 * 3_600,
  /** Longest side, in points. */
  maxSide: 4_096,
  minSide: 64,
  maxFramesPerSecond: 240,
  maxStreams: 32,
  /** Videos of one teacher together. */
  maxBytesOfTeacher: 60 * 1_024 * MIB,
  /** Uploads of one teacher that are not whole yet. */
  maxUnfinished: 8,
  /** An upload that is not whole by then is forgotten. */
  uploadHours: 7 * 24,
} as const;

/** Endings of names, by the two kinds of container that are opened at all. */
export const VIDEO_ENDINGS = { mp4: 'mov', m4v: 'mov', mov: 'mov', mkv: 'matroska', webm: 'matroska' } as const;
export type VideoContainer = (typeof VIDEO_ENDINGS)[keyof typeof VIDEO_ENDINGS];

export const VIDEO_ACCEPT = 'video/mp4,video/quicktime,video/x-m4v,video/x-matroska,video/webm,.mp4,.m4v,.mov,.mkv,.webm';
export const VIDEO_KINDS_WORDS = 'MP4, MOV, MKV or WebM, up to 4 GB and three hours';

const NOT_A_VIDEO = `This file is not a video we can read. Use ${VIDEO_KINDS_WORDS}.`;

/** The container a file's name promises; null when it is none that we take. */
export function containerOfName(name: string): VideoContainer | null {
  const ending = name.slice(name.lastIndexOf('.') + 1).toLowerCase();
  return Object.hasOwn(VIDEO_ENDINGS, ending) ? VIDEO_ENDINGS[ending as keyof typeof VIDEO_ENDINGS] : null;
}

/** What is wrong with a file that shall be sent, by its name, size and the type its sender gives; null when it may come. */
export function videoFault({ name, size, type }: { readonly name: string; readonly size: number; readonly type: string }): string | null {
  if (containerOfName(name) === null || (type !== '' && !type.startsWith('video/') && type !== 'application/octet-stream')) return NOT_A_VIDEO;
  if (!Number.isInteger(size) || size <= 0) return 'This file is empty. Choose another.';
  if (size > VIDEO_LIMITS.maxBytes) return `This video is ${sizeWords(size)}. At most 4 GB work: export it smaller, or make two of it.`;
  return null;
}

/** `3.1 GB`, `980 MB`: decimal, as cameras and phones say it. */
export function sizeWords(bytes: number): string {
  return bytes >= 1e9 ? `${(bytes / 1e9).toFixed(1)}\u00a0GB` : `${Math.ceil(bytes / 1e6)}\u00a0MB`;
}
