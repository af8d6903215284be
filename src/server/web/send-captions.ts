/** Captions as players read them, written anew from their lines each time: what a teacher sent is never sent on. */
import type { Cue } from '#core/captions/cues.ts';
import { captionsToVtt } from '#core/captions/web-vtt.ts';

export function sendCaptions(cues: readonly Cue[]): Response {
  return new Response(captionsToVtt(cues), {
    headers: {
      'Content-Type': 'text/vtt; charset=utf-8',
      // They may be mended at any time, and are small.
      'Cache-Control': 'private, no-cache',
      Vary: 'Cookie',
      'Content-Security-Policy': "sandbox; default-src 'none'",
    },
  });
}
