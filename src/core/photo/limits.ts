/** What is taken as a photo, in one place: the page says it, the browser judges by it before it sends, and the server when it came. */
export const PHOTO_LIMITS = {
  maxBytes: 25_000_000,
  maxPixels: 50_000_000,
  /** Longest side, in points. */
  maxSide: 12_000,
  /** Photos of one showing. */
  maxShots: 6,
  /** Photos of one student that are on their way or have come and were not shown. */
  maxUnshown: 24,
  /** A photo that is not shown by then is forgotten. */
  uploadHours: 7 * 24,
} as const;

export const PHOTO_KINDS_WORDS = 'JPEG, PNG or WebP, up to 25 MB';
/** For one sent whole, in a form. */
export const PHOTO_TOO_LARGE = 'This photo is larger than 25 MB. Send it smaller: most phones ask for a size when they share a picture.';
export const PHOTO_EMPTY = 'This file is empty. Choose another.';
export const TOO_MANY_SHOTS = `At most ${PHOTO_LIMITS.maxShots} photos work at once. Send those that show most.`;
