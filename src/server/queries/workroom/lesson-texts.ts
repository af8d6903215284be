/** The texts a part had: those that were published, and those that were set aside. Newest first. */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface EarlierText {
  /** `v3` for a published version, else its public id: the name by which it is compared and taken up again. */
  readonly key: string;
  /** Null for a text that was never published. */
  readonly number: number | null;
  readonly at: Date;
  /** Null for one that came in with a folder. */
  readonly authorName: string | null;
}

const TEXTS = `
  SELECT CONCAT('v', v.number) AS \`key\`, v.number, v.created_at AS at, u.name AS authorName
    FROM lesson_versions v JOIN lessons l ON l.id = v.lesson_id LEFT JOIN users u ON u.id = v.author_id
   WHERE l.public_id = :lesson
  UNION ALL
  SELECT d.public_id, NULL, d.written_at, u.name
    FROM earlier_drafts d JOIN lessons l ON l.id = d.lesson_id LEFT JOIN users u ON u.id = d.author_id
   WHERE l.public_id = :lesson AND BINARY d.source <> l.draft_source
   ORDER BY at DESC LIMIT 100`;

/** The last hundred, without one that is the draft of now again. `lesson` is a public id that the asker was allowed to see by lessonDesk. */
export async function lessonTexts(lesson: string): Promise<EarlierText[]> {
  return sequelize.query<EarlierText>(TEXTS, { replacements: { lesson }, type: QueryTypes.SELECT });
}

/** The words of one of them by its key; null when the part has none of that name. */
export async function lessonText(lesson: string, key: string): Promise<string | null> {
  const [number] = /^v(\d{1,6})$/.exec(key)?.slice(1).map(Number) ?? [];
  const [row] = await sequelize.query<{ source: string }>(
    number === undefined
      ? 'SELECT d.source FROM earlier_drafts d JOIN lessons l ON l.id = d.lesson_id WHERE l.public_id = ? AND d.public_id = ?'
      : 'SELECT v.source FROM lesson_versions v JOIN lessons l ON l.id = v.lesson_id WHERE l.public_id = ? AND v.number = ?',
    { replacements: [lesson, number ?? key], type: QueryTypes.SELECT },
  );
  return row?.source ?? null;
}
