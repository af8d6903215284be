import { Op } from 'sequelize';
import type { AnswerInput } from '#contracts/questions.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, found, signedIn } from '#server/errors.ts';
import type { LetterTo } from '#server/mail/outbox.ts';
import { Enrolment, Lesson, Question, QuestionAnswer, Series, User, Workroom } from '#server/models/index.ts';
import { answerList, tellAnswer } from '#server/notices/tell-answer.ts';
import { mayAnswer } from '#server/policies/question.ts';

export interface Answered {
  readonly question: Question;
  /** Who asked. */
  readonly askerName: string;
}

/**
 * Answers a question and tells who asked in her page, and by letter where she wanted one. The same words sent twice are one answer; who
 * answers while somebody else does is told of it first.
 * @throws NOT_FOUND for another workroom's question, or one taken out; CONFLICT when there is an answer she has not seen.
 */
export async function answerQuestion(ctx: Context, input: AnswerInput): Promise<Answered> {
  const actor = signedIn(ctx);
  const known = found(await Question.findOne({ where: { publicId: input.question } }));
  const lesson = found(await Lesson.findByPk(known.lessonId));
  const series = found(await Series.findByPk(lesson.seriesId));
  authorize(mayAnswer(actor, series.workroomId));
  return withTransaction(async () => {
    const question = found(await Question.findByPk(known.id, { lock: true }));
    if (question.takenOutAt !== null) throw new AppError('NOT_FOUND');
    const asker = found(await User.findByPk(question.authorId));
    const before = await QuestionAnswer.findAll({ where: { questionId: question.id, takenOutAt: null }, order: ['createdAt', 'id'] });
    if (before.some(({ authorId, words }) => authorId === actor.userId && words === input.words)) return { question, askerName: asker.name };
    if (before.length > input.seen) throw await answeredMeanwhile(before.at(-1));
    const answer = await QuestionAnswer.create({ questionId: question.id, authorId: actor.userId, words: input.words, createdAt: ctx.clock.now() });
    if (question.answeredAt === null) await question.update({ answeredAt: ctx.clock.now() });
    await tellAsker({ question, asker, lesson, series, answer, by: actor }, ctx.clock.now());
    return { question, askerName: asker.name };
  });
}

async function answeredMeanwhile(answer: QuestionAnswer | undefined): Promise<AppError> {
  const by = answer === undefined ? null : await User.findByPk(answer.authorId);
  return new AppError('CONFLICT', { says: `${by?.name ?? 'Somebody'} answered in the meantime. Read it below. Yours was not sent; send it all the same if it says more.` });
}

interface Told {
  readonly question: Question;
  readonly asker: User;
  readonly lesson: Lesson;
  readonly series: Series;
  readonly answer: QuestionAnswer;
  readonly by: { readonly userId: number; readonly name: string };
}

/** Nothing goes to who has no seat any more, or is suspended. */
async function tellAsker({ question, asker, lesson, series, answer, by }: Told, now: Date): Promise<void> {
  const seat = await Enrolment.findByPk(question.enrolmentId);
  if (seat?.state !== 'active' || asker.suspendedAt !== null) return;
  const workroom = found(await Workroom.findByPk(series.workroomId));
  const parts = await Lesson.findAll({ where: { seriesId: series.id, takenOutAt: null, publishedVersionId: { [Op.ne]: null } }, attributes: ['id'], order: ['position', 'id'] });
  const partNumber = parts.findIndex(({ id }) => id === lesson.id) + 1;
  // A part that was taken out or taken back meanwhile has no page to lead to.
  if (partNumber === 0) return;
  const teacher = found(await User.findByPk(workroom.ownerId));
  const letter: LetterTo<'question-answered'> = {
    template: 'question-answered',
    dedupeKey: `question-answered:${answer.publicId}`,
    to: { userId: asker.id, name: asker.name, address: asker.email },
    data: {
      seriesTitle: series.title,
      seriesSlug: series.slug,
      partNumber,
      question: question.publicId,
      asked: question.words,
      answer: answer.words,
      byName: by.name,
      list: answerList(asker, workroom),
      helpsName: by.userId === teacher.id ? null : teacher.name,
    },
  };
  await tellAnswer(letter, { to: asker, workroom, seriesId: series.id, kind: 'answer', wantsLetter: question.wantsLetter }, now);
}
