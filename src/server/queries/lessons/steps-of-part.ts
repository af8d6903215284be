import type { StepOfPart } from '#core/following/see-to-mend.ts';
import { Lesson, LessonVersion } from '#server/models/index.ts';

/** The steps of a part as students read it, in its order; none before it is published. */
export async function stepsOfPart(lessonId: number): Promise<readonly StepOfPart[]> {
  const lesson = await Lesson.findByPk(lessonId, { attributes: ['publishedVersionId'] });
  const versionId = lesson?.publishedVersionId ?? null;
  const version = versionId === null ? null : await LessonVersion.findByPk(versionId, { attributes: ['facts'] });
  return version?.facts.steps ?? [];
}
