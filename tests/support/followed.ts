/** A series that somebody follows: Low Tide's piece, two parts, the second with a checkpoint, a third that waits for it. */
import { factsOf } from '#core/lesson-text/lesson-facts.ts';
import { parseLessonText } from '#core/lesson-text/parse-lesson-text.ts';
import { LessonVersion, PatternPiece, type Enrolment, type Lesson, type Series, type User } from '#server/models/index.ts';
import { buildEnrolment, buildLesson, buildSeries, buildUser } from './factories.ts';
import { lowTide } from './low-tide.ts';

export interface Followed {
  readonly series: Series;
  readonly parts: readonly [Lesson, Lesson, Lesson];
  readonly student: User;
  readonly seat: Enrolment;
}

const STEPS = '<Step id="tie-on">Tie on.</Step>\n\n<Step id="wind">Wind <Amount of="ends"/>.</Step>';

export async function buildFollowed(): Promise<Followed> {
  const series = await buildSeries();
  await PatternPiece.create({ seriesId: series.id, data: await lowTide(), revision: 1 });
  const first = await buildLesson({ seriesId: series.id });
  const second = await buildLesson({ seriesId: series.id, checkpoint: { ask: 'Show your warped loom', look: ['Every nail'] } });
  const third = await buildLesson({ seriesId: series.id, opens: { rule: 'after-verdict', lesson: second.publicId } });
  for (const lesson of [first, second, third]) await writeText(lesson, STEPS);
  const student = await buildUser();
  return { series, parts: [first, second, third], student, seat: await buildEnrolment({ seriesId: series.id, userId: student.id }) };
}

export async function writeText(lesson: Lesson, source: string, number = 2): Promise<void> {
  const reading = parseLessonText(source);
  if (!reading.ok) throw new RangeError(source);
  const version = await LessonVersion.create({ lessonId: lesson.id, number, source, tree: reading.tree, facts: factsOf(reading.tree) });
  await lesson.update({ publishedVersionId: version.id });
}
