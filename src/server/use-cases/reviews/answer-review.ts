import type { AnswerInput } from '#contracts/review.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { Review, Series } from '#server/models/index.ts';
import { mayTeachIn } from '#server/policies/workroom.ts';

/**
 * Puts the teacher's answer under a review of her series, or changes it; empty words take it back.
 * @returns the slug of the series.
 * @throws NOT_FOUND for another teacher's series and for a hidden review.
 */
export async function answerReview(ctx: Context, { review: publicId, words }: AnswerInput): Promise<string> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const known = found(await Review.findOne({ where: { publicId, hiddenAt: null } }));
  const series = found(await Series.findByPk(known.seriesId));
  authorize(mayTeachIn(ctx.actor, series.workroomId));
  await withTransaction(async () => {
    const review = found(await Review.findByPk(known.id, { lock: true }));
    await review.update({ answer: words, answeredAt: words === '' ? null : ctx.clock.now() });
  });
  return series.slug;
}
