/** Photos on their way to a checkpoint. */
import { z } from 'astro/zod';
import { PHOTO_LIMITS, TOO_MANY_SHOTS } from '#core/photo/limits.ts';

const publicId = z.string().regex(/^[0-9a-z]{26}$/);
const at = { series: z.string().max(64), lesson: publicId };

/** What an upload says of itself before its first byte. */
export const BeginPhoto = z.object({ ...at, fileName: z.string().max(500).default(''), byteCount: z.number().int().min(0) });
export type BeginPhotoInput = z.output<typeof BeginPhoto>;

/** Photos that have come, shown together: a showing. */
export const ShowPhotos = z.object({
  ...at,
  words: z.string().trim().max(1_000, 'At most 1,000 characters work here.').default(''),
  /** Public ids, in the order they are looked at. */
  shots: z.array(publicId).min(1, 'Choose a photo first.').max(PHOTO_LIMITS.maxShots, TOO_MANY_SHOTS),
});
export type ShowPhotosInput = z.output<typeof ShowPhotos>;
