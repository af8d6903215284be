import { sql, type Migration } from '#server/db/migration.ts';

/** What a student has of a yarn at home, taken off what she is told to buy. */
export const createStashes: Migration = {
  name: '0025-create-stashes',
  statements: [
    `CREATE TABLE IF NOT EXISTS stashes (
      enrolment_id INT UNSIGNED NOT NULL,
      yarn_key VARCHAR(160) NOT NULL,
      amount DOUBLE NOT NULL,
      unit ENUM('g', 'mm', 'balls') NOT NULL,
      ${sql.stamps},
      PRIMARY KEY (enrolment_id, yarn_key),
      CONSTRAINT fk_stashes_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE
    ) ${sql.end}`,
  ],
};
