import type { ListKind } from '#core/notices/letter-kinds.ts';
import { readLeaveKey } from '#server/auth/leave-key.ts';
import { User, Workroom } from '#server/models/index.ts';
import { wantsLetters } from './letter-choices.ts';

export interface ListOfKey {
  readonly kind: ListKind;
  readonly workroom: string;
  /** False once she has left. */
  readonly isWanted: boolean;
}

/** What the link in a letter would leave; null for a key this house did not make. It tells nothing of whose it is. */
export async function listOfKey(key: string): Promise<ListOfKey | null> {
  const of = readLeaveKey(key);
  if (of === null) return null;
  const [user, workroom] = await Promise.all([User.findOne({ where: { publicId: of.person } }), Workroom.findOne({ where: { publicId: of.workroom } })]);
  if (user === null || workroom === null) return null;
  return { kind: of.kind, workroom: workroom.name, isWanted: await wantsLetters(user.id, workroom.id, of.kind) };
}
