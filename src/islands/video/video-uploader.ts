/** Sending one video, as the island sees it; what carries it is handed in. */
import type { Carried, CarryEvents } from '#islands/uploading/carry.ts';

export type VideoUploadEvents = CarryEvents;
export type VideoUpload = Carried;

export interface VideoTarget {
  /** Public id of the part it is for. */
  readonly lesson: string;
  /** The video it shall replace, by its name in the series. */
  readonly name: string | null;
  /** Public id of the upload it goes on with. */
  readonly goesOn: string | null;
}

export type StartVideoUpload = (file: File, target: VideoTarget, events: VideoUploadEvents) => Promise<VideoUpload>;
