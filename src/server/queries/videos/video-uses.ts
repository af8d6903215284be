/** Which parts of a series speak of a video: in the text that students read, in the draft, or in both. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface VideoUse {
  /** Public id of the part. */
  readonly part: string;
  readonly number: number;
  readonly title: string;
  readonly inDraft: boolean;
  readonly isPublished: boolean;
}

/** In the order of the parts; only those that speak of it. */
export async function videoUses(seriesId: number, name: string): Promise<VideoUse[]> {
  const rows = await sequelize.query<{ part: string; title: string; inDraft: number; isPublished: number }>(
    `SELECT l.public_id AS part, l.title,
            COALESCE(JSON_CONTAINS(JSON_EXTRACT(l.draft_reading, '$.media[*].name'), JSON_QUOTE(:name)), 0) AS inDraft,
            COALESCE(JSON_CONTAINS(JSON_EXTRACT(v.facts, '$.media[*].name'), JSON_QUOTE(:name)), 0) AS isPublished
       FROM lessons l LEFT JOIN lesson_versions v ON v.id = l.published_version_id
      WHERE l.series_id = :seriesId AND l.taken_out_at IS NULL
      ORDER BY l.position, l.id`,
    { replacements: { seriesId, name }, type: QueryTypes.SELECT },
  );
  return rows.flatMap(({ part, title, inDraft, isPublished }, index) => (inDraft === 0 && isPublished === 0 ? [] : [{ part, number: index + 1, title, inDraft: inDraft === 1, isPublished: isPublished === 1 }]));
}
