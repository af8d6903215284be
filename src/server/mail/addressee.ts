/** Whether a letter may still go to whom it was written for: asked at the last moment, since minds and mailboxes change. */
import { RefusedAddress, User, type Mail } from '#server/models/index.ts';
import { wantsLetters } from '#server/queries/letters/letter-choices.ts';

/** Letters somebody waits for at the door. They are tried even where others were refused: one that arrives ends that. */
const AT_THE_DOOR: ReadonlySet<string> = new Set(['account-exists', 'confirm-address', 'new-password', 'password-changed']);

const keyOf = (address: string): string => address.toLowerCase();

/** Why this letter is not sent after all, for the steward; null when it may go. */
export async function whyNotSent({ template, toAddress, userId, listKind, listWorkroomId }: Mail): Promise<string | null> {
  if (listKind !== null && listWorkroomId !== null) {
    const person = userId === null ? null : await User.findByPk(userId);
    if (person === null || person.suspendedAt !== null) return 'the account is closed or suspended';
    if (!(await wantsLetters(person.id, listWorkroomId, listKind))) return 'these letters were left';
  }
  if (AT_THE_DOOR.has(template)) return null;
  return (await RefusedAddress.findByPk(keyOf(toAddress))) === null ? null : 'the address takes no letters';
}

/** The mail server said that there is no such mailbox: asking it again and again would be rude. */
export async function noteRefusal(address: string, reply: string): Promise<void> {
  await RefusedAddress.upsert({ addressKey: keyOf(address), reply: reply.slice(0, 500) });
}

export async function noteArrival({ template, toAddress }: Mail): Promise<void> {
  if (AT_THE_DOOR.has(template)) await RefusedAddress.destroy({ where: { addressKey: keyOf(toAddress) } });
}
