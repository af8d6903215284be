import { sql, type Migration } from '#server/db/migration.ts';

export const createProgress: Migration = {
  name: '0006-create-progress',
  statements: [
    `CREATE TABLE IF NOT EXISTS my_pieces (
      enrolment_id INT UNSIGNED NOT NULL PRIMARY KEY,
      data JSON NOT NULL,
      revision INT UNSIGNED NOT NULL DEFAULT 0,
      ${sql.stamps},
      CONSTRAINT fk_my_pieces_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS ticks (
      enrolment_id INT UNSIGNED NOT NULL,
      subject ENUM('gather','step') NOT NULL,
      item_key ${sql.outside(100)} NOT NULL,
      is_ticked TINYINT(1) NOT NULL,
      changed_at DATETIME(3) NOT NULL,
      PRIMARY KEY (enrolment_id, subject, item_key),
      CONSTRAINT fk_ticks_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS lesson_visits (
      enrolment_id INT UNSIGNED NOT NULL,
      lesson_id INT UNSIGNED NOT NULL,
      finished_at DATETIME(3) NULL,
      video_ms INT UNSIGNED NOT NULL DEFAULT 0,
      ${sql.stamps},
      PRIMARY KEY (enrolment_id, lesson_id),
      CONSTRAINT fk_lesson_visits_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE,
      CONSTRAINT fk_lesson_visits_lesson FOREIGN KEY (lesson_id) REFERENCES lessons (id) ON DELETE CASCADE
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS progress_photos (
      ${sql.id}, ${sql.publicId},
      enrolment_id INT UNSIGNED NOT NULL,
      lesson_id INT UNSIGNED NOT NULL,
      media_id INT UNSIGNED NOT NULL,
      words VARCHAR(1000) NOT NULL DEFAULT '',
      verdict ENUM('waits','weave-on','mend-first') NOT NULL DEFAULT 'waits',
      verdict_words VARCHAR(2000) NOT NULL DEFAULT '',
      verdict_at DATETIME(3) NULL,
      verdict_by_id INT UNSIGNED NULL,
      ${sql.stamps},
      UNIQUE KEY uq_progress_photos_public_id (public_id),
      UNIQUE KEY uq_progress_photos_media_id (media_id),
      KEY ix_progress_photos_thread (enrolment_id, lesson_id, created_at),
      KEY ix_progress_photos_waiting (lesson_id, verdict, created_at),
      CONSTRAINT fk_progress_photos_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE,
      CONSTRAINT fk_progress_photos_lesson FOREIGN KEY (lesson_id) REFERENCES lessons (id),
      CONSTRAINT fk_progress_photos_media FOREIGN KEY (media_id) REFERENCES media (id),
      CONSTRAINT fk_progress_photos_verdict_by FOREIGN KEY (verdict_by_id) REFERENCES users (id)
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS photo_notes (
      ${sql.id},
      photo_id INT UNSIGNED NOT NULL,
      position INT UNSIGNED NOT NULL,
      words VARCHAR(600) NOT NULL,
      x_permille INT UNSIGNED NULL,
      y_permille INT UNSIGNED NULL,
      author_id INT UNSIGNED NOT NULL,
      ${sql.stamps},
      UNIQUE KEY uq_photo_notes_photo_position (photo_id, position),
      CONSTRAINT fk_photo_notes_photo FOREIGN KEY (photo_id) REFERENCES progress_photos (id) ON DELETE CASCADE,
      CONSTRAINT fk_photo_notes_author FOREIGN KEY (author_id) REFERENCES users (id)
    ) ${sql.end}`,
  ],
};
