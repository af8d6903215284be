import { sql, type Migration } from '#server/db/migration.ts';

/** Which parts have opened for whom, and who was told, so that nobody is told twice. */
export const createOpenings: Migration = {
  name: '0010-create-openings',
  statements: [
    `CREATE TABLE IF NOT EXISTS part_openings (
      enrolment_id INT UNSIGNED NOT NULL,
      lesson_id INT UNSIGNED NOT NULL,
      told_by ENUM('seat','letter','verdict') NOT NULL,
      opened_at DATETIME(3) NOT NULL,
      PRIMARY KEY (enrolment_id, lesson_id),
      CONSTRAINT fk_part_openings_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE,
      CONSTRAINT fk_part_openings_lesson FOREIGN KEY (lesson_id) REFERENCES lessons (id) ON DELETE CASCADE
    ) ${sql.end}`,
    'ALTER TABLE enrolments ADD COLUMN IF NOT EXISTS openings_begun_at DATETIME(3) NULL',
  ],
};
