import { Op } from 'sequelize';
import type { Context } from '#server/context.ts';
import { signedIn } from '#server/errors.ts';
import { Session } from '#server/models/index.ts';

/** Signs the person who asks out everywhere but here. Returns how many browsers that were. */
export async function endOtherSessions(ctx: Context): Promise<number> {
  const actor = signedIn(ctx);
  return Session.destroy({ where: { userId: actor.userId, id: { [Op.ne]: actor.sessionId } } });
}
