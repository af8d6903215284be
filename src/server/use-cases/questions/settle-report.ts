import type { SettleReportInput } from '#contracts/questions.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found, signedIn } from '#server/errors.ts';
import { Question, QuestionAnswer, WordReport } from '#server/models/index.ts';
import { maySeeOffice } from '#server/policies/workroom.ts';
import { takeOutRow } from './_words-row.ts';

/**
 * The steward's word on a report: the words go, or they stand. All reports of the same words are settled by it.
 * @throws NOT_FOUND unless the steward asks; CONFLICT when it was settled in the meantime.
 */
export async function settleReport(ctx: Context, input: SettleReportInput): Promise<void> {
  authorize(maySeeOffice(ctx.actor));
  const actor = signedIn(ctx);
  await withTransaction(async () => {
    const report = found(await WordReport.findOne({ where: { publicId: input.report }, lock: true }));
    if (report.settledAt !== null) throw new AppError('CONFLICT', { says: 'This report was settled in the meantime.' });
    const { questionId, answerId } = report;
    const answer = answerId === null ? null : found(await QuestionAnswer.findByPk(answerId));
    const question = found(await Question.findByPk(answer?.questionId ?? questionId ?? 0, { lock: true }));
    const row = answer ?? question;
    const now = ctx.clock.now();
    if (input.words === 'take-out' && row.takenOutAt === null) await takeOutRow(row, question, actor.userId, now);
    await WordReport.update({ settledAt: now, settledById: actor.userId }, { where: { questionId, answerId, settledAt: null } });
    const kind = answer === null ? 'question' : 'answer';
    await audit(ctx, input.words === 'take-out' ? `take-out-${kind}` : `let-${kind}-stand`, { kind, id: row.publicId });
  });
}
