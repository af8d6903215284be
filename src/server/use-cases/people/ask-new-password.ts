import type { ForgottenInput } from '#contracts/people.ts';
import type { Context } from '#server/context.ts';
import { sendPasswordLink } from '#server/jobs/definitions/people.ts';
import { enqueue } from '#server/jobs/queue.ts';
import { countUse, networkOf, noteUse, RATE_RULES } from '#server/web/rate-limit.ts';

/**
 * Has a link for a new password sent to an address, if somebody has an account with it; whether is told to nobody.
 * Beyond five an hour nothing new is written, and the newest link stays good: nobody can be kept out by asking.
 * @throws RATE_LIMITED by network.
 */
export async function askNewPassword(ctx: Context, { email }: ForgottenInput): Promise<void> {
  await countUse(RATE_RULES.letterByNetwork, networkOf(ctx.ip));
  const use = await noteUse(RATE_RULES.letterToAddress, `new-password ${email.key}`);
  if (use.within) await enqueue(sendPasswordLink, { addressKey: email.key });
}
