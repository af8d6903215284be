import type { ChangeWordsInput } from '#contracts/questions.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize } from '#server/errors.ts';
import type { Question } from '#server/models/index.ts';
import { mayChangeWords } from '#server/policies/question.ts';
import { wordsInHand } from './_words-in-hand.ts';
import { changeRow } from './_words-row.ts';

/**
 * Changes one's own question while nobody has answered it, or one's own answer.
 * @throws NOT_FOUND for what is not hers to change; CONFLICT for her own question once it is answered.
 */
export async function changeWords(ctx: Context, input: ChangeWordsInput): Promise<Question> {
  return withTransaction(async () => {
    const { row, question, facts } = await wordsInHand(ctx, input);
    if (facts.kind === 'question' && facts.isAnswered && ctx.actor?.userId === facts.authorId) {
      throw new AppError('CONFLICT', { says: 'This was answered in the meantime, so its words stay as they were. Ask again below it.' });
    }
    authorize(mayChangeWords(ctx.actor, facts));
    if (row.words !== input.words) await changeRow(row, { words: input.words, changedAt: ctx.clock.now() });
    return question;
  });
}
