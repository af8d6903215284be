import { sql, type Migration } from '#server/db/migration.ts';

/** Looms a person has at home, to be chosen for any series. */
export const createOwnLooms: Migration = {
  name: '0032-create-own-looms',
  statements: [
    `CREATE TABLE IF NOT EXISTS own_looms (
      ${sql.id}, ${sql.publicId},
      user_id INT UNSIGNED NOT NULL,
      name VARCHAR(60) NOT NULL,
      data JSON NOT NULL,
      taken_out_at DATETIME(3) NULL,
      ${sql.stamps},
      UNIQUE KEY uq_own_looms_public_id (public_id),
      UNIQUE KEY uq_own_looms_name (user_id, name),
      CONSTRAINT fk_own_looms_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
    ) ${sql.end}`,
  ],
};
