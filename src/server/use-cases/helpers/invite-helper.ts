import { Op } from 'sequelize';
import type { InviteHelperInput } from '#contracts/helpers.ts';
import { audit } from '#server/audit.ts';
import { invitationEnds } from '#server/auth/invitation-token.ts';
import { hashToken, newToken } from '#server/auth/sessions.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, fieldError, found, signedIn } from '#server/errors.ts';
import { postLetter } from '#server/mail/outbox.ts';
import { HelperInvitation, User, Workroom, WorkroomHelper } from '#server/models/index.ts';
import { mayPost } from '#server/policies/person.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';
import { countUse, noteUse, RATE_RULES } from '#server/web/rate-limit.ts';

/** Open invitations and helpers of one workroom together. */
const MOST_HELPERS = 20;

/**
 * Asks somebody by mail to help in the workroom of the person who asks. A second letter to the same address takes the
 * place of the first, whose link then works no more.
 * @returns the address.
 * @throws NOT_FOUND for who teaches nowhere; VALIDATION at `email`: her own, or of somebody who helps already; CONFLICT; RATE_LIMITED.
 */
export async function inviteHelper(ctx: Context, { email: { address, key } }: InviteHelperInput): Promise<string> {
  const actor = signedIn(ctx);
  const { workroomId } = actor;
  authorize(workroomId !== null && mayTeachIn(actor, workroomId));
  if (!mayPost(actor)) throw new AppError('VALIDATION', { says: 'Confirm your own address first. The link is in your mail.' });
  await countUse(RATE_RULES.invitation, actor.publicId);
  // Whoever gets them did not ask for them.
  const use = await noteUse(RATE_RULES.letterToAddress, `invitation ${key}`);
  if (!use.within) throw new AppError('RATE_LIMITED', { says: `Five invitations went to ${address} within an hour. Wait, then try again.`, retryAfterSeconds: use.retryAfterSeconds });
  const now = ctx.clock.now();
  return withTransaction(async () => {
    const workroom = found(await Workroom.findByPk(workroomId, { lock: true }));
    const person = await User.findOne({ where: { emailKey: key } });
    if (person?.id === workroom.ownerId) throw fieldError('email', 'This is your own address. The workroom is yours already.');
    if (person !== null && (await WorkroomHelper.count({ where: { workroomId, userId: person.id } })) > 0) throw fieldError('email', `${person.name} helps you already.`);
    await HelperInvitation.update({ takenBackAt: now }, { where: { workroomId, addressKey: key, acceptedAt: null, takenBackAt: null } });
    const open = await HelperInvitation.count({ where: { workroomId, acceptedAt: null, takenBackAt: null, expiresAt: { [Op.gt]: now } } });
    if (open + (await WorkroomHelper.count({ where: { workroomId } })) >= MOST_HELPERS) throw new AppError('CONFLICT', { says: `${MOST_HELPERS} people help or are invited. Take one back first.` });
    const token = newToken();
    const expiresAt = invitationEnds(now);
    const invitation = await HelperInvitation.create({ workroomId, invitedById: actor.userId, address, addressKey: key, tokenHash: hashToken(token), expiresAt, createdAt: now });
    await postLetter({
      template: 'helper-invited',
      data: { token, teacherName: actor.name, workroomName: workroom.name },
      // Named by nothing but its address: who reads it may have no account.
      to: { userId: null, name: address, address },
      dedupeKey: `helper-invited:${invitation.publicId}`,
      expiresAt,
    });
    await audit(ctx, 'invite-helper', { kind: 'workroom', id: workroom.publicId }, { invitation: invitation.publicId });
    return address;
  });
}
