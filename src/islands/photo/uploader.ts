/** Sending one photo, as the island sees it; what carries it is handed in. */
export interface UploadEvents {
  progress(sentBytes: number): void;
  /** No answer came. `Upload.again` sends it anew. */
  dropped(): void;
  /** The server will not take it, and says why. */
  refused(says: string): void;
  done(): void;
}

export interface Upload {
  again(): void;
  stop(): void;
}

export type StartUpload = (file: File, fields: Readonly<Record<string, string>>, events: UploadEvents) => Promise<Upload>;
