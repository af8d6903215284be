/**
 * What slows down guessing at passwords without locking anybody out. Tries are counted before the password is looked at
 * and taken back when it fits, so that many at once find no gap. Accounts that do not exist are braked alike.
 */
import { AppError } from '#server/errors.ts';
import { countUse, forgetUses, networkOf, noteUse, RATE_RULES, takeBackUse, type Use } from '#server/web/rate-limit.ts';

const LONGEST_WAIT_SECONDS = 30;

export interface SignInTry {
  /** The key of the address as typed. */
  readonly account: string;
  readonly ip: string;
  /** The mark of a browser in which the owner signed in before; null for any other. */
  readonly knownMark: string | null;
}

const placeOf = ({ account, ip, knownMark }: SignInTry): string => `${account} ${knownMark ?? networkOf(ip)}`;

function wait(seconds: number): AppError {
  return new AppError('RATE_LIMITED', { says: `Some tries did not fit. Wait ${seconds === 1 ? '1 second' : `${seconds} seconds`}, then try again.`, retryAfterSeconds: seconds });
}

/** @throws RATE_LIMITED when this try comes too soon. */
export async function brakeSignIn(attempt: SignInTry): Promise<void> {
  // A browser its owner used before is spared what others' guesses set off.
  if (attempt.knownMark === null) {
    await countUse(RATE_RULES.signInByNetwork, networkOf(attempt.ip));
    const row = await noteUse(RATE_RULES.signInInARow, attempt.account);
    if (!row.within) throw new AppError('RATE_LIMITED', { says: 'There were many tries with this address. Have a link sent to it, or sign in with a browser you signed in with before.' });
  }
  const place = placeOf(attempt);
  const tries = await noteUse(RATE_RULES.signInByAccount, place);
  if (!tries.within) await mustHaveWaited(tries, place);
}

/** Beyond the free tries each further one is let through only when 2, 4, 8 … 30 seconds have gone by since the last. */
async function mustHaveWaited(tries: Use, place: string): Promise<void> {
  const seconds = Math.min(LONGEST_WAIT_SECONDS, 2 ** (tries.count - RATE_RULES.signInByAccount.limit));
  const use = await noteUse({ name: 'sign-in-wait', limit: 1, windowSeconds: seconds }, place);
  if (!use.within) throw wait(use.retryAfterSeconds);
}

/** The password fitted: its tries are forgotten. */
export async function releaseSignIn(attempt: SignInTry): Promise<void> {
  if (attempt.knownMark === null) await takeBackUse(RATE_RULES.signInByNetwork, networkOf(attempt.ip));
  await releaseAccount(attempt.account);
  await forgetUses(RATE_RULES.signInByAccount, placeOf(attempt));
}

/** The owner of the address showed herself by mail: tries in a row count from nought. */
export async function releaseAccount(account: string): Promise<void> {
  await forgetUses(RATE_RULES.signInInARow, account);
}
