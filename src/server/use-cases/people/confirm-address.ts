import { readToken, spendToken } from '#server/auth/email-tokens.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError } from '#server/errors.ts';
import { User } from '#server/models/index.ts';
import { countUse, networkOf, RATE_RULES } from '#server/web/rate-limit.ts';

const ended = (): AppError => new AppError('GONE', { says: 'This link was used already, or it is older than a day. Sign in and have a new one sent from your account.' });

/**
 * Confirms the address a link was sent to, as long as it is still that person's.
 * @returns the address.
 * @throws GONE when the link is unknown, used, too old or of another address; RATE_LIMITED.
 */
export async function confirmAddress(ctx: Context, { token }: { readonly token: string }): Promise<string> {
  await countUse(RATE_RULES.spendLink, networkOf(ctx.ip));
  const now = ctx.clock.now();
  return withTransaction(async () => {
    const row = await readToken(token, 'confirm-address', now);
    if (row === null || !(await spendToken(row))) throw ended();
    const [confirmed] = await User.update({ emailConfirmedAt: now }, { where: { id: row.userId, email: row.address } });
    if (confirmed !== 1) throw ended();
    return row.address;
  });
}
