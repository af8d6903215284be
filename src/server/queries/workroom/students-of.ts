/** Who is where in a workroom's series: one row for each seat, with the part she is in and her last step. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface StudentRow {
  readonly enrolmentId: number;
  readonly name: string;
  readonly seriesId: number;
  readonly seriesSlug: string;
  readonly seriesTitle: string;
  readonly partCount: number;
  /** Number of the first part that is not done: finished, or its checkpoint answered with weave on. */
  readonly atPart: number;
  readonly atTitle: string | null;
  /** Of the newest photo; null without one. */
  readonly verdict: 'waits' | 'weave-on' | 'mend-first' | null;
  readonly startedAt: Date;
  /** The last tick or photo; null before the first. */
  readonly lastStepAt: Date | null;
}

const DONE = `(
  EXISTS (SELECT 1 FROM lesson_visits v WHERE v.enrolment_id = e.id AND v.lesson_id = l.id AND v.finished_at IS NOT NULL)
  OR EXISTS (SELECT 1 FROM progress_photos p WHERE p.enrolment_id = e.id AND p.lesson_id = l.id AND p.verdict = 'weave-on'))`;

/** Rows of all active seats, those who waited longest for a step first. */
export async function studentsOf(workroomId: number): Promise<StudentRow[]> {
  return sequelize.query<StudentRow>(
    `SELECT e.id AS enrolmentId, u.name, s.id AS seriesId, s.slug AS seriesSlug, s.title AS seriesTitle, e.started_at AS startedAt,
            (SELECT COUNT(*) FROM lessons l WHERE l.series_id = s.id AND l.taken_out_at IS NULL) AS partCount,
            (SELECT COALESCE(MIN(l.position), (SELECT COUNT(*) + 1 FROM lessons a WHERE a.series_id = s.id AND a.taken_out_at IS NULL))
               FROM lessons l WHERE l.series_id = s.id AND l.taken_out_at IS NULL AND NOT ${DONE}) AS atPart,
            (SELECT l.title FROM lessons l WHERE l.series_id = s.id AND l.taken_out_at IS NULL AND NOT ${DONE} ORDER BY l.position LIMIT 1) AS atTitle,
            (SELECT p.verdict FROM progress_photos p WHERE p.enrolment_id = e.id ORDER BY p.created_at DESC, p.id DESC LIMIT 1) AS verdict,
            (SELECT MAX(step.at) FROM (
               SELECT t.enrolment_id, t.changed_at AS at FROM ticks t
               UNION ALL SELECT p.enrolment_id, p.created_at FROM progress_photos p) step WHERE step.enrolment_id = e.id) AS lastStepAt
       FROM enrolments e
       JOIN users u ON u.id = e.user_id
       JOIN series s ON s.id = e.series_id
      WHERE s.workroom_id = ? AND e.state = 'active'
      ORDER BY COALESCE(lastStepAt, e.started_at), e.id`,
    { replacements: [workroomId], type: QueryTypes.SELECT },
  );
}
