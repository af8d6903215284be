/**
 * Photos of people: decoded, turned upright, stripped of everything but the picture, and written anew, before anybody
 * else sees them. The original is not kept: it may carry a place, a name, or something that is no picture.
 */
import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { open, rm, stat } from 'node:fs/promises';
import { pipeline } from 'node:stream/promises';
import sharp from 'sharp';
import type { MediaFile, MediaFiles } from '#contracts/media.ts';
import { PHOTO_EMPTY, PHOTO_KINDS_WORDS, PHOTO_LIMITS } from '#core/photo/limits.ts';
import { AppError } from '#server/errors.ts';
import { readOnlyPhotos, withOnlyPhotos } from '#server/media/decoders.ts';
import type { MediaStore } from '#server/media/store.ts';

readOnlyPhotos();
sharp.cache(false);
sharp.concurrency(1);

const RENDITIONS = { large: { side: 2_048, quality: 82 }, thumb: { side: 320, quality: 76 } } as const;
const NOT_A_PHOTO = `This file is not a photo we can read. Use ${PHOTO_KINDS_WORDS}.`;

/** Where photos lie whose bytes are still arriving. */
export const PHOTO_UPLOADS_FOLDER = 'photos';

export interface ReadPhoto {
  readonly width: number;
  readonly height: number;
  readonly byteCount: number;
  readonly files: MediaFiles;
}

/** The kind told by the first bytes; null when it is none that we take. */
async function kindOf(path: string): Promise<'jpeg' | 'png' | 'webp' | 'avif' | 'heic' | null> {
  const file = await open(path);
  try {
    const head = Buffer.alloc(16);
    await file.read(head, 0, 16, 0);
    if (head.subarray(0, 3).equals(Buffer.from([0xff, 0xd8, 0xff]))) return 'jpeg';
    if (head.subarray(0, 8).equals(Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]))) return 'png';
    if (head.toString('latin1', 0, 4) === 'RIFF' && head.toString('latin1', 8, 12) === 'WEBP') return 'webp';
    if (head.toString('latin1', 4, 8) === 'ftyp') return head.toString('latin1', 8, 12).startsWith('avi') ? 'avif' : 'heic';
    return null;
  } finally {
    await file.close();
  }
}

/**
 * Reads the photo at `path` and puts its renditions into the store under `folder`. The file at `path` is left alone.
 * @throws UNSUPPORTED when it is no photo; TOO_LARGE by pixels or sides. The sentence says what works.
 */
export function takePhoto(store: MediaStore, path: string, folder: string): Promise<ReadPhoto> {
  return withOnlyPhotos(() => takeAlone(store, path, folder));
}

async function takeAlone(store: MediaStore, path: string, folder: string): Promise<ReadPhoto> {
  if ((await stat(path)).size === 0) throw new AppError('UNSUPPORTED', { says: PHOTO_EMPTY });
  const kind = await kindOf(path);
  if (kind === 'heic') throw new AppError('UNSUPPORTED', { says: 'This photo is in a form only some phones read. Send it as JPEG: in the camera settings choose the most compatible form, or take a picture of the picture.' });
  if (kind === null) throw new AppError('UNSUPPORTED', { says: NOT_A_PHOTO });
  const upright = await measure(path);
  const files: Record<string, MediaFile> = {};
  let byteCount = 0;
  for (const [name, { side, quality }] of Object.entries(RENDITIONS)) {
    const temporary = await store.temporaryPath(`${folder.replaceAll('/', '-')}-${name}.webp`);
    try {
      const { size, width, height } = await sharp(path, { limitInputPixels: PHOTO_LIMITS.maxPixels, failOn: 'warning', sequentialRead: true, pages: 1 })
        .timeout({ seconds: 20 })
        .autoOrient()
        .toColourspace('srgb')
        .resize({ width: side, height: side, fit: 'inside', withoutEnlargement: true })
        .webp({ quality })
        .toFile(temporary);
      const key = keyOf(folder, name);
      await store.put(key, temporary);
      files[name] = { key, contentType: 'image/webp', byteCount: size, width, height };
      byteCount += size;
    } catch (error) {
      await rm(temporary, { force: true });
      await Promise.all(Object.values(files).map(({ key }) => store.remove(key)));
      throw new AppError('UNSUPPORTED', { says: 'This photo is damaged: only a part of it can be read. Send it again, or take another.', cause: error });
    }
  }
  return { ...upright, byteCount, files };
}

/** Removes what `takePhoto` put under `folder`. */
export async function removePhoto(store: MediaStore, folder: string): Promise<void> {
  await Promise.all(Object.keys(RENDITIONS).map((name) => store.remove(keyOf(folder, name))));
}

function keyOf(folder: string, name: string): string {
  return `${folder}/${name}.webp`;
}

/** Width and height as seen, after the limits were checked; nothing is decoded for this. */
async function measure(path: string): Promise<{ width: number; height: number }> {
  const metadata = await sharp(path, { limitInputPixels: false, pages: 1 }).metadata().catch((error: unknown) => {
    throw new AppError('UNSUPPORTED', { says: NOT_A_PHOTO, cause: error });
  });
  const { width, height } = metadata.autoOrient;
  if (width * height > PHOTO_LIMITS.maxPixels || Math.max(width, height) > PHOTO_LIMITS.maxSide) {
    throw new AppError('TOO_LARGE', { says: `This photo is ${width} by ${height} points. At most 50 million points and ${PHOTO_LIMITS.maxSide} on a side work; make it smaller first.` });
  }
  if (width < 16 || height < 16) throw new AppError('UNSUPPORTED', { says: 'This picture is too small to see anything in it.' });
  return { width, height };
}

/** SHA-256 of the file at `path`, in hex. */
export async function digestOf(path: string): Promise<string> {
  const hash = createHash('sha256');
  await pipeline(createReadStream(path), hash);
  return hash.digest('hex');
}
