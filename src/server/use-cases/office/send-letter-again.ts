import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { Mail } from '#server/models/index.ts';
import { maySeeOffice } from '#server/policies/workroom.ts';

/**
 * Puts a letter that was given up back into the post, with all its tries before it.
 * @returns to whom it goes.
 * @throws NOT_FOUND unless the steward asks; CONFLICT when it was not given up, or would be of no use any more.
 */
export async function sendLetterAgain(ctx: Context, { mail: id }: { readonly mail: number }): Promise<string> {
  authorize(maySeeOffice(ctx.actor));
  return withTransaction(async () => {
    const mail = found(await Mail.findByPk(id, { lock: true }));
    if (mail.state !== 'dead') throw new AppError('CONFLICT', { says: 'This letter was not given up: it is sent, or waits to be.' });
    const now = ctx.clock.now();
    if (mail.expiresAt !== null && mail.expiresAt <= now) throw new AppError('CONFLICT', { says: `The link in this letter has ended. ${mail.toName} can ask for a new one.` });
    await mail.update({ state: 'ready', attempts: 0, runAt: now, lastError: null });
    await audit(ctx, 'send-letter-again', { kind: 'letter', id: String(id) });
    return mail.toName;
  });
}
