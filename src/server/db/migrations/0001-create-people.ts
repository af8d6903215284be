import { sql, type Migration } from '#server/db/migration.ts';

export const createPeople: Migration = {
  name: '0001-create-people',
  statements: [
    `CREATE TABLE IF NOT EXISTS users (
      ${sql.id}, ${sql.publicId},
      email VARCHAR(254) NOT NULL,
      email_key VARCHAR(254) CHARACTER SET ascii COLLATE ascii_nopad_bin NOT NULL,
      email_confirmed_at DATETIME(3) NULL,
      name VARCHAR(80) NOT NULL,
      password_hash ${sql.outside(255)} NULL,
      units ENUM('cm','in') NOT NULL DEFAULT 'cm',
      time_zone VARCHAR(64) NOT NULL DEFAULT 'UTC',
      scheme ENUM('system','light','dark') NOT NULL DEFAULT 'system',
      is_steward TINYINT(1) NOT NULL DEFAULT 0,
      suspended_at DATETIME(3) NULL,
      ${sql.stamps},
      UNIQUE KEY uq_users_public_id (public_id),
      UNIQUE KEY uq_users_email_key (email_key)
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS sessions (
      id ${sql.hash} NOT NULL PRIMARY KEY,
      user_id INT UNSIGNED NOT NULL,
      expires_at DATETIME(3) NOT NULL,
      ends_at DATETIME(3) NOT NULL,
      idle_seconds INT UNSIGNED NOT NULL,
      proved_at DATETIME(3) NOT NULL,
      device VARCHAR(160) NOT NULL DEFAULT '',
      ${sql.born},
      KEY ix_sessions_user_id (user_id),
      CONSTRAINT fk_sessions_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS email_tokens (
      token_hash ${sql.hash} NOT NULL PRIMARY KEY,
      user_id INT UNSIGNED NOT NULL,
      purpose ENUM('confirm-address','new-password') NOT NULL,
      address VARCHAR(254) NOT NULL,
      expires_at DATETIME(3) NOT NULL,
      ${sql.born},
      KEY ix_email_tokens_user_purpose (user_id, purpose),
      CONSTRAINT fk_email_tokens_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS rate_windows (
      id ${sql.outside(190)} NOT NULL PRIMARY KEY,
      count INT UNSIGNED NOT NULL,
      ends_at DATETIME(3) NOT NULL,
      KEY ix_rate_windows_ends_at (ends_at)
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS audit_entries (
      ${sql.id},
      actor_id INT UNSIGNED NULL,
      action VARCHAR(60) NOT NULL,
      subject_kind VARCHAR(40) NOT NULL,
      subject_id ${sql.outside(64)} NOT NULL,
      detail JSON NOT NULL,
      request_id ${sql.outside(64)} NOT NULL,
      ${sql.born},
      KEY ix_audit_entries_subject (subject_kind, subject_id),
      CONSTRAINT fk_audit_entries_actor FOREIGN KEY (actor_id) REFERENCES users (id)
    ) ${sql.end}`,
  ],
};
