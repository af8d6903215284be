import type { LessonFacts } from '#core/lesson-text/lesson-facts.ts';
import { Lesson, LessonVersion } from '#server/models/index.ts';

/** What the text of a part speaks of, as students read it; null before it is published. */
export async function factsOfPart(lessonId: number): Promise<LessonFacts | null> {
  const lesson = await Lesson.findByPk(lessonId, { attributes: ['publishedVersionId'] });
  const versionId = lesson?.publishedVersionId ?? null;
  const version = versionId === null ? null : await LessonVersion.findByPk(versionId, { attributes: ['facts'] });
  return version?.facts ?? null;
}
