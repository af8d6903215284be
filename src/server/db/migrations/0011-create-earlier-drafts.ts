import { sql, type Migration } from '#server/db/migration.ts';

/** Texts of parts that another text took the place of before they were published. */
export const createEarlierDrafts: Migration = {
  name: '0011-create-earlier-drafts',
  statements: [
    `CREATE TABLE IF NOT EXISTS earlier_drafts (
      ${sql.id}, ${sql.publicId},
      lesson_id INT UNSIGNED NOT NULL,
      source MEDIUMTEXT NOT NULL,
      author_id INT UNSIGNED NULL,
      written_at DATETIME(3) NOT NULL,
      ${sql.born},
      UNIQUE KEY uq_earlier_drafts_public_id (public_id),
      KEY ix_earlier_drafts_lesson (lesson_id, written_at),
      CONSTRAINT fk_earlier_drafts_lesson FOREIGN KEY (lesson_id) REFERENCES lessons (id) ON DELETE CASCADE,
      CONSTRAINT fk_earlier_drafts_author FOREIGN KEY (author_id) REFERENCES users (id)
    ) ${sql.end}`,
  ],
};
