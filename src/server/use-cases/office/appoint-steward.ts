import type { MailAddress } from '#core/mail-address.ts';
import { audit } from '#server/audit.ts';
import { issueToken } from '#server/auth/email-tokens.ts';
import { endAllSessions } from '#server/auth/sessions.ts';
import type { Context } from '#server/context.ts';
import { newPublicId } from '#server/db/public-id.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { User } from '#server/models/index.ts';

/**
 * Makes somebody a steward, with an account of her own if she has none, and sends her a link to choose a password long
 * enough for one. Called by whoever runs the house, at its machine; no page leads here. Her browsers are signed out, and
 * the password she had works no longer.
 */
export async function appointSteward(ctx: Context, { email, name }: { readonly email: MailAddress; readonly name: string }): Promise<void> {
  await withTransaction(async () => {
    const known = await User.findOne({ where: { emailKey: email.key }, lock: true });
    const steward = known ?? (await User.create({ email: email.address, emailKey: email.key, name }));
    await steward.update({ isSteward: true, passwordHash: null, suspendedAt: null });
    await endAllSessions(steward.id);
    const { token, expiresAt } = await issueToken(steward, 'new-password', ctx.clock.now());
    await postLetter({
      template: 'new-password',
      data: { token },
      to: { userId: steward.id, name: steward.name, address: steward.email },
      dedupeKey: `new-password:${newPublicId()}`,
      expiresAt,
    });
    await audit(ctx, 'appoint-steward', { kind: 'person', id: steward.publicId });
  });
}
