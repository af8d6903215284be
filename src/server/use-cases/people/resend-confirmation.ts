import { issueToken } from '#server/auth/email-tokens.ts';
import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found, signedIn } from '#server/errors.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { User } from '#server/models/index.ts';
import { noteUse, RATE_RULES } from '#server/web/rate-limit.ts';

/**
 * Sends the link that confirms the address of the person who asks once more; the older one stops working.
 * @returns the address, or null when it is confirmed already.
 * @throws RATE_LIMITED.
 */
export async function resendConfirmation(ctx: Context): Promise<string | null> {
  const actor = signedIn(ctx);
  if (actor.addressConfirmed) return null;
  const use = await noteUse(RATE_RULES.letterToAddress, `confirm ${actor.userId}`);
  if (!use.within) {
    throw new AppError('RATE_LIMITED', { says: `Five letters went to ${actor.email} within an hour. Look among unwanted mail, or try again later.`, retryAfterSeconds: use.retryAfterSeconds });
  }
  return withTransaction(async () => {
    const user = found(await User.findByPk(actor.userId, { lock: true }));
    const { token, expiresAt } = await issueToken(user, 'confirm-address', ctx.clock.now());
    await postLetter({
      template: 'confirm-address',
      data: { token },
      to: { userId: user.id, name: user.name, address: user.email },
      dedupeKey: `confirm-address:${newPublicId()}`,
      expiresAt,
    });
    return user.email;
  });
}
