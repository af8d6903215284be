import type { Context } from '#server/context.ts';
import { AppError, signedIn } from '#server/errors.ts';
import { Session } from '#server/models/index.ts';

/**
 * Signs one browser of the person who asks out.
 * @returns true when it was the one she asks with.
 * @throws NOT_FOUND for a session that is not hers.
 */
export async function endOneSession(ctx: Context, sessionId: string): Promise<boolean> {
  const actor = signedIn(ctx);
  if ((await Session.destroy({ where: { id: sessionId, userId: actor.userId } })) === 0) throw new AppError('NOT_FOUND');
  return sessionId === actor.sessionId;
}
