/**
 * Passwords: argon2id over a peppered digest. The pepper (from the settings, not from the database) makes a stolen
 * table useless by itself. Source of the numbers: OWASP Password Storage Cheat Sheet, argon2id m=19 MiB, t=2, p=1.
 */
import { createHmac } from 'node:crypto';
import { hash, verify } from '@node-rs/argon2';
import { config } from '#server/config.ts';
import { AppError } from '#server/errors.ts';

const PARAMETERS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;
const AT_ONCE = 4;
const WAITING = 64;

let running = 0;
const waiting: (() => void)[] = [];

/** Hashing is heavy on purpose; a flood of sign-ins must not take the machine with it. */
async function inTurn<T>(work: () => Promise<T>): Promise<T> {
  if (running >= AT_ONCE) {
    if (waiting.length >= WAITING) throw new AppError('UNAVAILABLE', { retryAfterSeconds: 5 });
    await new Promise<void>((resolve) => { waiting.push(resolve); });
  }
  running += 1;
  try {
    return await work();
  } finally {
    running -= 1;
    waiting.shift()?.();
  }
}

function peppered(password: string): string {
  return createHmac('sha256', config().secret).update(password.normalize('NFKC')).digest('base64');
}

export function hashPassword(password: string): Promise<string> {
  return inTurn(() => hash(peppered(password), PARAMETERS));
}

/** Verified against when there is no such person, so that both answers take the same time. */
let dummy: Promise<string> | undefined;

/** Whether `password` belongs to `stored`; takes as long when `stored` is null. */
export async function passwordFits(password: string, stored: string | null): Promise<boolean> {
  dummy ??= hashPassword('nobody has this password');
  const against = stored ?? (await dummy);
  const fits = await inTurn(() => verify(against, peppered(password)));
  return fits && stored !== null;
}

/** True when `stored` was made with other parameters than today's. */
export function needsRehash(stored: string): boolean {
  return !stored.includes(`m=${PARAMETERS.memoryCost},t=${PARAMETERS.timeCost},p=${PARAMETERS.parallelism}`);
}
