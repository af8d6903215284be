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

/** Renditions by name: photos have `large` and `thumb`; videos `video`, `captions` and `poster`. */
export type MediaFiles = Readonly<Record<string, MediaFile>>;

/** What is told of a file besides its bytes: `alt` of a picture, chapters and cues of a video. */
export interface MediaDetail {
  readonly alt?: string;
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
  readonly files: MediaFiles;
  readonly detail: MediaDetail;
}
