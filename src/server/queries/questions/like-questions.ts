/** What the class asked before in like words, in those parts of a series that somebody has open. */
import { QueryTypes } from 'sequelize';
import { enoughShared, stemsIn, stemsShared } from '#core/questions/like-words.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { maySeeQuestion } from '#server/policies/question.ts';
import type { SeriesFor } from '#server/queries/series/series-for.ts';
import { QUESTION_COLUMNS, withAnswers, type QuestionRow, type ShownQuestion } from './shown-questions.ts';

export interface LikeQuestion extends ShownQuestion {
  readonly partNumber: number;
}

/** Of so many that share a word the likest are chosen. */
const LOOKED_AT = 60;
const MOST = 5;

/** At most five, the likest first, those with an answer before those without. */
export async function likeQuestions(actor: Actor, series: SeriesFor, words: string): Promise<LikeQuestion[]> {
  const stems = stemsIn(words);
  const open = series.parts.filter(({ access }) => access.may === 'follow');
  if (stems.length === 0 || open.length === 0) return [];
  const rows = await sequelize.query<QuestionRow & { lessonId: number }>(
    `SELECT ${QUESTION_COLUMNS}, q.lesson_id AS lessonId
       FROM questions q JOIN users u ON u.id = q.author_id JOIN lessons l ON l.id = q.lesson_id JOIN series s ON s.id = l.series_id
      WHERE q.lesson_id IN (:lessons) AND q.is_for_class = 1 AND q.taken_out_at IS NULL AND MATCH (q.words) AGAINST (:stems IN BOOLEAN MODE)
      ORDER BY MATCH (q.words) AGAINST (:stems IN BOOLEAN MODE) DESC, q.created_at DESC
      LIMIT ${LOOKED_AT}`,
    { replacements: { lessons: open.map(({ id }) => id), stems: stems.map((stem) => `${stem}*`).join(' ') }, type: QueryTypes.SELECT },
  );
  const partOf = (lessonId: number) => open.find(({ id }) => id === lessonId);
  const likest = rows
    .map((row) => ({ row, shared: stemsShared(stems, row.words) }))
    .filter(({ row, shared }) => {
      const part = partOf(row.lessonId);
      return shared >= enoughShared(stems.length) && part !== undefined
        && maySeeQuestion(actor, { workroomId: series.workroom.id, askerId: row.authorId, isForClass: true, isTakenOut: false, access: part.access });
    })
    .toSorted((a, b) => b.shared - a.shared || Number(b.row.answeredAt !== null) - Number(a.row.answeredAt !== null))
    .slice(0, MOST)
    .map(({ row }) => row);
  const shown = await withAnswers(actor, likest);
  return shown.map((question, index) => ({ ...question, partNumber: partOf(likest[index]?.lessonId ?? 0)?.number ?? 1 }));
}
