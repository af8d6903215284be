import { sql, type Migration } from '#server/db/migration.ts';

/** Which text of a part a student has read, so that she can be told what changed since. Says nothing of what she has done. */
export const createLessonReads: Migration = {
  name: '0021-create-lesson-reads',
  statements: [
    `CREATE TABLE IF NOT EXISTS lesson_reads (
      enrolment_id INT UNSIGNED NOT NULL,
      lesson_id INT UNSIGNED NOT NULL,
      version_id INT UNSIGNED NOT NULL,
      ${sql.stamps},
      PRIMARY KEY (enrolment_id, lesson_id),
      CONSTRAINT fk_lesson_reads_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE,
      CONSTRAINT fk_lesson_reads_lesson FOREIGN KEY (lesson_id) REFERENCES lessons (id) ON DELETE CASCADE,
      CONSTRAINT fk_lesson_reads_version FOREIGN KEY (version_id) REFERENCES lesson_versions (id) ON DELETE CASCADE
    ) ${sql.end}`,
  ],
};
