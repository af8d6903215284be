/**
 * The password typed once more before something that must not be done from a browser left open. This is where a second
 * factor is asked for too, once there is one.
 */
import type { Actor, Context } from '#server/context.ts';
import { AppError } from '#server/errors.ts';

/** How old the proof may be when something is done by it. */
export const PROOF_MINUTES = 10;
/** How old when a form that needs it is shown: so that there is time to fill it in, and nothing typed is lost. */
export const PROOF_MINUTES_FOR_FORM = 5;

/** Whether the password was typed in the session of `actor` within `maxAgeMinutes`. */
export function isProved(actor: Actor, now: Date, maxAgeMinutes: number): boolean {
  return now.getTime() - actor.provedAt.getTime() <= maxAgeMinutes * 60_000;
}

/**
 * The person who asks, if she typed her password in this session within `maxAgeMinutes`.
 * @throws UNAUTHENTICATED for a visitor; PROOF_NEEDED, which sends her to /prove and back.
 */
export function requireProof(ctx: Context, maxAgeMinutes: number = PROOF_MINUTES): Actor {
  if (ctx.actor === null) throw new AppError('UNAUTHENTICATED');
  if (!isProved(ctx.actor, ctx.clock.now(), maxAgeMinutes)) throw new AppError('PROOF_NEEDED');
  return ctx.actor;
}
