/** Pictures that go along where a series is passed on: which there are, and which have to be drawn or taken away. */
import { QueryTypes } from 'sequelize';
import type { Piece } from '#core/craft/crafts.ts';
import { sequelize } from '#server/db/sequelize.ts';

export interface ToDraw {
  readonly seriesId: number;
  readonly publicId: string;
  readonly title: string;
  readonly teacherName: string;
  readonly workroomName: string;
  readonly data: Piece | null;
  readonly changedAt: Date;
}

/* All that is on the picture: title, piece, who teaches it, where. */
const CHANGED = 'GREATEST(s.updated_at, w.updated_at, u.updated_at, COALESCE(p.updated_at, s.updated_at))';

/** Open series whose picture is missing or of an earlier state, at most `limit`. */
export function picturesToDraw(limit: number): Promise<ToDraw[]> {
  return sequelize.query<ToDraw>(
    `SELECT s.id AS seriesId, s.public_id AS publicId, s.title, u.name AS teacherName, w.name AS workroomName, p.data, ${CHANGED} AS changedAt
       FROM series s JOIN workrooms w ON w.id = s.workroom_id JOIN users u ON u.id = w.owner_id
       LEFT JOIN pieces p ON p.series_id = s.id LEFT JOIN share_pictures sp ON sp.series_id = s.id
      WHERE s.state = 'published' AND (sp.series_id IS NULL OR sp.drawn_of < ${CHANGED})
      ORDER BY s.id LIMIT :limit`,
    { replacements: { limit }, type: QueryTypes.SELECT },
  );
}

/** Pictures of series that are open no more. */
export function picturesToTakeAway(): Promise<{ seriesId: number; fileKey: string | null }[]> {
  return sequelize.query("SELECT sp.series_id AS seriesId, sp.file_key AS fileKey FROM share_pictures sp JOIN series s ON s.id = sp.series_id WHERE s.state <> 'published'", { type: QueryTypes.SELECT });
}

/** Of an open series; null while there is none. `version` changes with the picture. */
export async function sharePictureOf(slug: string): Promise<{ readonly fileKey: string; readonly version: string } | null> {
  const [row] = await sequelize.query<{ fileKey: string; drawingHash: string }>(
    "SELECT sp.file_key AS fileKey, sp.drawing_hash AS drawingHash FROM share_pictures sp JOIN series s ON s.id = sp.series_id WHERE s.slug = ? AND s.state = 'published' AND sp.file_key IS NOT NULL",
    { replacements: [slug], type: QueryTypes.SELECT },
  );
  return row === undefined ? null : { fileKey: row.fileKey, version: row.drawingHash.slice(0, 12) };
}
