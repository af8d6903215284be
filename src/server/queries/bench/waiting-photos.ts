/**
 * Photos that wait for a verdict in the workrooms where somebody sits at the bench: first the one whose answer is due
 * first, which in one workroom is the oldest. One whose verdict is on its way out does not wait any more.
 */
import { QueryTypes } from 'sequelize';
import type { MyPiece } from '#core/craft/fit.ts';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { workroomsOf } from '#server/policies/workroom.ts';
import { PART_NUMBER } from '#server/queries/lessons/part-number.ts';

export interface WaitingPhoto {
  readonly publicId: string;
  readonly mediaId: string;
  readonly words: string;
  readonly postedAt: Date;
  readonly studentName: string;
  readonly studentUnits: 'cm' | 'in';
  readonly enrolmentId: number;
  readonly seriesId: number;
  readonly seriesSlug: string;
  readonly seriesTitle: string;
  readonly lessonId: number;
  readonly partNumber: number;
  readonly partTitle: string;
  readonly checkpoint: { readonly ask: string; readonly look: readonly string[] } | null;
  readonly mine: MyPiece | null;
  readonly workroomId: number;
  /** Days within which that workroom promises to answer. */
  readonly answerDays: number;
}

const WAITS = `p.verdict = 'waits' AND NOT EXISTS (SELECT 1 FROM held_verdicts h WHERE h.photo_id = p.id AND h.goes_out_at IS NOT NULL)`;

const SELECT = `
  SELECT p.public_id AS publicId, m.public_id AS mediaId, p.words, p.created_at AS postedAt,
         u.name AS studentName, u.units AS studentUnits, e.id AS enrolmentId,
         s.id AS seriesId, s.slug AS seriesSlug, s.title AS seriesTitle,
         l.id AS lessonId, l.title AS partTitle, l.checkpoint,
         ${PART_NUMBER} AS partNumber,
         mp.data AS mine, w.id AS workroomId, w.answer_days AS answerDays
    FROM progress_photos p
    JOIN media m ON m.id = p.media_id
    JOIN enrolments e ON e.id = p.enrolment_id
    JOIN users u ON u.id = e.user_id
    JOIN series s ON s.id = e.series_id
    JOIN workrooms w ON w.id = s.workroom_id
    JOIN lessons l ON l.id = p.lesson_id
    LEFT JOIN my_pieces mp ON mp.enrolment_id = e.id
   WHERE ${WAITS} AND s.workroom_id IN (:workrooms)
   ORDER BY p.created_at + INTERVAL w.answer_days DAY, p.id
   LIMIT :limit`;

export async function waitingPhotos(actor: Actor, limit = 60): Promise<WaitingPhoto[]> {
  const workrooms = workroomsOf(actor);
  if (workrooms.length === 0) return [];
  return sequelize.query<WaitingPhoto>(SELECT, { replacements: { workrooms, limit }, type: QueryTypes.SELECT });
}

export async function countWaitingPhotos(actor: Actor): Promise<number> {
  const workrooms = workroomsOf(actor);
  if (workrooms.length === 0) return 0;
  const [row] = await sequelize.query<{ n: number }>(
    `SELECT COUNT(*) AS n FROM progress_photos p JOIN enrolments e ON e.id = p.enrolment_id JOIN series s ON s.id = e.series_id
      WHERE ${WAITS} AND s.workroom_id IN (:workrooms)`,
    { replacements: { workrooms }, type: QueryTypes.SELECT },
  );
  return row?.n ?? 0;
}
