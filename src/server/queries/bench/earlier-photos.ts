/** What a student has shown before in one series, at whatever checkpoint, shot by shot: to lay beside the photo in hand. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { PART_NUMBER } from '#server/queries/lessons/part-number.ts';

export interface EarlierPhoto {
  readonly publicId: string;
  readonly mediaId: string;
  readonly width: number;
  readonly height: number;
  readonly postedAt: Date;
  readonly partNumber: number;
  readonly verdict: 'waits' | 'weave-on' | 'mend-first';
}

/** Photos of the seat older than `publicId`, the newest first. */
export function earlierPhotos(enrolmentId: number, publicId: string, limit = 8): Promise<EarlierPhoto[]> {
  return sequelize.query<EarlierPhoto>(
    `SELECT p.public_id AS publicId, m.public_id AS mediaId, m.width, m.height, p.created_at AS postedAt, p.verdict,
            ${PART_NUMBER} AS partNumber
       FROM progress_photos p
       JOIN progress_photos shown ON shown.public_id = :publicId
       JOIN media m ON m.id = p.media_id OR m.id IN (SELECT f.media_id FROM further_shots f WHERE f.photo_id = p.id)
       JOIN lessons l ON l.id = p.lesson_id
      WHERE p.enrolment_id = :enrolmentId AND (p.created_at, p.id) < (shown.created_at, shown.id)
      ORDER BY p.created_at DESC, p.id DESC, m.id = p.media_id DESC, m.id LIMIT :limit`,
    { replacements: { enrolmentId, publicId, limit }, type: QueryTypes.SELECT },
  );
}
