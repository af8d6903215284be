import type { ShowReviewInput } from '#contracts/review.ts';
import { audit } from '#server/audit.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { authorize, found } from '#server/errors.ts';
import { Review } from '#server/models/index.ts';
import { maySeeOffice } from '#server/policies/workroom.ts';

/**
 * Brings a hidden review back.
 * @throws NOT_FOUND unless the steward asks.
 */
export async function showReview(ctx: Context, { review: publicId }: ShowReviewInput): Promise<void> {
  authorize(maySeeOffice(ctx.actor));
  await withTransaction(async () => {
    const review = found(await Review.findOne({ where: { publicId }, lock: true }));
    if (review.hiddenAt === null) return;
    await review.update({ hiddenAt: null, hiddenWhy: '' });
    await audit(ctx, 'show-review', { kind: 'review', id: publicId });
  });
}
