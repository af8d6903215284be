/** A question or an answer as somebody holds it, with what the rules ask of it. Locked: part of the caller's transaction. */
import type { WordsInput } from '#contracts/questions.ts';
import type { Context } from '#server/context.ts';
import { AppError, found, signedIn } from '#server/errors.ts';
import { Lesson, Question, QuestionAnswer, Series } from '#server/models/index.ts';
import { maySeeQuestion, type WordsFacts } from '#server/policies/question.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import type { WordsRow } from './_words-row.ts';

export interface WordsInHand {
  readonly row: WordsRow;
  /** The question itself, or the one that was answered. */
  readonly question: Question;
  readonly facts: WordsFacts;
}

/** @throws NOT_FOUND when there are no such words, or when the person who asks may not see them. */
export async function wordsInHand(ctx: Context, { of, which: publicId }: WordsInput): Promise<WordsInHand> {
  const actor = signedIn(ctx);
  const known = of === 'question' ? null : found(await QuestionAnswer.findOne({ where: { publicId } }));
  // The question is the lock of everything said to it.
  const question = found(await Question.findOne({ where: known === null ? { publicId } : { id: known.questionId }, lock: true }));
  const answer = known === null ? null : found(await QuestionAnswer.findByPk(known.id, { lock: true }));
  const lesson = found(await Lesson.findByPk(question.lessonId));
  const { slug, workroomId } = found(await Series.findByPk(lesson.seriesId));
  const series = await seriesFor(actor, slug, ctx.clock.now());
  const access = series?.parts.find((part) => part.id === lesson.id)?.access ?? { may: 'nothing' };
  const isSeen = maySeeQuestion(actor, { workroomId, askerId: question.authorId, isForClass: question.isForClass, isTakenOut: question.takenOutAt !== null, access });
  if (!isSeen) throw new AppError('NOT_FOUND');
  const row = answer ?? question;
  return { row, question, facts: { kind: of, workroomId, authorId: row.authorId, isAnswered: question.answeredAt !== null, takenOutById: row.takenOutById, isSeen } };
}
