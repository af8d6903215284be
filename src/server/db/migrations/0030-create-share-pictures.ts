import { sql, type Migration } from '#server/db/migration.ts';

/** The picture that goes along where a series is passed on, and what it was drawn from. */
export const createSharePictures: Migration = {
  name: '0030-create-share-pictures',
  statements: [
    `CREATE TABLE IF NOT EXISTS share_pictures (
      series_id INT UNSIGNED NOT NULL PRIMARY KEY,
      drawing_hash ${sql.outside(64)} NOT NULL,
      file_key ${sql.outside(120)} NULL,
      drawn_of DATETIME(3) NOT NULL,
      ${sql.stamps},
      CONSTRAINT fk_share_pictures_series FOREIGN KEY (series_id) REFERENCES series (id) ON DELETE CASCADE
    ) ${sql.end}`,
  ],
};
