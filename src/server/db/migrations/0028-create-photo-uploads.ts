import { sql, type Migration } from '#server/db/migration.ts';

/** Photos that arrive in pieces, several of them in one showing, and the same file known again. */
export const createPhotoUploads: Migration = {
  name: '0028-create-photo-uploads',
  statements: [
    `CREATE TABLE IF NOT EXISTS photo_uploads (
      media_id INT UNSIGNED NOT NULL PRIMARY KEY,
      byte_count BIGINT NOT NULL,
      held_by ${sql.outside(64)} NULL,
      held_until DATETIME(3) NULL,
      is_wanted TINYINT(1) NOT NULL DEFAULT 0,
      ${sql.stamps},
      KEY ix_photo_uploads_created_at (created_at),
      CONSTRAINT fk_photo_uploads_media FOREIGN KEY (media_id) REFERENCES media (id) ON DELETE CASCADE
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS further_shots (
      photo_id INT UNSIGNED NOT NULL,
      shot INT UNSIGNED NOT NULL,
      media_id INT UNSIGNED NOT NULL,
      PRIMARY KEY (photo_id, shot),
      UNIQUE KEY uq_further_shots_media_id (media_id),
      CONSTRAINT fk_further_shots_photo FOREIGN KEY (photo_id) REFERENCES progress_photos (id) ON DELETE CASCADE,
      CONSTRAINT fk_further_shots_media FOREIGN KEY (media_id) REFERENCES media (id)
    ) ${sql.end}`,
    'ALTER TABLE photo_notes ADD COLUMN IF NOT EXISTS shot INT UNSIGNED NOT NULL DEFAULT 1 AFTER position',
    `ALTER TABLE media ADD COLUMN IF NOT EXISTS digest ${sql.outside(64)} NULL AFTER byte_count`,
  ],
};
