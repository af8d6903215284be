/** Looms of students who have a seat in a series and said what they weave on, for its teacher to try a pattern piece with. */
import { QueryTypes } from 'sequelize';
import type { StudentLoom } from '#contracts/looms.ts';
import { sequelize } from '#server/db/sequelize.ts';

const MOST = 100;

/** Of the series with this slug in this workroom; who changed something last comes first. */
export async function studentLooms(workroomId: number | null, slug: string): Promise<readonly StudentLoom[]> {
  return sequelize.query<StudentLoom>(
    `SELECT e.public_id AS id, u.name, m.data AS mine
       FROM my_pieces m JOIN enrolments e ON e.id = m.enrolment_id JOIN users u ON u.id = e.user_id JOIN series s ON s.id = e.series_id
      WHERE s.slug = ? AND s.workroom_id = ? AND e.state = 'active' AND m.data <> '{}'
      ORDER BY m.updated_at DESC, m.enrolment_id DESC LIMIT ${String(MOST)}`,
    { replacements: [slug, workroomId ?? 0], type: QueryTypes.SELECT },
  );
}
