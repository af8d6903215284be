import { sql, type Migration } from '#server/db/migration.ts';

/** Invitations to help in a workroom. They stay, so that a teacher can read whom she asked and what came of it. */
export const createHelperInvitations: Migration = {
  name: '0019-create-helper-invitations',
  statements: [
    `CREATE TABLE IF NOT EXISTS helper_invitations (
      ${sql.id}, ${sql.publicId},
      workroom_id INT UNSIGNED NOT NULL,
      invited_by_id INT UNSIGNED NOT NULL,
      address VARCHAR(254) NOT NULL,
      address_key VARCHAR(254) NOT NULL,
      token_hash ${sql.hash} NOT NULL,
      expires_at DATETIME(3) NOT NULL,
      accepted_at DATETIME(3) NULL,
      accepted_by_id INT UNSIGNED NULL,
      taken_back_at DATETIME(3) NULL,
      ${sql.stamps},
      UNIQUE KEY uq_helper_invitations_public_id (public_id),
      UNIQUE KEY uq_helper_invitations_token_hash (token_hash),
      KEY ix_helper_invitations_workroom (workroom_id, address_key),
      CONSTRAINT fk_helper_invitations_workroom FOREIGN KEY (workroom_id) REFERENCES workrooms (id) ON DELETE CASCADE,
      CONSTRAINT fk_helper_invitations_invited_by FOREIGN KEY (invited_by_id) REFERENCES users (id),
      CONSTRAINT fk_helper_invitations_accepted_by FOREIGN KEY (accepted_by_id) REFERENCES users (id)
    ) ${sql.end}`,
  ],
};
