import { Op } from 'sequelize';
import type { AskInput } from '#contracts/questions.ts';
import type { Context } from '#server/context.ts';
import { withTransaction } from '#server/db/transaction.ts';
import { AppError, authorize, fieldError, found, signedIn } from '#server/errors.ts';
import { Enrolment, LessonVersion, ProgressPhoto, Question } from '#server/models/index.ts';
import { mayPost } from '#server/policies/person.ts';
import { mayAsk } from '#server/policies/question.ts';
import { seriesFor } from '#server/queries/series/series-for.ts';
import { countUse, RATE_RULES } from '#server/web/rate-limit.ts';

/** Questions of one seat that may wait at the same time. */
const MOST_WAITING = 20;
const DAY_MS = 86_400_000;

/**
 * Asks on a part. The same words sent twice, as by a button pressed twice, are one question.
 * @throws NOT_FOUND when the part is not hers to follow; VALIDATION at `step` or `photo`; CONFLICT when too many wait; RATE_LIMITED.
 */
export async function askQuestion(ctx: Context, input: AskInput): Promise<Question> {
  const actor = signedIn(ctx);
  const now = ctx.clock.now();
  const series = found(await seriesFor(actor, input.series, now));
  const part = found(series.parts.find(({ publicId }) => publicId === input.lesson));
  const { seat } = series;
  authorize(seat !== null && mayAsk(actor, part.access));
  if (!mayPost(actor)) throw new AppError('VALIDATION', { says: 'Confirm your address first: the answer goes there. The link is in your mail.' });
  await countUse(RATE_RULES.question, actor.publicId);
  if (input.step !== null && !(await hasStep(part.publishedVersionId, input.step))) throw fieldError('step', 'This step is no longer in the text. Choose another, or the whole part.');
  const photo = input.photo === null ? null : await ProgressPhoto.findOne({ where: { publicId: input.photo, enrolmentId: seat.enrolmentId, lessonId: part.id }, attributes: ['id'] });
  if (input.photo !== null && photo === null) throw fieldError('photo', 'This photo is not among yours of this part. Choose another, or none.');
  const photoId = photo?.id ?? null;
  return withTransaction(async () => {
    found(await Enrolment.findByPk(seat.enrolmentId, { lock: true }));
    const mine = { enrolmentId: seat.enrolmentId, takenOutAt: null };
    const twin = await Question.findOne({
      where: { ...mine, lessonId: part.id, photoId, words: input.words, isForClass: input.to === 'class', createdAt: { [Op.gt]: new Date(now.getTime() - DAY_MS) } },
    });
    if (twin !== null) return twin;
    const waiting = await Question.count({ where: { ...mine, answeredAt: null } });
    if (waiting >= MOST_WAITING) throw new AppError('CONFLICT', { says: `${waiting} questions of yours wait already. They are answered first.` });
    return Question.create({
      enrolmentId: seat.enrolmentId,
      lessonId: part.id,
      authorId: actor.userId,
      stepId: input.step,
      photoId,
      words: input.words,
      isForClass: input.to === 'class',
      wantsLetter: input.letter,
      createdAt: now,
    });
  });
}

async function hasStep(versionId: number | null, step: string): Promise<boolean> {
  const version = versionId === null ? null : await LessonVersion.findByPk(versionId, { attributes: ['facts'] });
  return version?.facts.steps.some(({ id }) => id === step) ?? false;
}
