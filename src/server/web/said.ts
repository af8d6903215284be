/** A sentence left for the next page: what was done. In a cookie, since it is this browser's and for a minute only. */
import { config } from '#server/config.ts';

export function saidCookie(): { name: string; options: { path: '/'; httpOnly: true; secure: boolean; sameSite: 'lax'; maxAge: number } } {
  return { name: 'said', options: { path: '/', httpOnly: true, secure: config().secureCookies, sameSite: 'lax', maxAge: 60 } };
}
