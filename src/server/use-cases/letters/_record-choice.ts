import { LETTER_WORDING, type LetterKind } from '#core/notices/letter-kinds.ts';
import { LetterChoice, User } from '#server/models/index.ts';
import { wantsLetters } from '#server/queries/letters/letter-choices.ts';
import { found } from '#server/errors.ts';

export interface Chosen {
  readonly userId: number;
  readonly workroomId: number;
  readonly kind: LetterKind;
  readonly isWanted: boolean;
  readonly source: LetterChoice['source'];
}

/** Puts a choice on record, unless it is the one that holds already. Must run in a transaction; her own row is the lock. */
export async function recordChoice({ isWanted, ...of }: Chosen, now: Date): Promise<void> {
  found(await User.findByPk(of.userId, { lock: true, attributes: ['id'] }));
  if ((await wantsLetters(of.userId, of.workroomId, of.kind)) === isWanted) return;
  await LetterChoice.create({ ...of, isWanted, wording: LETTER_WORDING, createdAt: now });
}
