/** The texts of a part that were published, newest first. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface VersionEntry {
  readonly number: number;
  readonly publishedAt: Date;
  /** Null for one that came in with a folder. */
  readonly authorName: string | null;
}

/** The last fifty. `lesson` is a public id that the asker was allowed to see by lessonDesk. */
export async function lessonVersions(lesson: string): Promise<VersionEntry[]> {
  return sequelize.query<VersionEntry>(
    `SELECT v.number, v.created_at AS publishedAt, u.name AS authorName
       FROM lesson_versions v JOIN lessons l ON l.id = v.lesson_id LEFT JOIN users u ON u.id = v.author_id
      WHERE l.public_id = ? ORDER BY v.number DESC LIMIT 50`,
    { replacements: [lesson], type: QueryTypes.SELECT },
  );
}

/** The text of one of them; null when there is none of that number. */
export async function versionSource(lesson: string, number: number): Promise<string | null> {
  const [row] = await sequelize.query<{ source: string }>(
    'SELECT v.source FROM lesson_versions v JOIN lessons l ON l.id = v.lesson_id WHERE l.public_id = ? AND v.number = ?',
    { replacements: [lesson, number], type: QueryTypes.SELECT },
  );
  return row?.source ?? null;
}
