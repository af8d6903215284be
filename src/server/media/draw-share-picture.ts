/** Turns the drawing of a share picture into pixels. For the worker alone: see `withOwnDrawings`. */
import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { withOwnDrawings } from '#server/media/decoders.ts';
import type { MediaStore } from '#server/media/store.ts';

/** A drawing larger than this is of no piece that anybody weaves. */
const MOST_BYTES = 8_000_000;

export const hashOf = (svg: string): string => createHash('sha256').update(svg).digest('hex');

/** Writes it into the store under `key`. Throws when the drawing is too large or cannot be read. */
export async function writeSharePicture(store: MediaStore, key: string, svg: string): Promise<void> {
  if (svg.length > MOST_BYTES) throw new RangeError('The drawing is too large to be a share picture');
  const path = await store.temporaryPath(`share-${hashOf(svg)}-${process.pid}.png`);
  await withOwnDrawings(() => sharp(Buffer.from(svg)).flatten().png({ palette: true, effort: 7 }).toFile(path));
  await store.put(key, path);
}
