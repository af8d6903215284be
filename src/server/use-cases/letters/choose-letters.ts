import { LETTER_KINDS } from '#core/notices/letter-kinds.ts';
import type { LettersInput } from '#contracts/notices.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found, signedIn } from '#server/errors.ts';
import { Workroom } from '#server/models/index.ts';
import { letterChoicesOf } from '#server/queries/letters/letter-choices.ts';
import { sendGatheredNow } from '#server/notices/tell-answer.ts';
import { recordChoice } from './_record-choice.ts';

/**
 * Keeps which letters of one workroom the person who asks wants, by which words and where she said so.
 * Answers that were gathered for the letter of the day go out now where she wants them at once.
 * @throws NOT_FOUND for a workroom she has never had a seat in.
 */
export async function chooseLetters(ctx: Context, { workroom: publicId, source, wanted, answers }: LettersInput): Promise<string> {
  const { userId } = signedIn(ctx);
  const workroom = found(await Workroom.findOne({ where: { publicId } }));
  authorize((await letterChoicesOf(userId)).some((one) => one.workroom === publicId));
  await withTransaction(async () => {
    const now = ctx.clock.now();
    const of = { userId, workroomId: workroom.id, source };
    for (const kind of LETTER_KINDS) await recordChoice({ ...of, kind, pace: wanted.includes(kind) ? 'at-once' : 'never' }, now);
    const isNew = await recordChoice({ ...of, kind: 'answers', pace: answers }, now);
    if (isNew && answers === 'at-once') await sendGatheredNow(userId, workroom.id, now);
  });
  return workroom.name;
}
