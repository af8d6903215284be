import { parseMailAddress } from '#core/mail-address.ts';
import type { SignInInput } from '#contracts/people.ts';
import { hashPassword, needsRehash, passwordFits } from '#server/auth/passwords.ts';
import { beginSession, endSession, type Begun } from '#server/auth/sessions.ts';
import type { Context } from '#server/context.ts';
import { fieldError } from '#server/errors.ts';
import { User, Workroom, WorkroomHelper } from '#server/models/index.ts';
import { countUse, networkOf, RATE_RULES } from '#server/web/rate-limit.ts';

/**
 * Signs a person in and returns the new session. Whether the address or the password was wrong is never told, nor by
 * the time it takes. A session that the browser had before ends.
 * @throws VALIDATION at `password`; RATE_LIMITED.
 */
export async function signIn(ctx: Context, input: SignInInput, device: string): Promise<Begun> {
  const address = parseMailAddress(input.email);
  const key = address.ok ? address.value.key : null;
  await countUse(RATE_RULES.signInByAddress, networkOf(ctx.ip));
  await countUse(RATE_RULES.signInByAccount, `${key ?? input.email} ${networkOf(ctx.ip)}`);
  const user = key === null ? null : await User.findOne({ where: { emailKey: key } });
  const fits = await passwordFits(input.password, user?.passwordHash ?? null);
  if (user === null || !fits || user.suspendedAt !== null) {
    throw fieldError('password', 'Address and password do not belong together. Try again, or have a link sent.');
  }
  if (user.passwordHash !== null && needsRehash(user.passwordHash)) await user.update({ passwordHash: await hashPassword(input.password) });
  if (ctx.actor !== null) await endSession(ctx.actor.sessionId);
  return beginSession(user.id, (await isTrusted(user)) ? 'trusted' : 'student', device, ctx.clock.now());
}

/** Whether the account opens other people's things: teachers, helpers, stewards. */
async function isTrusted(user: User): Promise<boolean> {
  if (user.isSteward) return true;
  return (await Workroom.count({ where: { ownerId: user.id } })) + (await WorkroomHelper.count({ where: { userId: user.id } })) > 0;
}
