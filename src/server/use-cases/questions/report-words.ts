import type { ReportInput } from '#contracts/questions.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, signedIn } from '#server/errors.ts';
import { WordReport, type Question } from '#server/models/index.ts';
import { mayReportWords } from '#server/policies/question.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';
import { wordsInHand } from './_words-in-hand.ts';

/**
 * Tells the steward that words should not stand there. A second report of the same words by the same person says only
 * more: it takes the place of the first.
 * @throws NOT_FOUND for what she may not see, or her own; RATE_LIMITED.
 */
export async function reportWords(ctx: Context, input: ReportInput): Promise<Question> {
  const actor = signedIn(ctx);
  await countUse(RATE_RULES.report, actor.publicId);
  return withTransaction(async () => {
    const { row, question, facts } = await wordsInHand(ctx, input);
    authorize(mayReportWords(actor, facts));
    const about = facts.kind === 'question' ? { questionId: row.id } : { answerId: row.id };
    const before = await WordReport.findOne({ where: { ...about, reporterId: actor.userId } });
    if (before === null) await WordReport.create({ ...about, reporterId: actor.userId, why: input.why });
    else await before.update({ why: input.why, settledAt: null, settledById: null });
    await audit(ctx, `report-${facts.kind}`, { kind: facts.kind, id: row.publicId });
    return question;
  });
}
