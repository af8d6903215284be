/** Videos and pictures of a series that are ready, by the names its lessons use. */
import { QueryTypes } from 'sequelize';
import type { SeriesMediaFile } from '#contracts/media.ts';
import { sequelize } from '#server/db/sequelize.ts';

export async function mediaOfSeries(seriesId: number): Promise<SeriesMediaFile[]> {
  return sequelize.query<SeriesMediaFile>(
    `SELECT m.kind, s.name, s.title, m.public_id AS publicId, m.files, m.detail
       FROM series_media s JOIN media m ON m.id = s.media_id
      WHERE s.series_id = ? AND m.state = 'ready' AND m.kind IN ('picture', 'video')
      ORDER BY s.name`,
    { replacements: [seriesId], type: QueryTypes.SELECT },
  );
}
