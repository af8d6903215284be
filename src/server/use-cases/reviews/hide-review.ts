import type { HideReviewInput } from '#contracts/review.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { Review } from '#server/models/index.ts';
import { maySeeOffice } from '#server/policies/workroom.ts';

/**
 * Takes a review out of sight, with a reason that its writer reads. Nothing of it is lost.
 * @throws NOT_FOUND unless the steward asks.
 */
export async function hideReview(ctx: Context, { review: publicId, reason }: HideReviewInput): Promise<void> {
  authorize(maySeeOffice(ctx.actor));
  await withTransaction(async () => {
    const review = found(await Review.findOne({ where: { publicId }, lock: true }));
    if (review.hiddenAt !== null) return;
    await review.update({ hiddenAt: ctx.clock.now(), hiddenWhy: reason });
    await audit(ctx, 'hide-review', { kind: 'review', id: publicId }, { reason });
  });
}
