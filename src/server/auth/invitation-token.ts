/** The link of an invitation to help: 32 random bytes in the letter, their hash in the table, good for a week and once. */
import { hashToken } from '#server/auth/sessions.ts';
import { HelperInvitation } from '#server/models/index.ts';

export const INVITATION_DAYS = 7;
const DAY_MS = 86_400_000;

export const invitationEnds = (now: Date): Date => new Date(now.getTime() + INVITATION_DAYS * DAY_MS);

export const isOpenInvitation = ({ acceptedAt, takenBackAt, expiresAt }: Pick<HelperInvitation, 'acceptedAt' | 'takenBackAt' | 'expiresAt'>, now: Date): boolean =>
  acceptedAt === null && takenBackAt === null && expiresAt > now;

/** The open invitation behind a link, without using it; null when it is unknown, used, taken back or too old. */
export async function readInvitation(token: string, now: Date, lock = false): Promise<HelperInvitation | null> {
  const row = await HelperInvitation.findOne({ where: { tokenHash: hashToken(token) }, lock });
  return row !== null && isOpenInvitation(row, now) ? row : null;
}
