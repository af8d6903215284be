import { sql, type Migration } from '#server/db/migration.ts';

/** Rows counted at the loom: one tally for each band and device, so that devices add up and no clock is asked. */
export const createRowTallies: Migration = {
  name: '0026-create-row-tallies',
  statements: [
    `CREATE TABLE IF NOT EXISTS row_tallies (
      enrolment_id INT UNSIGNED NOT NULL,
      band_key ${sql.outside(64)} NOT NULL,
      device ${sql.outside(32)} NOT NULL,
      counted INT NOT NULL,
      version INT UNSIGNED NOT NULL,
      ${sql.stamps},
      PRIMARY KEY (enrolment_id, band_key, device),
      CONSTRAINT fk_row_tallies_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE
    ) ${sql.end}`,
  ],
};
