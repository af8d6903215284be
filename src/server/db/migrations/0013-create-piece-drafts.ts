import { sql, type Migration } from '#server/db/migration.ts';

/** Pattern pieces as they stand in their form: kept while they are described, whether they can be woven yet or not. */
export const createPieceDrafts: Migration = {
  name: '0013-create-piece-drafts',
  statements: [
    `CREATE TABLE IF NOT EXISTS piece_drafts (
      series_id INT UNSIGNED NOT NULL PRIMARY KEY,
      texts JSON NULL,
      set_aside JSON NULL,
      author_id INT UNSIGNED NULL,
      written_at DATETIME(3) NOT NULL,
      revision INT UNSIGNED NOT NULL DEFAULT 0,
      ${sql.stamps},
      CONSTRAINT fk_piece_drafts_series FOREIGN KEY (series_id) REFERENCES series (id) ON DELETE CASCADE,
      CONSTRAINT fk_piece_drafts_author FOREIGN KEY (author_id) REFERENCES users (id)
    ) ${sql.end}`,
  ],
};
