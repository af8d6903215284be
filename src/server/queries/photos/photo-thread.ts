/** All photos of one student at one checkpoint, in order, each with what was said of it. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface ThreadNote {
  readonly words: string;
  readonly xPermille: number | null;
  readonly yPermille: number | null;
}

export interface ThreadPhoto {
  readonly publicId: string;
  readonly mediaId: string;
  readonly width: number;
  readonly height: number;
  readonly words: string;
  readonly postedAt: Date;
  readonly verdict: 'waits' | 'weave-on' | 'mend-first';
  readonly verdictWords: string;
  readonly verdictAt: Date | null;
  readonly verdictBy: string | null;
  /** True when a helper answered, not the teacher. */
  readonly byHelper: boolean;
  readonly notes: readonly ThreadNote[];
}

interface NoteRow extends ThreadNote { photoId: number }
type PhotoRow = Omit<ThreadPhoto, 'notes' | 'byHelper'> & { id: number; byHelper: number };

export async function photoThread(enrolmentId: number, lessonId: number): Promise<ThreadPhoto[]> {
  const photos = await sequelize.query<PhotoRow>(
    `SELECT p.id, p.public_id AS publicId, m.public_id AS mediaId, m.width, m.height, p.words, p.created_at AS postedAt,
            p.verdict, p.verdict_words AS verdictWords, p.verdict_at AS verdictAt, b.name AS verdictBy,
            (b.id IS NOT NULL AND b.id <> w.owner_id) AS byHelper
       FROM progress_photos p
       JOIN media m ON m.id = p.media_id
       JOIN enrolments e ON e.id = p.enrolment_id
       JOIN series s ON s.id = e.series_id
       JOIN workrooms w ON w.id = s.workroom_id
       LEFT JOIN users b ON b.id = p.verdict_by_id
      WHERE p.enrolment_id = ? AND p.lesson_id = ?
      ORDER BY p.created_at, p.id`,
    { replacements: [enrolmentId, lessonId], type: QueryTypes.SELECT },
  );
  if (photos.length === 0) return [];
  const notes = await sequelize.query<NoteRow>(
    'SELECT photo_id AS photoId, words, x_permille AS xPermille, y_permille AS yPermille FROM photo_notes WHERE photo_id IN (:ids) ORDER BY photo_id, position',
    { replacements: { ids: photos.map(({ id }) => id) }, type: QueryTypes.SELECT },
  );
  return photos.map(({ id, byHelper, ...photo }) => ({
    ...photo,
    byHelper: byHelper === 1,
    notes: notes.filter(({ photoId }) => photoId === id).map(({ photoId: _photoId, ...note }) => note),
  }));
}
