import { audit } from '#server/audit.ts';
import { readInvitation } from '#server/auth/invitation-token.ts';
import { beginSession, endAllSessions, type Begun } from '#server/auth/sessions.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, found, signedIn } from '#server/errors.ts';
import { User, Workroom, WorkroomHelper } from '#server/models/index.ts';
import { countUse, networkOf, RATE_RULES } from '#server/web/rate-limit.ts';

export interface Accepted {
  readonly workroomName: string;
  /** What her account opens has changed, so her sessions end, and this one begins. */
  readonly session: Begun;
}

/**
 * Makes who was invited a helper, once. Only the account with the invited address can accept; as the link came to that
 * address, it counts as confirmed.
 * @throws UNAUTHENTICATED for a visitor; GONE when the link is unknown, used, taken back or too old; CONFLICT for another account; RATE_LIMITED.
 */
export async function acceptInvitation(ctx: Context, { token }: { readonly token: string }, agent: string): Promise<Accepted> {
  const actor = signedIn(ctx);
  await countUse(RATE_RULES.spendLink, networkOf(ctx.ip));
  const now = ctx.clock.now();
  return withTransaction(async () => {
    const invitation = await readInvitation(token, now, true);
    if (invitation === null) throw new AppError('GONE', { says: 'This invitation was accepted or taken back, or it is older than a week. Ask for a new one.' });
    const person = found(await User.findByPk(actor.userId, { lock: true }));
    if (person.emailKey !== invitation.addressKey) throw new AppError('CONFLICT', { says: `This invitation is for ${invitation.address}. You are signed in with ${person.email}.` });
    const workroom = found(await Workroom.findByPk(invitation.workroomId));
    await invitation.update({ acceptedAt: now, acceptedById: person.id });
    if (person.emailConfirmedAt === null) await person.update({ emailConfirmedAt: now });
    await WorkroomHelper.findOrCreate({ where: { workroomId: workroom.id, userId: person.id } });
    await audit(ctx, 'accept-invitation', { kind: 'workroom', id: workroom.publicId }, { person: person.publicId });
    await endAllSessions(person.id);
    // The password was not typed for this: what it proves stays as old as it was.
    return { workroomName: workroom.name, session: await beginSession(person.id, 'trusted', agent, now, actor.provedAt) };
  });
}
