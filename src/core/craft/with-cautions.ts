import { CRAFTS } from '#core/craft/crafts.ts';
import type { Answers, Question } from '#core/craft/reckon.ts';

/** The answer as it goes out: nobody is handed the plan of a later craft without what can hurt in it. */
export function withCautions(answer: Answers[Question]): object {
  return 'craft' in answer ? { ...answer, cautions: CRAFTS[answer.craft].cautions } : answer;
}
