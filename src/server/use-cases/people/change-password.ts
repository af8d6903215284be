import type { ChangePasswordInput } from '#contracts/people.ts';
import { mustBeGoodPassword } from '#server/auth/new-passwords.ts';
import { hashPassword, passwordFits } from '#server/auth/passwords.ts';
import { beginSession, endAllSessions, lifetimeOf, type Begun } from '#server/auth/sessions.ts';
import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { fieldError, found, signedIn } from '#server/errors.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { EmailToken, User } from '#server/models/index.ts';
import { countUse, forgetUses, RATE_RULES } from '#server/web/rate-limit.ts';

/**
 * Changes the password of the person who asks, who types the old one. Every browser is signed out; hers gets the new
 * session that is returned. Links for a new password stop working, and she is told by mail.
 * @throws VALIDATION at `oldPassword` or `password`; RATE_LIMITED.
 */
export async function changePassword(ctx: Context, { oldPassword, password }: ChangePasswordInput, agent: string): Promise<Begun> {
  const actor = signedIn(ctx);
  await countUse(RATE_RULES.prove, String(actor.userId));
  const user = found(await User.findByPk(actor.userId));
  if (!(await passwordFits(oldPassword, user.passwordHash))) throw fieldError('oldPassword', 'This is not your password. Try again, or have a link sent.');
  await forgetUses(RATE_RULES.prove, String(actor.userId));
  if (password.normalize('NFKC') === oldPassword.normalize('NFKC')) throw fieldError('password', 'This is the password you have. Choose another.');
  mustBeGoodPassword(password, user);
  const passwordHash = await hashPassword(password);
  return withTransaction(async () => {
    await user.update({ passwordHash });
    await endAllSessions(user.id);
    await EmailToken.destroy({ where: { userId: user.id, purpose: 'new-password' } });
    await postLetter({ template: 'password-changed', data: {}, to: { userId: user.id, name: user.name, address: user.email }, dedupeKey: `password-changed:${newPublicId()}` });
    return beginSession(user.id, await lifetimeOf(user), agent, ctx.clock.now());
  });
}
