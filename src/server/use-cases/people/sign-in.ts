import type { SignInInput } from '#contracts/people.ts';
import { isKnown, markKnown } from '#server/auth/known-device.ts';
import { hashPassword, needsRehash, passwordFits } from '#server/auth/passwords.ts';
import { brakeSignIn, releaseSignIn, type SignInTry } from '#server/auth/sign-in-brakes.ts';
import { beginSession, endSession, lifetimeOf, type Begun } from '#server/auth/sessions.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { fieldError } from '#server/errors.ts';
import { User } from '#server/models/index.ts';

export interface Browser {
  /** What it calls itself. */
  readonly agent: string;
  /** The mark it got when somebody signed in with it before. */
  readonly mark?: string | undefined;
}

export interface SignedIn extends Begun {
  /** To be kept in this browser, so that others' guessing does not slow its owner. */
  readonly mark: string;
}

/**
 * Signs a person in and returns the new session. Whether the address or the password was wrong is never told, nor by
 * the time it takes. A session that the browser had before ends.
 * @throws VALIDATION at `password`; RATE_LIMITED.
 */
export async function signIn(ctx: Context, input: Omit<SignInInput, 'stay' | 'to'>, browser: Browser): Promise<SignedIn> {
  const { key } = input.email;
  const now = ctx.clock.now();
  const attempt: SignInTry = { account: key, ip: ctx.ip, knownMark: isKnown(browser.mark, key, now) ? (browser.mark ?? null) : null };
  await brakeSignIn(attempt);
  const user = await User.findOne({ where: { emailKey: key } });
  const fits = await passwordFits(input.password, user?.passwordHash ?? null);
  if (user === null || !fits || user.suspendedAt !== null) {
    throw fieldError('password', 'Address and password do not belong together. Try again, or have a link sent.');
  }
  await releaseSignIn(attempt);
  const renewed = user.passwordHash !== null && needsRehash(user.passwordHash) ? await hashPassword(input.password) : null;
  const begun = await withTransaction(async () => {
    if (renewed !== null) await user.update({ passwordHash: renewed });
    if (ctx.actor !== null) await endSession(ctx.actor.sessionId);
    return beginSession(user.id, await lifetimeOf(user), browser.agent, now);
  });
  return { ...begun, mark: markKnown(key, now) };
}
