import type { WordsInput } from '#contracts/questions.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, signedIn } from '#server/errors.ts';
import type { Question } from '#server/models/index.ts';
import { mayTakeOutWords } from '#server/policies/question.ts';
import { wordsInHand } from './_words-in-hand.ts';
import { takeOutRow } from './_words-row.ts';

/**
 * Takes out a question or an answer: it is seen no longer, and whoever took it out can put it back for thirty days. A
 * question whose last answer is taken out waits again.
 * @throws NOT_FOUND for what is not hers to take out.
 */
export async function takeOutWords(ctx: Context, input: WordsInput): Promise<Question> {
  const actor = signedIn(ctx);
  return withTransaction(async () => {
    const { row, question, facts } = await wordsInHand(ctx, input);
    authorize(mayTakeOutWords(actor, facts));
    await takeOutRow(row, question, actor.userId, ctx.clock.now());
    if (actor.userId !== facts.authorId) await audit(ctx, `take-out-${facts.kind}`, { kind: facts.kind, id: row.publicId });
    return question;
  });
}
