import type { ReviewInput } from '#contracts/review.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found } from '#server/errors.ts';
import { Enrolment, Review } from '#server/models/index.ts';
import { mayReview } from '#server/policies/review.ts';
import { finishedBy } from '#server/queries/reviews/reviews-of.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';

/**
 * Keeps what somebody who finished a series says of it; said once more, it takes the place of what she said before. A
 * hidden review stays hidden.
 * @throws NOT_FOUND for a series that is not hers to see; FORBIDDEN without a seat, and for who works for it; CONFLICT before she finished it.
 */
export async function writeReview(ctx: Context, { series: slug, words, again, name }: ReviewInput): Promise<void> {
  authorize(ctx.actor !== null, 'UNAUTHENTICATED');
  const series = found(await seriesFor(ctx.actor, slug, ctx.clock.now()));
  const { seat } = series;
  authorize(seat !== null && mayReview(ctx.actor, { workroomId: series.workroom.id, hasFinished: true }), 'FORBIDDEN');
  if (!finishedBy(series)) throw new AppError('CONFLICT', { says: 'A part of this series is not done yet. Finish it, then say how it was.' });
  await withTransaction(async () => {
    // Two windows that send at once: the second one changes what the first one wrote.
    found(await Enrolment.findByPk(seat.enrolmentId, { lock: true }));
    const said = { words, shownName: name, wouldMakeAgain: again === 'yes' };
    const before = await Review.findOne({ where: { enrolmentId: seat.enrolmentId } });
    if (before === null) await Review.create({ enrolmentId: seat.enrolmentId, seriesId: series.id, ...said });
    else await before.update(said);
  });
}
