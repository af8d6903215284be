import type { ProveInput } from '#contracts/people.ts';
import { passwordFits } from '#server/auth/passwords.ts';
import { beginSession, endSession, lifetimeOf, type Begun } from '#server/auth/sessions.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { fieldError, found, signedIn } from '#server/errors.ts';
import { User } from '#server/models/index.ts';
import { countUse, forgetUses, RATE_RULES } from '#server/web/rate-limit.ts';

/**
 * The person who asks types her password again. Her session is replaced by a new one that was just proved.
 * @throws VALIDATION at `password`; RATE_LIMITED.
 */
export async function proveSelf(ctx: Context, { password }: Omit<ProveInput, 'to'>, agent: string): Promise<Begun> {
  const actor = signedIn(ctx);
  await countUse(RATE_RULES.prove, String(actor.userId));
  const user = found(await User.findByPk(actor.userId));
  if (!(await passwordFits(password, user.passwordHash))) throw fieldError('password', 'This is not your password. Try again.');
  await forgetUses(RATE_RULES.prove, String(actor.userId));
  return withTransaction(async () => {
    await endSession(actor.sessionId);
    return beginSession(user.id, await lifetimeOf(user), agent, ctx.clock.now());
  });
}
