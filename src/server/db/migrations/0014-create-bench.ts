import { sql, type Migration } from '#server/db/migration.ts';

/** Verdicts that have not gone out yet, and the phrases of a workroom. */
export const createBench: Migration = {
  name: '0014-create-bench',
  statements: [
    `CREATE TABLE IF NOT EXISTS held_verdicts (
      photo_id INT UNSIGNED NOT NULL PRIMARY KEY,
      by_id INT UNSIGNED NOT NULL,
      verdict ENUM('weave-on','mend-first') NOT NULL,
      words VARCHAR(2000) NOT NULL DEFAULT '',
      notes JSON NOT NULL,
      round INT UNSIGNED NOT NULL,
      goes_out_at DATETIME(3) NULL,
      ${sql.stamps},
      KEY ix_held_verdicts_by (by_id, goes_out_at),
      CONSTRAINT fk_held_verdicts_photo FOREIGN KEY (photo_id) REFERENCES progress_photos (id) ON DELETE CASCADE,
      CONSTRAINT fk_held_verdicts_by FOREIGN KEY (by_id) REFERENCES users (id)
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS stock_phrases (
      workroom_id INT UNSIGNED NOT NULL,
      position INT UNSIGNED NOT NULL,
      words VARCHAR(300) NOT NULL,
      PRIMARY KEY (workroom_id, position),
      CONSTRAINT fk_stock_phrases_workroom FOREIGN KEY (workroom_id) REFERENCES workrooms (id) ON DELETE CASCADE
    ) ${sql.end}`,
  ],
};
