import { issueToken } from '#server/auth/email-tokens.ts';
import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { User } from '#server/models/index.ts';

/** Writes the letter with the link for a new password; nothing when nobody, or a suspended person, has this address. */
export async function writePasswordLink(ctx: Context, { addressKey }: { readonly addressKey: string }): Promise<void> {
  await withTransaction(async () => {
    const user = await User.findOne({ where: { emailKey: addressKey }, lock: true });
    if (user === null || user.suspendedAt !== null) return;
    const { token, expiresAt } = await issueToken(user, 'new-password', ctx.clock.now());
    await postLetter({
      template: 'new-password',
      data: { token },
      to: { userId: user.id, name: user.name, address: user.email },
      dedupeKey: `new-password:${newPublicId()}`,
      expiresAt,
    });
  });
}
