import { sql, type Migration } from '#server/db/migration.ts';

/** A piece that is off the loom: its photo, and what its maker writes down of it. */
export const createFinishedPieces: Migration = {
  name: '0034-create-finished-pieces',
  statements: [
    `CREATE TABLE IF NOT EXISTS finished_pieces (
      enrolment_id INT UNSIGNED NOT NULL PRIMARY KEY,
      media_id INT UNSIGNED NULL,
      said_at DATETIME(3) NULL,
      minutes INT UNSIGNED NULL,
      note VARCHAR(2000) NOT NULL DEFAULT '',
      yarns JSON NOT NULL,
      ${sql.stamps},
      UNIQUE KEY uq_finished_pieces_media_id (media_id),
      CONSTRAINT fk_finished_pieces_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE,
      CONSTRAINT fk_finished_pieces_media FOREIGN KEY (media_id) REFERENCES media (id)
    ) ${sql.end}`,
  ],
};
