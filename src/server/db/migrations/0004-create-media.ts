import { sql, type Migration } from '#server/db/migration.ts';

export const createMedia: Migration = {
  name: '0004-create-media',
  statements: [
    `CREATE TABLE IF NOT EXISTS media (
      ${sql.id}, ${sql.publicId},
      owner_id INT UNSIGNED NOT NULL,
      kind ENUM('photo','video','picture') NOT NULL,
      state ENUM('created','processing','ready','failed') NOT NULL DEFAULT 'created',
      original_name VARCHAR(120) NOT NULL,
      byte_count BIGINT NOT NULL DEFAULT 0,
      width INT UNSIGNED NULL,
      height INT UNSIGNED NULL,
      duration_ms INT UNSIGNED NULL,
      files JSON NOT NULL,
      detail JSON NOT NULL,
      failure VARCHAR(200) NULL,
      ${sql.stamps},
      UNIQUE KEY uq_media_public_id (public_id),
      KEY ix_media_state (state, created_at),
      CONSTRAINT fk_media_owner FOREIGN KEY (owner_id) REFERENCES users (id)
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS series_media (
      series_id INT UNSIGNED NOT NULL,
      name ${sql.outside(64)} NOT NULL,
      media_id INT UNSIGNED NOT NULL,
      title VARCHAR(120) NOT NULL DEFAULT '',
      ${sql.stamps},
      PRIMARY KEY (series_id, name),
      KEY ix_series_media_media_id (media_id),
      CONSTRAINT fk_series_media_series FOREIGN KEY (series_id) REFERENCES series (id) ON DELETE CASCADE,
      CONSTRAINT fk_series_media_media FOREIGN KEY (media_id) REFERENCES media (id)
    ) ${sql.end}`,
  ],
};
