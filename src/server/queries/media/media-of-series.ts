/** Videos and pictures of a series that are ready, by the names its lessons use. */
import { QueryTypes } from 'sequelize';
import type { MediaDetail, SeriesMediaFile } from '#contracts/media.ts';
import { sequelize } from '#server/db/sequelize.ts';

type Row = Omit<SeriesMediaFile, 'isDraft'> & { readonly isDraft: number };

/** As students see them. */
export function mediaOfSeries(seriesId: number): Promise<SeriesMediaFile[]> {
  return read(seriesId, 'm.id = s.media_id', 'm.detail', '0');
}

/** As they will be when the series is published next: a draft that is ready stands before what is published. */
export function mediaOnDesk(seriesId: number): Promise<SeriesMediaFile[]> {
  const draftReady = "EXISTS (SELECT 1 FROM media d WHERE d.id = s.draft_media_id AND d.state = 'ready')";
  return read(seriesId, `m.id = IF(${draftReady}, s.draft_media_id, s.media_id)`, 'COALESCE(m.draft_detail, m.detail)', '(m.draft_detail IS NOT NULL OR s.media_id IS NULL OR m.id <> s.media_id)');
}

async function read(seriesId: number, on: string, detail: string, isDraft: string): Promise<SeriesMediaFile[]> {
  const rows = await sequelize.query<Row>(
    `SELECT m.kind, s.name, s.title, m.public_id AS publicId, m.duration_ms AS durationMs, m.files, ${detail} AS detail, ${isDraft} AS isDraft
       FROM series_media s JOIN media m ON ${on}
      WHERE s.series_id = ? AND m.state = 'ready' AND m.kind IN ('picture', 'video')
      ORDER BY s.name`,
    { replacements: [seriesId], type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ ...row, detail: parsed(row.detail), isDraft: row.isDraft === 1 }));
}

/** The driver knows JSON columns, not what a function made of them. */
function parsed(detail: MediaDetail | string): MediaDetail {
  return typeof detail === 'string' ? (JSON.parse(detail) as MediaDetail) : detail;
}
