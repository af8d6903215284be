import type { WordsInput } from '#contracts/questions.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize } from '#server/errors.ts';
import type { Question } from '#server/models/index.ts';
import { mayPutBackWords } from '#server/policies/question.ts';
import { wordsInHand } from './_words-in-hand.ts';
import { changeRow } from './_words-row.ts';

/**
 * Puts back what one took out oneself.
 * @throws NOT_FOUND for what somebody else took out, or what stands.
 */
export async function putBackWords(ctx: Context, input: WordsInput): Promise<Question> {
  return withTransaction(async () => {
    const { row, question, facts } = await wordsInHand(ctx, input);
    authorize(mayPutBackWords(ctx.actor, facts));
    await changeRow(row, { takenOutAt: null, takenOutById: null });
    if (facts.kind === 'answer' && question.answeredAt === null) await question.update({ answeredAt: row.createdAt });
    return question;
  });
}
