import type { TextRemarks } from '#contracts/workroom.ts';
import type { LessonText, RefusedText } from '#core/lesson-text/parse-lesson-text.ts';

/** What a writer is told of her text, without the tree. */
export function presentRemarks(reading: LessonText | RefusedText): TextRemarks {
  return { problems: reading.problems, warnings: reading.ok ? reading.warnings : [] };
}
