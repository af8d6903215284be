/** What was said at the bench: one's own verdicts that can be taken back, and who answered what in the last days. */
import { QueryTypes } from 'sequelize';
import type { Actor } from '#server/context.ts';
import { sequelize } from '#server/db/sequelize.ts';
import { workroomsOf } from '#server/policies/workroom.ts';
import { PART_NUMBER } from '#server/queries/lessons/part-number.ts';

export interface HeldOne {
  /** Public id of the photo. */
  readonly photo: string;
  readonly studentName: string;
  readonly verdict: 'weave-on' | 'mend-first';
}

/** Verdicts of this person that have not gone out, the newest first. */
export async function heldBy(actor: Actor): Promise<HeldOne[]> {
  return sequelize.query<HeldOne>(
    `SELECT p.public_id AS photo, u.name AS studentName, h.verdict
       FROM held_verdicts h
       JOIN progress_photos p ON p.id = h.photo_id
       JOIN enrolments e ON e.id = p.enrolment_id
       JOIN users u ON u.id = e.user_id
      WHERE h.by_id = ? AND h.goes_out_at IS NOT NULL
      ORDER BY h.goes_out_at DESC LIMIT 3`,
    { replacements: [actor.userId], type: QueryTypes.SELECT },
  );
}

export interface AnsweredOne {
  readonly photo: string;
  readonly mediaId: string;
  readonly studentName: string;
  readonly seriesSlug: string;
  readonly partNumber: number;
  readonly verdict: 'weave-on' | 'mend-first';
  readonly answeredAt: Date;
  readonly by: string;
  /** True when a helper answered, not the teacher. */
  readonly byHelper: boolean;
}

/** The last verdicts of these workrooms, whoever gave them, the newest first. */
export async function answeredLately(actor: Actor, limit = 6): Promise<AnsweredOne[]> {
  const workrooms = workroomsOf(actor);
  if (workrooms.length === 0) return [];
  const rows = await sequelize.query<Omit<AnsweredOne, 'byHelper'> & { byHelper: number }>(
    `SELECT p.public_id AS photo, m.public_id AS mediaId, u.name AS studentName, s.slug AS seriesSlug, p.verdict, p.verdict_at AS answeredAt,
            ${PART_NUMBER} AS partNumber,
            b.name AS \`by\`, b.id <> w.owner_id AS byHelper
       FROM progress_photos p
       JOIN media m ON m.id = p.media_id
       JOIN enrolments e ON e.id = p.enrolment_id
       JOIN users u ON u.id = e.user_id
       JOIN series s ON s.id = e.series_id
       JOIN workrooms w ON w.id = s.workroom_id
       JOIN lessons l ON l.id = p.lesson_id
       JOIN users b ON b.id = p.verdict_by_id
      WHERE s.workroom_id IN (:workrooms) AND p.verdict <> 'waits'
      ORDER BY p.verdict_at DESC, p.id DESC LIMIT :limit`,
    { replacements: { workrooms, limit }, type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ ...row, byHelper: row.byHelper === 1 }));
}
