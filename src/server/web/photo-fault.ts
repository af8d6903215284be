/**
 * Why a photo sent without JavaScript was not taken, and the words that came with it: left for the page of the part, in
 * a cookie, since it is this browser's and for a minute only.
 */
import { z } from 'astro/zod';
import { config } from '#server/config.ts';

const PhotoFault = z.object({ says: z.string(), words: z.string() });
export type PhotoFault = z.output<typeof PhotoFault>;

/** A browser drops a cookie of more than 4096 bytes; the words are cut before that. */
const MOST_BYTES = 3_000;

export function photoFaultCookie(): { name: string; options: { path: string; httpOnly: true; secure: boolean; sameSite: 'lax'; maxAge: number } } {
  return { name: 'photo-fault', options: { path: '/series', httpOnly: true, secure: config().secureCookies, sameSite: 'lax', maxAge: 60 } };
}

export function writePhotoFault(fault: PhotoFault): string {
  let { words } = fault;
  while (encodeURIComponent(JSON.stringify({ ...fault, words })).length > MOST_BYTES) words = words.slice(0, Math.floor(words.length * 0.8));
  return JSON.stringify({ ...fault, words });
}

export function readPhotoFault(text: string | undefined): PhotoFault | null {
  try {
    return text === undefined ? null : PhotoFault.parse(JSON.parse(text));
  } catch {
    return null;
  }
}
