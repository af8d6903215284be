/** Who is asking, and the beginning and end of being signed in. */
import { createHash, randomBytes } from 'node:crypto';
import { KNOWN_DEVICE_DAYS } from '#server/auth/known-device.ts';
import { lucia } from '#server/auth/lucia.ts';
import { config } from '#server/config.ts';
import type { Actor } from '#server/context.ts';
import { Workroom, WorkroomHelper } from '#server/models/index.ts';

const TOKEN = /^[A-Za-z0-9_-]{43}$/;
const HOUR = 3_600;
const DAY = 86_400;

/** How long a session lives: unused, and at all. People whose account opens other people's things get the short one. */
export const LIFETIMES = {
  student: { idleSeconds: 14 * DAY, wholeSeconds: 30 * DAY },
  trusted: { idleSeconds: HOUR, wholeSeconds: 12 * HOUR },
} as const;

export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

/** 32 random bytes, base64url. */
export function newToken(): string {
  return randomBytes(32).toString('base64url');
}

/** The cookie's name and attributes. `__Host-` and Secure wherever the site is reached by https. */
export function sessionCookie(): { name: string; options: { path: '/'; httpOnly: true; secure: boolean; sameSite: 'lax' } } {
  const secure = config().secureCookies;
  return { name: secure ? '__Host-s' : 's', options: { path: '/', httpOnly: true, secure, sameSite: 'lax' } };
}

/** The cookie that holds the mark of a known browser. */
export function knownDeviceCookie(): { name: string; options: { path: '/'; httpOnly: true; secure: boolean; sameSite: 'lax'; maxAge: number } } {
  const { name, options } = sessionCookie();
  return { name: name.replace(/s$/, 'known'), options: { ...options, maxAge: KNOWN_DEVICE_DAYS * DAY } };
}

export interface Begun {
  readonly token: string;
  readonly endsAt: Date;
}

/** Which lifetime a person's sessions have: teachers, helpers and stewards open other people's things. */
export async function lifetimeOf({ id, isSteward }: { readonly id: number; readonly isSteward: boolean }): Promise<keyof typeof LIFETIMES> {
  if (isSteward) return 'trusted';
  const roles = (await Workroom.count({ where: { ownerId: id } })) + (await WorkroomHelper.count({ where: { userId: id } }));
  return roles > 0 ? 'trusted' : 'student';
}

/** Starts a session for a person whose password was proved at `provedAt`, mostly just now. */
export async function beginSession(userId: number, kind: keyof typeof LIFETIMES, device: string, now: Date, provedAt = now): Promise<Begun> {
  const token = newToken();
  const { idleSeconds, wholeSeconds } = LIFETIMES[kind];
  const endsAt = new Date(now.getTime() + wholeSeconds * 1_000);
  await lucia.createSession(userId, { endsAt, idleSeconds, provedAt, device: device.slice(0, 160) }, { sessionId: hashToken(token) });
  return { token, endsAt };
}

/** The person behind a cookie's token, or null. */
export async function actorOfToken(token: string | undefined): Promise<Actor | null> {
  if (token === undefined || !TOKEN.test(token)) return null;
  const { session, user } = await lucia.validateSession(hashToken(token));
  if (session === null) return null;
  const { id, ...person } = user;
  return { userId: id, ...person, sessionId: session.id, provedAt: session.provedAt };
}

export async function endSession(sessionId: string): Promise<void> {
  await lucia.invalidateSession(sessionId);
}

export async function endAllSessions(userId: number): Promise<void> {
  await lucia.invalidateUserSessions(userId);
}
