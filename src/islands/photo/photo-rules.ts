// What is taken as a photo, judged on the device before anything is sent. The server judges again, by what is inside.
import { PHOTO_EMPTY, PHOTO_KINDS_WORDS, PHOTO_LIMITS } from '#core/photo/limits.ts';

/** Kinds the file dialog offers; phones that keep photos in another form turn them into JPEG for it. */
export const PHOTO_ACCEPT = 'image/jpeg,image/png,image/webp,image/avif';

const KINDS: ReadonlySet<string> = new Set(PHOTO_ACCEPT.split(','));

/** What is wrong with the file and what works; null when it may be sent. */
export function photoFault({ name, size, type }: Pick<File, 'name' | 'size' | 'type'>): string | null {
  if (/^image\/hei[cf]/.test(type) || /\.hei[cf]$/i.test(name)) {
    return 'This photo is in a form only some phones read. Send it as JPEG: in the camera settings choose the most compatible form, or take a picture of the picture.';
  }
  if (!KINDS.has(type)) return `This file is not a photo we can read. Use ${PHOTO_KINDS_WORDS}.`;
  if (size > PHOTO_LIMITS.maxBytes) return `This photo is ${megabytes(size)}. At most 25 MB work: most phones ask for a size when they share a picture.`;
  return size === 0 ? PHOTO_EMPTY : null;
}

const tenths = (bytes: number): string => (bytes / 1_000_000).toFixed(1);

export function megabytes(bytes: number): string {
  return `${tenths(bytes)}\u00a0MB`;
}

/** `3.1 of 5.0 MB` */
export function sentOf(sent: number, total: number): string {
  return `${tenths(Math.min(sent, total))} of ${megabytes(total)}`;
}
