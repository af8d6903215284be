import { Op } from 'sequelize';
import type { Context } from '#server/context.ts';
import { Question, QuestionAnswer, WordReport } from '#server/models/index.ts';

const DAY_MS = 86_400_000;
/** So long what was taken out can be put back. */
const KEPT_DAYS = 30;

/** Forgets words that were taken out too long ago to be put back, with all that hangs on them; what the steward has still to judge stays. */
export async function forgetTakenOutWords(ctx: Context): Promise<void> {
  const old = { takenOutAt: { [Op.lt]: new Date(ctx.clock.now().getTime() - KEPT_DAYS * DAY_MS) } };
  const open = await WordReport.findAll({ where: { settledAt: null }, attributes: ['questionId', 'answerId'] });
  const judgedAnswers = open.flatMap(({ answerId }) => (answerId === null ? [] : [answerId]));
  const under = await QuestionAnswer.findAll({ where: { id: judgedAnswers }, attributes: ['questionId'] });
  const judgedQuestions = [...open.flatMap(({ questionId }) => (questionId === null ? [] : [questionId])), ...under.map(({ questionId }) => questionId)];
  await QuestionAnswer.destroy({ where: { ...old, id: { [Op.notIn]: judgedAnswers } } });
  await Question.destroy({ where: { ...old, id: { [Op.notIn]: judgedQuestions } } });
}
