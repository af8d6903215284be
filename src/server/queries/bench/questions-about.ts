/** What a student asked about her photos, for whoever judges the next one. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface AskedAboutPhoto {
  readonly question: string;
  readonly words: string;
  readonly isAnswered: boolean;
  /** Public id of the photo. */
  readonly photo: string;
  readonly postedAt: Date;
}

/** Of one seat at one checkpoint, the newest first. What was taken out is not among it. */
export async function questionsAbout(enrolmentId: number, lessonId: number, limit = 5): Promise<AskedAboutPhoto[]> {
  const rows = await sequelize.query<Omit<AskedAboutPhoto, 'isAnswered'> & { isAnswered: number }>(
    `SELECT q.public_id AS question, q.words, q.answered_at IS NOT NULL AS isAnswered, p.public_id AS photo, p.created_at AS postedAt
       FROM questions q JOIN progress_photos p ON p.id = q.photo_id
      WHERE q.enrolment_id = :enrolmentId AND q.lesson_id = :lessonId AND q.taken_out_at IS NULL
      ORDER BY q.created_at DESC, q.id DESC LIMIT :limit`,
    { replacements: { enrolmentId, lessonId, limit }, type: QueryTypes.SELECT },
  );
  return rows.map(({ isAnswered, ...row }) => ({ ...row, isAnswered: isAnswered === 1 }));
}
