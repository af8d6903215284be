/**
 * What crosses the wire at `POST /api/reckon`. The question is read by core itself, whose
 * hand-written checks speak a weaver's language; here stand the answer's shapes and limits.
 */
import type { Answers, Question } from '#core/craft/reckon.ts';
import type { Problem } from '#core/outcome.ts';

/** A longer question is refused. */
export const MOST_QUESTION_BYTES = 64 * 1024;

export type ReckonAnswer = Answers[Question];

/** A problem document (RFC 9457) whose `problems` name each refused value. */
export interface ReckonRefusal {
  readonly type: 'about:blank';
  readonly title: string;
  readonly status: 400 | 413 | 422;
  readonly requestId: string;
  readonly problems: readonly Problem[];
}
