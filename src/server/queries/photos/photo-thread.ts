/** All showings of one student at one checkpoint, in order, each with its shots and what was said of them. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface ThreadNote {
  readonly words: string;
  /** Which shot it is about; 1 for the first. */
  readonly shot: number;
  readonly xPermille: number | null;
  readonly yPermille: number | null;
}

export interface ThreadShot {
  readonly mediaId: string;
  readonly width: number;
  readonly height: number;
}

export interface ThreadPhoto {
  readonly publicId: string;
  /** At least one. */
  readonly shots: readonly ThreadShot[];
  readonly words: string;
  readonly postedAt: Date;
  readonly verdict: 'waits' | 'weave-on' | 'mend-first';
  readonly verdictWords: string;
  /** Where it says how to mend it. */
  readonly see: string | null;
  readonly verdictAt: Date | null;
  readonly verdictBy: string | null;
  /** True when a helper answered, not the teacher. */
  readonly byHelper: boolean;
  readonly notes: readonly ThreadNote[];
}

interface NoteRow extends ThreadNote { photoId: number }
interface ShotRow extends ThreadShot { photoId: number }
type PhotoRow = Omit<ThreadPhoto, 'shots' | 'notes' | 'byHelper'> & { id: number; byHelper: number };

export async function photoThread(enrolmentId: number, lessonId: number): Promise<ThreadPhoto[]> {
  const photos = await sequelize.query<PhotoRow>(
    `SELECT p.id, p.public_id AS publicId, p.words, p.created_at AS postedAt,
            p.verdict, p.verdict_words AS verdictWords, p.see, p.verdict_at AS verdictAt, b.name AS verdictBy,
            (b.id IS NOT NULL AND b.id <> w.owner_id) AS byHelper
       FROM progress_photos p
       JOIN enrolments e ON e.id = p.enrolment_id
       JOIN series s ON s.id = e.series_id
       JOIN workrooms w ON w.id = s.workroom_id
       LEFT JOIN users b ON b.id = p.verdict_by_id
      WHERE p.enrolment_id = ? AND p.lesson_id = ?
      ORDER BY p.created_at, p.id`,
    { replacements: [enrolmentId, lessonId], type: QueryTypes.SELECT },
  );
  if (photos.length === 0) return [];
  const ids = photos.map(({ id }) => id);
  const shots = await sequelize.query<ShotRow>(
    `SELECT s.photoId, m.public_id AS mediaId, m.width, m.height
       FROM (SELECT id AS photoId, 1 AS shot, media_id FROM progress_photos WHERE id IN (:ids)
             UNION ALL SELECT photo_id, shot, media_id FROM further_shots WHERE photo_id IN (:ids)) s
       JOIN media m ON m.id = s.media_id
      ORDER BY s.photoId, s.shot`,
    { replacements: { ids }, type: QueryTypes.SELECT },
  );
  const notes = await sequelize.query<NoteRow>(
    'SELECT photo_id AS photoId, words, shot, x_permille AS xPermille, y_permille AS yPermille FROM photo_notes WHERE photo_id IN (:ids) ORDER BY photo_id, position',
    { replacements: { ids }, type: QueryTypes.SELECT },
  );
  return photos.map(({ id, byHelper, ...photo }) => ({
    ...photo,
    byHelper: byHelper === 1,
    shots: shots.filter(({ photoId }) => photoId === id).map(({ photoId: _photoId, ...shot }) => shot),
    notes: notes.filter(({ photoId }) => photoId === id).map(({ photoId: _photoId, ...note }) => note),
  }));
}
