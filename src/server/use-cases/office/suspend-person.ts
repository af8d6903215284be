import type { SuspendInput } from '#contracts/office.ts';
import { audit } from '#server/audit.ts';
import { endAllSessions } from '#server/auth/sessions.ts';
import { requireProof } from '#server/auth/step-up.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { EmailToken, User } from '#server/models/index.ts';
import { maySeeOffice } from '#server/policies/workroom.ts';

/**
 * Shuts a person out: her browsers are signed out at once, links sent to her stop working, and she cannot sign in.
 * What she made and bought stays as it is.
 * @returns her name.
 * @throws NOT_FOUND unless the steward asks; PROOF_NEEDED; CONFLICT for a steward, herself included.
 */
export async function suspendPerson(ctx: Context, { person: publicId, reason }: SuspendInput): Promise<string> {
  authorize(maySeeOffice(ctx.actor));
  requireProof(ctx);
  return withTransaction(async () => {
    const person = found(await User.findOne({ where: { publicId }, lock: true }));
    if (person.isSteward) throw new AppError('CONFLICT', { says: 'A steward cannot be suspended, so that the office always has one.' });
    if (person.suspendedAt !== null) return person.name;
    await person.update({ suspendedAt: ctx.clock.now() });
    await endAllSessions(person.id);
    await EmailToken.destroy({ where: { userId: person.id } });
    await audit(ctx, 'suspend-person', { kind: 'person', id: publicId }, { reason });
    return person.name;
  });
}
