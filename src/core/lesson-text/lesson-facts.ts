import type { LessonText } from './parse-lesson-text.ts';

/** What a lesson's text speaks of, kept beside its tree so that nobody has to walk the tree for it. */
export type LessonFacts = Pick<LessonText, 'outline' | 'steps' | 'amounts' | 'figures' | 'media'>;

export function factsOf({ outline, steps, amounts, figures, media }: LessonText): LessonFacts {
  return { outline, steps, amounts, figures, media };
}
