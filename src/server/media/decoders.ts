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

/** Runs `work`, which turns our own drawings into pixels; nothing of a person may be read meanwhile in this process. */
export async function withOwnDrawings<T>(work: () => Promise<T>): Promise<T> {
  sharp.unblock({ operation: DRAWINGS });
  try {
    return await work();
  } finally {
    sharp.block({ operation: DRAWINGS });
  }
}
