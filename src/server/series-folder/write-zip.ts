/** Writes a zip whose bytes follow from what is in it alone: no times, no packing, files in the order given. */
import { createWriteStream } from 'node:fs';
import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { ZipFile } from 'yazl';

export interface FileForZip {
  readonly name: string;
  /** Text, or a file that is read when its turn comes. */
  readonly content: string | { readonly byteCount: number; open(): Readable };
}

// Films and pictures do not get smaller by packing, and the texts of a series are small beside one picture.
// The time is the earliest a zip can say, by the wall clock that it says times by.
const ALIKE = { compress: false, mtime: new Date(1980, 0, 1), mode: 0o100644, forceDosTimestamp: true } as const;

/** Writes the zip to `path`, file by file, never more than a piece of one in memory. */
export async function writeZip(path: string, files: readonly FileForZip[]): Promise<void> {
  const zip = new ZipFile();
  const out = createWriteStream(path);
  const failed = new Promise<never>((_resolve, reject) => { zip.once('error', reject); });
  for (const { name, content } of files) {
    if (typeof content === 'string') {
      zip.addBuffer(Buffer.from(content), name, ALIKE);
    } else {
      zip.addReadStreamLazy(name, { ...ALIKE, size: content.byteCount }, (take) => {
        const stream = content.open();
        stream.once('error', (error) => { zip.emit('error', error); });
        take(null, stream);
      });
    }
  }
  zip.end();
  try {
    await Promise.race([pipeline(zip.outputStream, out), failed]);
  } finally {
    out.destroy();
  }
}
