/** What was shown before with the very same files. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { ProgressPhoto } from '#server/models/index.ts';

/** The newest showing of a thread that has every file of `digests`; null when none has. */
export async function shownWith(enrolmentId: number, lessonId: number, digests: readonly string[]): Promise<ProgressPhoto | null> {
  const wanted = [...new Set(digests)];
  const [row] = await sequelize.query<{ id: number }>(
    `SELECT p.id
       FROM progress_photos p
       JOIN media m ON m.id = p.media_id OR m.id IN (SELECT f.media_id FROM further_shots f WHERE f.photo_id = p.id)
      WHERE p.enrolment_id = :enrolmentId AND p.lesson_id = :lessonId AND m.digest IN (:wanted)
      GROUP BY p.id HAVING COUNT(DISTINCT m.digest) = :count
      ORDER BY p.id DESC LIMIT 1`,
    { replacements: { enrolmentId, lessonId, wanted, count: wanted.length }, type: QueryTypes.SELECT },
  );
  return row === undefined ? null : ProgressPhoto.findByPk(row.id);
}
