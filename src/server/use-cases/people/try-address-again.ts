import type { Context } from '#server/context.ts';
import { AppError, found, signedIn } from '#server/errors.ts';
import { RefusedAddress, User } from '#server/models/index.ts';
import { noteUse, RATE_RULES } from '#server/web/rate-limit.ts';

/**
 * Has letters tried again at an address that refused them.
 * @returns false when letters go there already.
 * @throws RATE_LIMITED.
 */
export async function tryAddressAgain(ctx: Context): Promise<boolean> {
  const actor = signedIn(ctx);
  const { emailKey } = found(await User.findByPk(actor.userId));
  const use = await noteUse(RATE_RULES.letterToAddress, `again ${actor.userId}`);
  if (!use.within) throw new AppError('RATE_LIMITED', { says: 'That was tried five times within an hour. Look whether the mailbox is full or has ended, then try again later.', retryAfterSeconds: use.retryAfterSeconds });
  return (await RefusedAddress.destroy({ where: { addressKey: emailKey } })) > 0;
}
