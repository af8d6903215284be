import { sql, type Migration } from '#server/db/migration.ts';

/** Pieces on the shared wall: what each maker agreed to show, since when, and until when. */
export const createWallPieces: Migration = {
  name: '0035-create-wall-pieces',
  statements: [
    `CREATE TABLE IF NOT EXISTS wall_pieces (
      ${sql.id}, ${sql.publicId},
      enrolment_id INT UNSIGNED NOT NULL,
      media_id INT UNSIGNED NULL,
      shown_name VARCHAR(80) NOT NULL,
      words VARCHAR(500) NOT NULL DEFAULT '',
      agreed_at DATETIME(3) NOT NULL,
      agreed_to ${sql.outside(20)} NOT NULL,
      withdrawn_at DATETIME(3) NULL,
      hidden_at DATETIME(3) NULL,
      hidden_why VARCHAR(300) NOT NULL DEFAULT '',
      ${sql.stamps},
      UNIQUE KEY uq_wall_pieces_public_id (public_id),
      UNIQUE KEY uq_wall_pieces_enrolment_id (enrolment_id),
      KEY ix_wall_pieces_hung (withdrawn_at, hidden_at, agreed_at),
      KEY ix_wall_pieces_media (media_id),
      CONSTRAINT fk_wall_pieces_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE,
      CONSTRAINT fk_wall_pieces_media FOREIGN KEY (media_id) REFERENCES media (id) ON DELETE SET NULL
    ) ${sql.end}`,
  ],
};
