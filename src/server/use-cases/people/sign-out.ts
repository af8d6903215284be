import { endSession } from '#server/auth/sessions.ts';
import type { Context } from '#server/context.ts';

/** Ends the session of the browser that asks. Whoever is signed out already stays so. */
export async function signOut(ctx: Context): Promise<void> {
  if (ctx.actor !== null) await endSession(ctx.actor.sessionId);
}
