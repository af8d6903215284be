/** Writing the row of a question or an answer; part of the caller's transaction, under the lock of the question. */
import { Question, QuestionAnswer } from '#server/models/index.ts';

export type WordsRow = Question | QuestionAnswer;

export async function changeRow(row: WordsRow, values: Partial<Pick<WordsRow, 'words' | 'changedAt' | 'takenOutAt' | 'takenOutById'>>): Promise<void> {
  if (row instanceof Question) await row.update(values);
  else await row.update(values);
}

/** A question whose last answer goes waits again. */
export async function takeOutRow(row: WordsRow, question: Question, byId: number, now: Date): Promise<void> {
  await changeRow(row, { takenOutAt: now, takenOutById: byId });
  if (row instanceof QuestionAnswer && (await QuestionAnswer.count({ where: { questionId: question.id, takenOutAt: null } })) === 0) await question.update({ answeredAt: null });
}
