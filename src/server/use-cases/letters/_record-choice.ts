import { LETTER_WORDING, type AnswerPace, type ListKind } from '#core/notices/letter-kinds.ts';
import { LetterChoice, User } from '#server/models/index.ts';
import { letterPace } from '#server/queries/letters/letter-choices.ts';
import { found } from '#server/errors.ts';

export interface Chosen {
  readonly userId: number;
  readonly workroomId: number;
  readonly kind: ListKind;
  readonly pace: AnswerPace;
  readonly source: LetterChoice['source'];
}

/**
 * Puts a choice on record, unless it is the one that holds already. Must run in a transaction; her own row is the lock.
 * @returns whether it is a new one.
 */
export async function recordChoice({ pace, ...of }: Chosen, now: Date): Promise<boolean> {
  found(await User.findByPk(of.userId, { lock: true, attributes: ['id'] }));
  if ((await letterPace(of.userId, of.workroomId, of.kind)) === pace) return false;
  await LetterChoice.create({ ...of, isWanted: pace !== 'never', isDaily: pace === 'daily', wording: LETTER_WORDING, createdAt: now });
  return true;
}
