import { sql, type Migration } from '#server/db/migration.ts';

export const createWorkrooms: Migration = {
  name: '0002-create-workrooms',
  statements: [
    `CREATE TABLE IF NOT EXISTS workrooms (
      ${sql.id}, ${sql.publicId},
      owner_id INT UNSIGNED NOT NULL,
      handle ${sql.outside(40)} NOT NULL,
      name VARCHAR(120) NOT NULL,
      about TEXT NOT NULL DEFAULT '',
      time_zone VARCHAR(64) NOT NULL,
      currency CHAR(3) NOT NULL DEFAULT 'EUR',
      answer_days INT UNSIGNED NOT NULL DEFAULT 2,
      ${sql.stamps},
      UNIQUE KEY uq_workrooms_public_id (public_id),
      UNIQUE KEY uq_workrooms_handle (handle),
      UNIQUE KEY uq_workrooms_owner_id (owner_id),
      CONSTRAINT fk_workrooms_owner FOREIGN KEY (owner_id) REFERENCES users (id)
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS workroom_helpers (
      workroom_id INT UNSIGNED NOT NULL,
      user_id INT UNSIGNED NOT NULL,
      ${sql.born},
      PRIMARY KEY (workroom_id, user_id),
      KEY ix_workroom_helpers_user_id (user_id),
      CONSTRAINT fk_workroom_helpers_workroom FOREIGN KEY (workroom_id) REFERENCES workrooms (id) ON DELETE CASCADE,
      CONSTRAINT fk_workroom_helpers_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
    ) ${sql.end}`,
  ],
};
