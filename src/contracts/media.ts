/** Files of people as data. */
import type { Chapter, Cue } from '#core/captions/cues.ts';

export type { Chapter, Cue } from '#core/captions/cues.ts';

export interface MediaFile {
  /** Where the file lies, relative to the uploads folder. */
  readonly key: string;
  readonly contentType: string;
  readonly byteCount: number;
  readonly width?: number;
  readonly height?: number;
}

/** From the first byte of an upload to what people see; a photo is `ready` at once. */
export const MEDIA_STATES = ['created', 'uploaded', 'probing', 'processing', 'ready', 'failed'] as const;
export type MediaState = (typeof MEDIA_STATES)[number];

/** Renditions by name: photos have `large` and `thumb`; videos `video` and stills, any of which may be the poster. */
export type MediaFiles = Readonly<Record<string, MediaFile>>;

/** What is told of a file besides its bytes: `alt` of a picture, chapters and cues of a video. */
export interface MediaDetail {
  readonly alt?: string;
  /** Name of the rendition that stands for a video before it plays; `poster` when not said. */
  readonly poster?: string;
  readonly chapters?: readonly Chapter[];
  readonly cues?: readonly Cue[];
}

/** A picture or video of a series that is ready to be shown. */
export interface SeriesMediaFile {
  readonly kind: 'picture' | 'video';
  /** Its name in the series, by which lessons speak of it. */
  readonly name: string;
  readonly title: string;
  readonly publicId: string;
  readonly durationMs: number | null;
  readonly files: MediaFiles;
  readonly detail: MediaDetail;
  /** Whether `detail` is its teacher's draft, which students do not see yet. */
  readonly isDraft: boolean;
}

/** A picture was put into a series: the name by which its lessons speak of it. */
export interface PicturePutIn {
  readonly name: string;
}
