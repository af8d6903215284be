import { sql, type Migration } from '#server/db/migration.ts';

/** Videos that arrive in pieces and are made ready by the worker; drafts beside what students see; kept places. */
export const createVideos: Migration = {
  name: '0008-create-videos',
  statements: [
    `ALTER TABLE media
      MODIFY state ENUM('created','uploaded','probing','processing','ready','failed') NOT NULL DEFAULT 'created',
      ADD COLUMN IF NOT EXISTS progress_permille INT UNSIGNED NOT NULL DEFAULT 0,
      ADD COLUMN IF NOT EXISTS draft_detail JSON NULL,
      ADD COLUMN IF NOT EXISTS revision INT UNSIGNED NOT NULL DEFAULT 0`,
    `ALTER TABLE series_media
      MODIFY media_id INT UNSIGNED NULL,
      ADD COLUMN IF NOT EXISTS draft_media_id INT UNSIGNED NULL,
      ADD COLUMN IF NOT EXISTS lesson_id INT UNSIGNED NULL,
      ADD KEY IF NOT EXISTS ix_series_media_draft_media_id (draft_media_id),
      ADD CONSTRAINT fk_series_media_draft_media FOREIGN KEY IF NOT EXISTS (draft_media_id) REFERENCES media (id),
      ADD CONSTRAINT fk_series_media_lesson FOREIGN KEY IF NOT EXISTS (lesson_id) REFERENCES lessons (id) ON DELETE SET NULL`,
    `CREATE TABLE IF NOT EXISTS video_uploads (
      media_id INT UNSIGNED NOT NULL PRIMARY KEY,
      byte_count BIGINT NOT NULL,
      held_by ${sql.outside(64)} NULL,
      held_until DATETIME(3) NULL,
      is_wanted TINYINT(1) NOT NULL DEFAULT 0,
      ${sql.stamps},
      KEY ix_video_uploads_created_at (created_at),
      CONSTRAINT fk_video_uploads_media FOREIGN KEY (media_id) REFERENCES media (id) ON DELETE CASCADE
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS video_places (
      enrolment_id INT UNSIGNED NOT NULL,
      name ${sql.outside(64)} NOT NULL,
      place_ms INT UNSIGNED NOT NULL DEFAULT 0,
      furthest_ms INT UNSIGNED NOT NULL DEFAULT 0,
      ${sql.stamps},
      PRIMARY KEY (enrolment_id, name),
      CONSTRAINT fk_video_places_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE
    ) ${sql.end}`,
  ],
};
