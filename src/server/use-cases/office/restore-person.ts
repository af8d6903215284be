import { audit } from '#server/audit.ts';
import { requireProof } from '#server/auth/step-up.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { User } from '#server/models/index.ts';
import { maySeeOffice } from '#server/policies/workroom.ts';

/**
 * Lets a suspended person sign in again.
 * @returns her name.
 * @throws NOT_FOUND unless the steward asks; PROOF_NEEDED.
 */
export async function restorePerson(ctx: Context, { person: publicId }: { readonly person: string }): Promise<string> {
  authorize(maySeeOffice(ctx.actor));
  requireProof(ctx);
  return withTransaction(async () => {
    const person = found(await User.findOne({ where: { publicId }, lock: true }));
    if (person.suspendedAt === null) return person.name;
    await person.update({ suspendedAt: null });
    await audit(ctx, 'restore-person', { kind: 'person', id: publicId });
    return person.name;
  });
}
