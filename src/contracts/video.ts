/** Videos on their way from a teacher's device to her students. */
import { z } from 'astro/zod';
import { CAPTION_LIMITS } from '#core/captions/caption-faults.ts';
import type { Cue } from '#core/captions/cues.ts';
import type { MediaState } from '#contracts/media.ts';

const publicId = z.string().regex(/^[0-9a-z]{26}$/);
const name = z.string().regex(/^[a-z0-9-]{1,64}$/);

/** What an upload says of itself before its first byte. */
export const BeginVideo = z.object({
  lesson: publicId,
  /** The video it shall replace, by its name in the series; else it is a new one. */
  name: name.nullish().transform((given) => given ?? null),
  fileName: z.string().min(1).max(500),
  fileType: z.string().max(100).default(''),
  byteCount: z.number().int().min(0),
});
export type BeginVideoInput = z.output<typeof BeginVideo>;

const cue = z.object({ fromMs: z.number().int().min(0).max(86_400_000), toMs: z.number().int().min(0).max(86_400_000), words: z.string().max(2_000) });

/** Captions as the editor keeps them while they are written. */
export const KeepCues = z.object({ video: publicId, revision: z.number().int().min(0), cues: z.array(cue).max(CAPTION_LIMITS.maxCues) });
export type KeepCuesInput = z.output<typeof KeepCues>;

const revision = z.coerce.number().int().min(0);
const draft = { video: publicId, revision };

/** Captions as a WebVTT text: typed, or read from a file. */
export const CaptionsForm = z.object({ ...draft, vtt: z.string().max(CAPTION_LIMITS.maxFileBytes, 'Captions hold at most 900 KB. Make two videos of it.').default('') });
/** Chapters as lines of a time and a title. */
export const ChaptersForm = z.object({ ...draft, chapters: z.string().max(10_000, 'This is too much for a list of chapters.').default('') });
export const PosterForm = z.object({ ...draft, poster: z.string().regex(/^[a-z0-9-]{1,40}$/, 'Choose one of the pictures.') });
export const PutVideoInForm = z.object({ lesson: publicId, name });
export const DeleteVideoForm = z.object({ series: z.string().regex(/^[a-z0-9-]{1,64}$/), name });
export type DeleteVideoInput = z.output<typeof DeleteVideoForm>;

/** The draft was kept. `savedAt` is a time of day on the teacher's clock. */
export interface CuesKept {
  readonly revision: number;
  readonly savedAt: string;
}

/** The draft was not kept: another window kept `cues` in the meantime. */
export interface CuesBehind {
  readonly behind: { readonly revision: number; readonly cues: readonly Cue[] };
}

/** A video between its first byte and being ready, or what came of it. */
export interface VideoOnItsWay {
  readonly video: string;
  /** In its series. */
  readonly name: string;
  readonly title: string;
  readonly fileName: string;
  readonly state: MediaState;
  readonly byteCount: number;
  /** How much of it is here; all of it once it is whole. */
  readonly arrivedBytes: number;
  /** How much is made ready, in thousandths. */
  readonly permille: number;
  /** Videos that are made ready before this one; null when it does not wait. */
  readonly before: number | null;
  readonly failure: string | null;
}

/** Where a student stopped. */
export const KeepPlace = z.object({
  series: z.string().regex(/^[a-z0-9-]{1,64}$/),
  lesson: publicId,
  name,
  placeMs: z.number().int().min(0).max(86_400_000),
});
export type KeepPlaceInput = z.output<typeof KeepPlace>;
