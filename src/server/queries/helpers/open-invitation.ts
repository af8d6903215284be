import { parseMailAddress } from '#core/mail-address.ts';
import { readInvitation } from '#server/auth/invitation-token.ts';
import type { Actor } from '#server/context.ts';
import { User, Workroom } from '#server/models/index.ts';

export interface InvitationShown {
  readonly teacherName: string;
  readonly workroomName: string;
  readonly address: string;
  /** Whether the account of who looks has the invited address. */
  readonly isForActor: boolean;
}

/** What an invitation's page tells, or null when the link works no more. Looking does not use it: programs that check mail follow links too. */
export async function openInvitation(token: string, actor: Actor | null, now: Date): Promise<InvitationShown | null> {
  const invitation = await readInvitation(token, now);
  if (invitation === null) return null;
  const [workroom, teacher] = await Promise.all([Workroom.findByPk(invitation.workroomId), User.findByPk(invitation.invitedById)]);
  if (workroom === null || teacher === null) return null;
  const mine = actor === null ? null : parseMailAddress(actor.email);
  return { teacherName: teacher.name, workroomName: workroom.name, address: invitation.address, isForActor: mine?.ok === true && mine.value.key === invitation.addressKey };
}
