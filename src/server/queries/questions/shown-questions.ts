/** Questions and answers as one person sees them: whose words, by whom, and what she may do with them. */
import { QueryTypes } from 'sequelize';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { worksIn } from '#server/policies/lesson.ts';
import { mayChangeWords, mayPutBackWords, mayReportWords, mayTakeOutWords, type WordsFacts } from '#server/policies/question.ts';

/** What was taken out can be put back for so long. */
const RECOVERABLE_DAYS = 30;

export interface ShownWords {
  readonly publicId: string;
  readonly words: string;
  readonly byName: string;
  readonly at: Date;
  readonly changedAt: Date | null;
  readonly isMine: boolean;
  /** Only who took words out sees that they were there. */
  readonly isTakenOut: boolean;
  readonly may: { readonly change: boolean; readonly takeOut: boolean; readonly putBack: boolean; readonly report: boolean };
}

export interface ShownAnswer extends ShownWords {
  /** A helper's words, not the teacher's. */
  readonly byHelper: boolean;
}

export interface AskedPhoto {
  /** Public ids. */
  readonly publicId: string;
  readonly mediaId: string;
  readonly postedAt: Date;
}

export interface ShownQuestion extends ShownWords {
  readonly isForClass: boolean;
  readonly isAnswered: boolean;
  readonly stepId: string | null;
  /** The photo it is about, for who asked and whoever teaches or helps there; the class never sees it. */
  readonly photo: AskedPhoto | null;
  readonly answers: readonly ShownAnswer[];
}

/** A row of `QUESTION_COLUMNS`. */
export interface QuestionRow {
  id: number; publicId: string; words: string; stepId: string | null; isForClass: number; authorId: number; byName: string;
  at: Date; changedAt: Date | null; answeredAt: Date | null; takenOutById: number | null; workroomId: number; photoId: number | null;
}
interface AnswerRow {
  questionId: number; publicId: string; words: string; authorId: number; byName: string; at: Date; changedAt: Date | null; takenOutById: number | null; byHelper: number;
}

/** Of `questions q`, its author `u` and its series `s`. */
export const QUESTION_COLUMNS = `
  q.id, q.public_id AS publicId, q.words, q.step_id AS stepId, q.is_for_class AS isForClass, q.author_id AS authorId, u.name AS byName,
  q.created_at AS at, q.changed_at AS changedAt, q.answered_at AS answeredAt, q.taken_out_by_id AS takenOutById, s.workroom_id AS workroomId, q.photo_id AS photoId`;

/** Words of `row` that stand, or that the person `:me` took out herself and may still put back. */
export const standsFor = (row: 'q' | 'a'): string => `(${row}.taken_out_at IS NULL OR (${row}.taken_out_by_id = :me AND ${row}.taken_out_at > UTC_TIMESTAMP(3) - INTERVAL ${RECOVERABLE_DAYS} DAY))`;

/** Rows whose questions `actor` may see, with their answers, in the order of the rows. */
export async function withAnswers(actor: Actor, rows: readonly QuestionRow[]): Promise<ShownQuestion[]> {
  const answers = rows.length === 0 ? [] : await sequelize.query<AnswerRow>(
    `SELECT a.question_id AS questionId, a.public_id AS publicId, a.words, a.author_id AS authorId, u.name AS byName, a.created_at AS at,
            a.changed_at AS changedAt, a.taken_out_by_id AS takenOutById, a.author_id <> w.owner_id AS byHelper
       FROM question_answers a
       JOIN users u ON u.id = a.author_id
       JOIN questions q ON q.id = a.question_id
       JOIN lessons l ON l.id = q.lesson_id
       JOIN series s ON s.id = l.series_id
       JOIN workrooms w ON w.id = s.workroom_id
      WHERE a.question_id IN (:ids) AND ${standsFor('a')}
      ORDER BY a.created_at, a.id`,
    { replacements: { ids: rows.map(({ id }) => id), me: actor.userId }, type: QueryTypes.SELECT },
  );
  const photos = await photosOf(rows.filter((row) => row.authorId === actor.userId || worksIn(actor, row.workroomId)));
  return rows.map((row) => {
    const isAnswered = row.answeredAt !== null;
    return {
      ...shown(actor, row, { kind: 'question', workroomId: row.workroomId, isAnswered }),
      isForClass: row.isForClass === 1,
      isAnswered,
      stepId: row.stepId,
      photo: photos.get(row.id) ?? null,
      answers: answers.filter(({ questionId }) => questionId === row.id)
        .map((answer) => ({ ...shown(actor, answer, { kind: 'answer', workroomId: row.workroomId, isAnswered }), byHelper: answer.byHelper === 1 })),
    };
  });
}

async function photosOf(rows: readonly QuestionRow[]): Promise<ReadonlyMap<number, AskedPhoto>> {
  const ids = rows.flatMap(({ id, photoId }) => (photoId === null ? [] : [id]));
  if (ids.length === 0) return new Map();
  const photos = await sequelize.query<AskedPhoto & { questionId: number }>(
    `SELECT q.id AS questionId, p.public_id AS publicId, m.public_id AS mediaId, p.created_at AS postedAt
       FROM questions q JOIN progress_photos p ON p.id = q.photo_id JOIN media m ON m.id = p.media_id WHERE q.id IN (:ids)`,
    { replacements: { ids }, type: QueryTypes.SELECT },
  );
  return new Map(photos.map(({ questionId, ...photo }) => [questionId, photo]));
}

function shown(actor: Actor, row: Pick<AnswerRow, 'publicId' | 'words' | 'authorId' | 'byName' | 'at' | 'changedAt' | 'takenOutById'>, of: Pick<WordsFacts, 'kind' | 'workroomId' | 'isAnswered'>): ShownWords {
  const { publicId, words, byName, at, changedAt, authorId, takenOutById } = row;
  const facts: WordsFacts = { ...of, authorId, takenOutById, isSeen: true };
  return {
    publicId, words, byName, at, changedAt,
    isMine: authorId === actor.userId,
    isTakenOut: takenOutById !== null,
    may: { change: mayChangeWords(actor, facts), takeOut: mayTakeOutWords(actor, facts), putBack: mayPutBackWords(actor, facts), report: mayReportWords(actor, facts) },
  };
}
