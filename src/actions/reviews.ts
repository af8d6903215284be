import { AnswerForm, HideReviewForm, ReviewForm, ShowReviewForm } from '#contracts/review.ts';
import { answerReview } from '#server/use-cases/reviews/answer-review.ts';
import { hideReview } from '#server/use-cases/reviews/hide-review.ts';
import { showReview } from '#server/use-cases/reviews/show-review.ts';
import { writeReview } from '#server/use-cases/reviews/write-review.ts';
import { formAction } from './form-action.ts';

export const reviews = {
  write: formAction(ReviewForm, async (input, ctx) => {
    await writeReview(ctx, input);
    return { to: `/series/${input.series}#reviews`, said: 'Your words are kept. Everybody who looks at the series reads them.' };
  }),
  answer: formAction(AnswerForm, async (input, ctx) => {
    const slug = await answerReview(ctx, input);
    return { to: `/series/${slug}#reviews`, said: input.words === '' ? 'Your answer is taken back.' : 'Your answer stands under the review.' };
  }),
  hide: formAction(HideReviewForm, async (input, ctx) => {
    await hideReview(ctx, input);
    return { to: '/office/reviews', said: 'The review is hidden.' };
  }),
  show: formAction(ShowReviewForm, async (input, ctx) => {
    await showReview(ctx, input);
    return { to: '/office/reviews', said: 'The review is shown again.' };
  }),
};
