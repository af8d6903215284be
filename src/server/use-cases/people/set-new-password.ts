import type { NewPasswordInput } from '#contracts/people.ts';
import { readToken, spendToken } from '#server/auth/email-tokens.ts';
import { mustBeGoodPassword } from '#server/auth/new-passwords.ts';
import { hashPassword } from '#server/auth/passwords.ts';
import { endAllSessions } from '#server/auth/sessions.ts';
import { releaseAccount } from '#server/auth/sign-in-brakes.ts';
import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found } from '#server/errors.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { User } from '#server/models/index.ts';
import { countUse, networkOf, RATE_RULES } from '#server/web/rate-limit.ts';

const ended = (): AppError => new AppError('GONE', { says: 'This link was used already, or it is older than 20 minutes. Have a new one sent.' });

/**
 * Gives the owner of a link a new password. Every browser is signed out, nobody is signed in, and she is told by mail.
 * The link came by mail, so it also confirms the address.
 * @throws VALIDATION at `password`, which leaves the link good; GONE; RATE_LIMITED.
 */
export async function setNewPassword(ctx: Context, { token, password }: NewPasswordInput): Promise<void> {
  await countUse(RATE_RULES.spendLink, networkOf(ctx.ip));
  const now = ctx.clock.now();
  const row = await readToken(token, 'new-password', now);
  if (row === null) throw ended();
  const owner = found(await User.findByPk(row.userId));
  mustBeGoodPassword(password, owner);
  const passwordHash = await hashPassword(password);
  await withTransaction(async () => {
    if (!(await spendToken(row))) throw ended();
    const confirms = owner.emailConfirmedAt === null && owner.email === row.address;
    await owner.update({ passwordHash, ...(confirms ? { emailConfirmedAt: now } : {}) });
    await endAllSessions(owner.id);
    await postLetter({ template: 'password-changed', data: {}, to: { userId: owner.id, name: owner.name, address: owner.email }, dedupeKey: `password-changed:${newPublicId()}` });
  });
  await releaseAccount(owner.emailKey);
}
