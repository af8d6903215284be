import { LETTER_KINDS } from '#core/notices/letter-kinds.ts';
import type { LettersInput } from '#contracts/notices.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found, signedIn } from '#server/errors.ts';
import { Workroom } from '#server/models/index.ts';
import { letterChoicesOf } from '#server/queries/letters/letter-choices.ts';
import { recordChoice } from './_record-choice.ts';

/**
 * Keeps which letters of one workroom the person who asks wants, by which words and where she said so.
 * @throws NOT_FOUND for a workroom she has never had a seat in.
 */
export async function chooseLetters(ctx: Context, { workroom: publicId, source, wanted }: LettersInput): Promise<string> {
  const { userId } = signedIn(ctx);
  const workroom = found(await Workroom.findOne({ where: { publicId } }));
  authorize((await letterChoicesOf(userId)).some((one) => one.workroom === publicId));
  await withTransaction(async () => {
    for (const kind of LETTER_KINDS) await recordChoice({ userId, workroomId: workroom.id, kind, isWanted: wanted.includes(kind), source }, ctx.clock.now());
  });
  return workroom.name;
}
