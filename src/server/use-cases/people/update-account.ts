import type { AccountInput } from '#contracts/people.ts';
import type { Context } from '#server/context.ts';
import { signedIn } from '#server/errors.ts';
import { User } from '#server/models/index.ts';

/** Changes how the person who asks is called, and in which units, light and time she works. */
export async function updateAccount(ctx: Context, { name, units, scheme, timeZone }: AccountInput): Promise<void> {
  const actor = signedIn(ctx);
  await User.update({ name, units, scheme, timeZone }, { where: { id: actor.userId } });
}
