/** The answer by which an endpoint hands a file to the front server, which streams it with ranges and back-pressure. */
import type { MediaFile } from '#contracts/media.ts';

/** Read and taken off by the front server; never reaches a browser. */
export const SEND_HEADER = 'X-Fellmark-Send';

/** How long a browser may show its own copy without asking whether it still may. */
export type Keeping = 'keep-an-hour' | 'ask-each-time';

/** Browsers may keep it, nobody in between; and it can do nothing but be shown. */
export function sendFile(file: MediaFile, keeping: Keeping = 'keep-an-hour'): Response {
  return new Response(null, {
    headers: {
      [SEND_HEADER]: file.key,
      'Content-Type': file.contentType,
      // As it lies on the disk, byte for byte: ranges and tags are those of the file.
      'Cache-Control': keeping === 'ask-each-time' ? 'private, no-cache, no-transform' : 'private, max-age=3600, no-transform',
      Vary: 'Cookie',
      'Content-Security-Policy': "sandbox; default-src 'none'",
    },
  });
}
