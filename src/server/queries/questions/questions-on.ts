/** The questions on one part that one person may see: her own first, then the newest. */
import { QueryTypes } from 'sequelize';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { worksIn } from '#server/policies/lesson.ts';
import { maySeeQuestion } from '#server/policies/question.ts';
import type { PartFor, SeriesFor } from '#server/queries/series/series-for.ts';
import { QUESTION_COLUMNS, standsFor, withAnswers, type QuestionRow, type ShownQuestion } from './shown-questions.ts';

/** Older ones of the class are found by asking in like words. */
const MOST = 40;

export async function questionsOn(actor: Actor, series: SeriesFor, part: PartFor): Promise<ShownQuestion[]> {
  const workroomId = series.workroom.id;
  const rows = await sequelize.query<QuestionRow>(
    `SELECT ${QUESTION_COLUMNS}
       FROM questions q JOIN users u ON u.id = q.author_id JOIN lessons l ON l.id = q.lesson_id JOIN series s ON s.id = l.series_id
      WHERE q.lesson_id = :lesson AND ${standsFor('q')} AND (:all OR q.is_for_class = 1 OR q.author_id = :me)
      ORDER BY q.author_id = :me DESC, q.created_at DESC, q.id DESC
      LIMIT ${MOST}`,
    { replacements: { lesson: part.id, me: actor.userId, all: worksIn(actor, workroomId) }, type: QueryTypes.SELECT },
  );
  const seen = rows.filter((row) => maySeeQuestion(actor, { workroomId, askerId: row.authorId, isForClass: row.isForClass === 1, isTakenOut: row.takenOutById !== null, access: part.access }));
  return withAnswers(actor, seen);
}
