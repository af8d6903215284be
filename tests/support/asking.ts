/** A series that is followed, with its teacher, a helper, and questions asked by whoever asks. */
import { AskForm, type AskInput } from '#contracts/questions.ts';
import { User, Workroom, WorkroomHelper, type Enrolment, type Lesson, type Question, type Series } from '#server/models/index.ts';
import { askQuestion } from '#server/use-cases/questions/ask-question.ts';
import { contextFor } from './context.ts';
import { buildEnrolment, buildUser } from './factories.ts';
import { buildFollowed } from './followed.ts';

export interface Class {
  readonly series: Series;
  readonly parts: readonly [Lesson, Lesson, Lesson];
  readonly teacher: User;
  readonly helper: User;
  readonly maud: User;
  readonly maudsSeat: Enrolment;
  readonly jonas: User;
}

export async function buildClass(): Promise<Class> {
  const { series, parts, student: maud, seat: maudsSeat } = await buildFollowed();
  const workroom = await Workroom.findByPk(series.workroomId, { rejectOnEmpty: true });
  const teacher = await User.findByPk(workroom.ownerId, { rejectOnEmpty: true });
  await teacher.update({ name: 'Ilse Marrow' });
  await maud.update({ name: 'Maud Ellery' });
  const helper = await buildUser({ name: 'Wren Okafor' });
  await WorkroomHelper.create({ workroomId: workroom.id, userId: helper.id });
  const jonas = await buildUser({ name: 'Jonas Pike' });
  await buildEnrolment({ seriesId: series.id, userId: jonas.id });
  return { series, parts, teacher, helper, maud, maudsSeat, jonas };
}

/** As a form sends it: to the teacher, without a letter, unless `given` says otherwise. */
export function asking({ series, parts }: Pick<Class, 'series' | 'parts'>, given: Record<string, string> = {}): AskInput {
  return AskForm.parse({ series: series.slug, lesson: parts[0].publicId, words: 'Why do my edges pull in?', to: 'teacher', ...given });
}

export async function ask(all: Class, who: User, given: Record<string, string> = {}): Promise<Question> {
  return askQuestion(await contextFor(who), asking(all, given));
}
