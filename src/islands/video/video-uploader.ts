/** Sending one video, as the island sees it; what carries it is handed in. */
export interface VideoUploadEvents {
  progress(sentBytes: number): void;
  /** No answer came. `VideoUpload.again` goes on where it was. */
  dropped(): void;
  /** The server will not take it, and says why. */
  refused(says: string): void;
  done(video: string): void;
}

export interface VideoUpload {
  pause(): void;
  goOn(): void;
  again(): void;
  /** Stops for good: what has come is taken back. */
  stop(): void;
  /** Lets go of it here; what has come stays and can be gone on with. */
  leave(): void;
}

export interface VideoTarget {
  /** Public id of the part it is for. */
  readonly lesson: string;
  /** The video it shall replace, by its name in the series. */
  readonly name: string | null;
  /** Public id of the upload it goes on with. */
  readonly goesOn: string | null;
}

export type StartVideoUpload = (file: File, target: VideoTarget, events: VideoUploadEvents) => Promise<VideoUpload>;
