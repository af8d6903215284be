/** Sending photos and showing them, as the island sees it; what carries them is handed in. */
import type { ShowPhotosInput } from '#contracts/photos.ts';
import type { Carried, CarryEvents } from '#islands/uploading/carry.ts';

/** Where photos are for: a checkpoint. */
export type PhotoTarget = Pick<ShowPhotosInput, 'series' | 'lesson'>;

export type StartUpload = (file: File, target: PhotoTarget & {
  /** Public id of the upload it goes on with. */
  readonly goesOn: string | null;
  /** Called once it has a public id. */
  readonly begun?: (shot: string) => void;
}, events: CarryEvents) => Promise<Pick<Carried, 'again' | 'leave' | 'stop'>>;

/** `later`: no answer came, ask again. */
export type ShowAnswer = 'shown' | 'later' | { readonly says: string };
export type Show = (showing: ShowPhotosInput) => Promise<ShowAnswer>;
