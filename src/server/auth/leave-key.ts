/**
 * The key in the link by which a person leaves one kind of letters of one workroom, from the letter itself and without
 * signing in (RFC 8058 §3.2). It does nothing else, and works for as long as the letter lies in her mailbox.
 */
import { LIST_KINDS, type ListKind } from '#core/notices/letter-kinds.ts';
import { isSame, seal } from '#server/auth/seal.ts';

export interface LeaveOf {
  /** Public ids. */
  readonly person: string;
  readonly workroom: string;
  readonly kind: ListKind;
}

export function leaveKey({ person, workroom, kind }: LeaveOf): string {
  const of = `${person}-${workroom}-${kind}`;
  return `${of}-${seal('leave letters', of)}`;
}

/** What a key leaves; null unless this house made it. */
export function readLeaveKey(key: string): LeaveOf | null {
  const [, person, workroom, word] = /^([0-9a-z]{26})-([0-9a-z]{26})-([a-z]{1,20})-[A-Za-z0-9_-]{43}$/.exec(key) ?? [];
  const kind = LIST_KINDS.find((one) => one === word);
  if (person === undefined || workroom === undefined || kind === undefined) return null;
  const of = { person, workroom, kind };
  return isSame(key, leaveKey(of)) ? of : null;
}
