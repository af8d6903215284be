import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface ReportInList {
  readonly publicId: string;
  readonly why: string;
  readonly reportedAt: Date;
  readonly reportedBy: string;
  readonly kind: 'question' | 'answer';
  readonly words: string;
  readonly writtenBy: string;
  readonly writerPublicId: string;
  readonly seriesTitle: string;
  readonly workroomName: string;
  /** Somebody took the words out meanwhile. */
  readonly isTakenOut: boolean;
}

const MOST = 50;

/** Reports that wait for the steward, oldest first. */
export async function listReports(): Promise<ReportInList[]> {
  const rows = await sequelize.query<Omit<ReportInList, 'isTakenOut'> & { isTakenOut: number }>(
    `SELECT r.public_id AS publicId, r.why, r.created_at AS reportedAt, b.name AS reportedBy, IF(a.id IS NULL, 'question', 'answer') AS kind,
            COALESCE(a.words, q.words) AS words, u.name AS writtenBy, u.public_id AS writerPublicId, s.title AS seriesTitle, w.name AS workroomName,
            COALESCE(a.taken_out_at, q.taken_out_at) IS NOT NULL AS isTakenOut
       FROM word_reports r
       JOIN users b ON b.id = r.reporter_id
       LEFT JOIN question_answers a ON a.id = r.answer_id
       JOIN questions q ON q.id = COALESCE(r.question_id, a.question_id)
       JOIN users u ON u.id = COALESCE(a.author_id, q.author_id)
       JOIN lessons l ON l.id = q.lesson_id
       JOIN series s ON s.id = l.series_id
       JOIN workrooms w ON w.id = s.workroom_id
      WHERE r.settled_at IS NULL
      ORDER BY r.created_at, r.id
      LIMIT ${MOST}`,
    { type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ ...row, isTakenOut: row.isTakenOut === 1 }));
}
