/**
 * Which forms of pictures this process can read at all. The library would open SVG, PDF and more, whatever the file is
 * called; a person's file must never reach those.
 */
import sharp from 'sharp';

const PHOTOS = ['Jpeg', 'Png', 'Webp', 'Heif'].flatMap((form) => [`VipsForeignLoad${form}File`, `VipsForeignLoad${form}Buffer`]);
const DRAWINGS = ['VipsForeignLoadSvgBuffer'];

/** From now on only what phones and cameras write. */
export function readOnlyPhotos(): void {
  sharp.block({ operation: ['VipsForeignLoad'] });
  sharp.unblock({ operation: PHOTOS });
}

/* Photos are read beside each other; drawings wait for them, and photos that come meanwhile wait for the drawings. */
const photos = new Set<Promise<unknown>>();
let drawings: Promise<unknown> = Promise.resolve();

/** Runs `work`, which reads a file of a person; no drawing can be opened meanwhile. */
export async function withOnlyPhotos<T>(work: () => Promise<T>): Promise<T> {
  for (let before: Promise<unknown> | null = null; before !== drawings; await before) before = drawings;
  const running = work();
  photos.add(running);
  try {
    return await running;
  } finally {
    photos.delete(running);
  }
}

/** Runs `work`, which turns our own drawings into pixels; nothing of a person is read meanwhile in this process. */
export function withOwnDrawings<T>(work: () => Promise<T>): Promise<T> {
  const running = drawings.then(async () => {
    await Promise.allSettled(photos);
    sharp.unblock({ operation: DRAWINGS });
    try {
      return await work();
    } finally {
      sharp.block({ operation: DRAWINGS });
    }
  });
  drawings = running.catch(() => undefined);
  return running;
}
