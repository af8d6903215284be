import { sql, type Migration } from '#server/db/migration.ts';

/** Time at the loom, as the student says it herself: nothing is measured. */
export const createWeavingTimes: Migration = {
  name: '0027-create-weaving-times',
  statements: [
    `CREATE TABLE IF NOT EXISTS weaving_times (
      ${sql.id}, ${sql.publicId},
      enrolment_id INT UNSIGNED NOT NULL,
      day ${sql.outside(10)} NOT NULL,
      minutes INT UNSIGNED NOT NULL,
      ${sql.stamps},
      UNIQUE KEY uq_weaving_times_public_id (public_id),
      KEY ix_weaving_times_enrolment_id_day (enrolment_id, day),
      CONSTRAINT fk_weaving_times_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE
    ) ${sql.end}`,
  ],
};
