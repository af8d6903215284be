/** What is open to everybody, for those who read the shop by program: feeds, search engines. Nothing of a draft is in it. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface OpenSeries {
  readonly publicId: string;
  readonly slug: string;
  readonly title: string;
  readonly summary: string;
  readonly techniques: readonly string[];
  readonly teacherName: string;
  readonly workroomName: string;
  readonly handle: string;
  readonly publishedAt: Date;
  /** When something last changed that a visitor can see: words, price, piece, or a part that went out. */
  readonly changedAt: Date;
}

export interface OpenPart {
  readonly slug: string;
  readonly number: number;
  readonly changedAt: Date;
}

/* A part's own row changes with each draft; what visitors see of it changes when a version goes out. */
const CHANGED = `GREATEST(s.updated_at, COALESCE(p.updated_at, s.updated_at), COALESCE(
         (SELECT MAX(v.created_at) FROM lessons l JOIN lesson_versions v ON v.id = l.published_version_id WHERE l.series_id = s.id AND l.taken_out_at IS NULL), s.updated_at))`;

/** At most `limit`, newest first; of one workroom, if it is named. One statement. */
export function openSeries({ handle = null, limit }: { readonly handle?: string | null; readonly limit: number }): Promise<OpenSeries[]> {
  return sequelize.query<OpenSeries>(
    `SELECT s.public_id AS publicId, s.slug, s.title, s.summary, s.techniques, u.name AS teacherName, w.name AS workroomName, w.handle, s.published_at AS publishedAt, ${CHANGED} AS changedAt
       FROM series s JOIN workrooms w ON w.id = s.workroom_id JOIN users u ON u.id = w.owner_id LEFT JOIN pieces p ON p.series_id = s.id
      WHERE s.state = 'published' AND s.published_at IS NOT NULL AND (:handle IS NULL OR w.handle = :handle)
      ORDER BY s.published_at DESC, s.id DESC LIMIT :limit`,
    { replacements: { handle, limit }, type: QueryTypes.SELECT },
  );
}

/** Parts that everybody may read, by the numbers visitors meet them under. One statement. */
export async function openParts(limit: number): Promise<OpenPart[]> {
  const rows = await sequelize.query<OpenPart & { readonly isPreview: number }>(
    `SELECT s.slug, l.is_preview AS isPreview, v.created_at AS changedAt, CAST(ROW_NUMBER() OVER (PARTITION BY s.id ORDER BY l.position, l.id) AS SIGNED) AS number
       FROM series s JOIN lessons l ON l.series_id = s.id AND l.taken_out_at IS NULL JOIN lesson_versions v ON v.id = l.published_version_id
      WHERE s.state = 'published'
      ORDER BY s.id, number`,
    { type: QueryTypes.SELECT },
  );
  return rows.filter(({ isPreview }) => isPreview === 1).slice(0, limit).map(({ slug, number, changedAt }) => ({ slug, number, changedAt }));
}
