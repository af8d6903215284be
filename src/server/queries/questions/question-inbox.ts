/** Questions in the workrooms where somebody teaches or helps: those that wait, oldest first, and those answered last. */
import { QueryTypes } from 'sequelize';
import type { LessonFacts } from '#core/lesson-text/lesson-facts.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { workroomsOf } from '#server/policies/workroom.ts';
import { PART_NUMBER } from '#server/queries/lessons/part-number.ts';
import { QUESTION_COLUMNS, standsFor, withAnswers, type QuestionRow, type ShownQuestion } from './shown-questions.ts';

export interface InboxQuestion extends ShownQuestion {
  readonly seriesTitle: string;
  readonly seriesSlug: string;
  readonly partNumber: number;
  readonly partTitle: string;
  /** The words of the step it is about; null for the whole part, or when the text has lost the step. */
  readonly stepWords: string | null;
}

export interface QuestionInbox {
  /** How many wait, of which the oldest are in `waiting`. */
  readonly waitingCount: number;
  readonly waiting: readonly InboxQuestion[];
  readonly answered: readonly InboxQuestion[];
}

interface InboxRow extends QuestionRow {
  seriesTitle: string; seriesSlug: string; partNumber: number; partTitle: string; steps: LessonFacts['steps'] | null;
}

const MOST_WAITING = 40;
const MOST_ANSWERED = 20;

const FROM = `
    FROM questions q
    JOIN enrolments e ON e.id = q.enrolment_id
    JOIN users u ON u.id = q.author_id
    JOIN lessons l ON l.id = q.lesson_id
    JOIN series s ON s.id = l.series_id`;
/** Whose seat has closed no longer waits for an answer. */
const WAITS = `s.workroom_id IN (:workrooms) AND q.answered_at IS NULL AND e.state = 'active'`;

const SELECT = `
  SELECT ${QUESTION_COLUMNS}, s.title AS seriesTitle, s.slug AS seriesSlug, l.title AS partTitle,
         ${PART_NUMBER} AS partNumber,
         JSON_EXTRACT(v.facts, '$.steps') AS steps
  ${FROM}
    LEFT JOIN lesson_versions v ON v.id = l.published_version_id`;

export async function questionInbox(actor: Actor): Promise<QuestionInbox> {
  const workrooms = workroomsOf(actor);
  if (workrooms.length === 0) return { waitingCount: 0, waiting: [], answered: [] };
  const asked = { replacements: { workrooms, me: actor.userId }, type: QueryTypes.SELECT } as const;
  const [waitingCount, waiting, answered] = await Promise.all([
    countWaitingQuestions(actor),
    sequelize.query<InboxRow>(`${SELECT} WHERE ${WAITS} AND ${standsFor('q')} ORDER BY q.created_at, q.id LIMIT ${MOST_WAITING}`, asked),
    sequelize.query<InboxRow>(`${SELECT} WHERE s.workroom_id IN (:workrooms) AND q.answered_at IS NOT NULL AND ${standsFor('q')} ORDER BY q.answered_at DESC, q.id DESC LIMIT ${MOST_ANSWERED}`, asked),
  ]);
  const shown = await withAnswers(actor, [...waiting, ...answered]);
  const inInbox = (row: InboxRow, index: number): InboxQuestion[] => {
    const question = shown[index];
    const { seriesTitle, seriesSlug, partNumber, partTitle, steps, stepId } = row;
    return question === undefined ? [] : [{ ...question, seriesTitle, seriesSlug, partNumber, partTitle, stepWords: steps?.find(({ id }) => id === stepId)?.words ?? null }];
  };
  return { waitingCount, waiting: waiting.flatMap(inInbox), answered: answered.flatMap((row, index) => inInbox(row, waiting.length + index)) };
}

export async function countWaitingQuestions(actor: Actor): Promise<number> {
  const workrooms = workroomsOf(actor);
  if (workrooms.length === 0) return 0;
  const [row] = await sequelize.query<{ n: number }>(`SELECT COUNT(*) AS n ${FROM} WHERE ${WAITS} AND q.taken_out_at IS NULL`, { replacements: { workrooms }, type: QueryTypes.SELECT });
  return row?.n ?? 0;
}
