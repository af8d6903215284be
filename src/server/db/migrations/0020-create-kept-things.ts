import { sql, type Migration } from '#server/db/migration.ts';

/** Things a teacher keeps for her gathering lists, and lines that can be put back. */
export const createKeptThings: Migration = {
  name: '0020-create-kept-things',
  statements: [
    `CREATE TABLE IF NOT EXISTS kept_things (
      ${sql.id}, ${sql.publicId},
      workroom_id INT UNSIGNED NOT NULL,
      kind ENUM('tool','yarn','material') NOT NULL,
      name VARCHAR(120) NOT NULL,
      look_out VARCHAR(300) NULL,
      get_from VARCHAR(200) NULL,
      stand_in VARCHAR(200) NULL,
      taken_out_at DATETIME(3) NULL,
      ${sql.stamps},
      UNIQUE KEY uq_kept_things_public_id (public_id),
      UNIQUE KEY uq_kept_things_name (workroom_id, kind, name),
      CONSTRAINT fk_kept_things_workroom FOREIGN KEY (workroom_id) REFERENCES workrooms (id) ON DELETE CASCADE
    ) ${sql.end}`,
    'ALTER TABLE gathering_items ADD COLUMN IF NOT EXISTS look_out VARCHAR(300) NULL AFTER note, ADD COLUMN IF NOT EXISTS get_from VARCHAR(200) NULL AFTER look_out, ADD COLUMN IF NOT EXISTS taken_out_at DATETIME(3) NULL AFTER get_from',
  ],
};
