import { audit } from '#server/audit.ts';
import { isOpenInvitation } from '#server/auth/invitation-token.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { HelperInvitation, Workroom } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

/**
 * Takes an open invitation back: its link works no more from now on.
 * @returns the address it went to.
 * @throws NOT_FOUND for another workroom's; CONFLICT when it was accepted or has ended in the meantime.
 */
export async function takeBackInvitation(ctx: Context, { invitation: publicId }: { readonly invitation: string }): Promise<string> {
  return withTransaction(async () => {
    const invitation = found(await HelperInvitation.findOne({ where: { publicId }, lock: true }));
    authorize(mayTeachIn(ctx.actor, invitation.workroomId));
    if (!isOpenInvitation(invitation, ctx.clock.now())) throw new AppError('CONFLICT', { says: 'This invitation was accepted, taken back or ran out in the meantime.' });
    const workroom = found(await Workroom.findByPk(invitation.workroomId));
    await invitation.update({ takenBackAt: ctx.clock.now() });
    await audit(ctx, 'take-back-invitation', { kind: 'workroom', id: workroom.publicId }, { invitation: publicId });
    return invitation.address;
  });
}
