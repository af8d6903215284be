/** Who may say what about a series. A teacher may answer a review, never take it away; only the steward hides one. */
import type { Actor } from '#server/context.ts';
import { worksIn } from '#server/policies/lesson.ts';

export interface ReviewFacts {
  readonly workroomId: number;
  /** Has a seat that counts, and made every part. */
  readonly hasFinished: boolean;
}

/** Whoever works for the series does not praise it. */
export function mayReview(actor: Actor | null, { workroomId, hasFinished }: ReviewFacts): boolean {
  return actor !== null && hasFinished && !worksIn(actor, workroomId);
}
