import { sql, type Migration } from '#server/db/migration.ts';

/** Series folders on their way in: what came, how far the worker is, and how it ended. */
export const createSeriesImports: Migration = {
  name: '0022-create-series-imports',
  statements: [
    `CREATE TABLE IF NOT EXISTS series_imports (
      ${sql.id},
      ${sql.publicId},
      owner_id INT UNSIGNED NOT NULL,
      workroom_id INT UNSIGNED NOT NULL,
      press_key ${sql.outside(36)} NOT NULL,
      file_name VARCHAR(200) NOT NULL,
      byte_count INT UNSIGNED NOT NULL,
      state ENUM('waiting','done','refused') NOT NULL DEFAULT 'waiting',
      round INT UNSIGNED NOT NULL DEFAULT 0,
      files_done INT UNSIGNED NOT NULL DEFAULT 0,
      files_all INT UNSIGNED NOT NULL DEFAULT 0,
      media_ids JSON NOT NULL DEFAULT '[]',
      series_id INT UNSIGNED NULL,
      told JSON NULL,
      ${sql.stamps},
      UNIQUE KEY uq_series_imports_public_id (public_id),
      UNIQUE KEY uq_series_imports_press (owner_id, press_key, byte_count),
      KEY ix_series_imports_state (state, id),
      CONSTRAINT fk_series_imports_owner FOREIGN KEY (owner_id) REFERENCES users (id) ON DELETE CASCADE,
      CONSTRAINT fk_series_imports_workroom FOREIGN KEY (workroom_id) REFERENCES workrooms (id) ON DELETE CASCADE,
      CONSTRAINT fk_series_imports_series FOREIGN KEY (series_id) REFERENCES series (id) ON DELETE SET NULL
    ) ${sql.end}`,
    "ALTER TABLE notice_receipts MODIFY COLUMN kind ENUM('notice','nudge','opening','verdict','seat','answer','folder') NOT NULL",
  ],
};
