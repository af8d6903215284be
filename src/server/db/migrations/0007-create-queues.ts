import { sql, type Migration } from '#server/db/migration.ts';

const LEASED = `
      state ENUM('ready','done','dead') NOT NULL DEFAULT 'ready',
      run_at DATETIME(3) NOT NULL,
      attempts INT UNSIGNED NOT NULL DEFAULT 0,
      lease_owner ${sql.outside(64)} NULL,
      lease_until DATETIME(3) NULL,
      last_error VARCHAR(500) NULL`;

export const createQueues: Migration = {
  name: '0007-create-queues',
  statements: [
    `CREATE TABLE IF NOT EXISTS jobs (
      ${sql.id},
      type VARCHAR(60) NOT NULL,
      payload JSON NOT NULL,
      max_attempts INT UNSIGNED NOT NULL,
      unique_key ${sql.outside(190)} NULL,${LEASED},
      ${sql.stamps},
      UNIQUE KEY uq_jobs_unique_key (unique_key),
      KEY ix_jobs_claim (state, run_at, id)
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS mails (
      ${sql.id},
      dedupe_key ${sql.outside(190)} NOT NULL,
      template VARCHAR(60) NOT NULL,
      user_id INT UNSIGNED NULL,
      to_address VARCHAR(254) NOT NULL,
      to_name VARCHAR(80) NOT NULL,
      data JSON NOT NULL,
      expires_at DATETIME(3) NULL,
      sent_at DATETIME(3) NULL,${LEASED},
      ${sql.stamps},
      UNIQUE KEY uq_mails_dedupe_key (dedupe_key),
      KEY ix_mails_claim (state, run_at, id),
      CONSTRAINT fk_mails_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE SET NULL
    ) ${sql.end}`,
  ],
};
