import { sql, type Migration } from '#server/db/migration.ts';

/**
 * What teachers write to their students, what each person is told in her own page, which letters she asked for, and
 * which addresses take none.
 */
export const createNotices: Migration = {
  name: '0016-create-notices',
  statements: [
    `CREATE TABLE IF NOT EXISTS notices (
      ${sql.id}, ${sql.publicId},
      workroom_id INT UNSIGNED NOT NULL,
      series_id INT UNSIGNED NOT NULL,
      author_id INT UNSIGNED NOT NULL,
      kind ENUM('notice','nudge') NOT NULL,
      state ENUM('draft','waiting','sending','sent') NOT NULL DEFAULT 'draft',
      title VARCHAR(120) NOT NULL,
      source TEXT NOT NULL,
      tree JSON NOT NULL,
      at_lesson_id INT UNSIGNED NULL,
      still_days INT UNSIGNED NULL,
      send_at DATETIME(3) NULL,
      sent_at DATETIME(3) NULL,
      ${sql.stamps},
      UNIQUE KEY uq_notices_public_id (public_id),
      KEY ix_notices_workroom (workroom_id, kind, id),
      CONSTRAINT fk_notices_workroom FOREIGN KEY (workroom_id) REFERENCES workrooms (id) ON DELETE CASCADE,
      CONSTRAINT fk_notices_series FOREIGN KEY (series_id) REFERENCES series (id) ON DELETE CASCADE,
      CONSTRAINT fk_notices_author FOREIGN KEY (author_id) REFERENCES users (id),
      CONSTRAINT fk_notices_at_lesson FOREIGN KEY (at_lesson_id) REFERENCES lessons (id) ON DELETE CASCADE
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS notice_receipts (
      ${sql.id}, ${sql.publicId},
      user_id INT UNSIGNED NOT NULL,
      notice_id INT UNSIGNED NULL,
      series_id INT UNSIGNED NULL,
      kind ENUM('notice','nudge','opening','verdict','seat','answer') NOT NULL,
      said JSON NOT NULL,
      by_letter TINYINT(1) NOT NULL,
      dedupe_key ${sql.outside(190)} NOT NULL,
      read_at DATETIME(3) NULL,
      ${sql.born},
      UNIQUE KEY uq_notice_receipts_public_id (public_id),
      UNIQUE KEY uq_notice_receipts_dedupe_key (dedupe_key),
      KEY ix_notice_receipts_user (user_id, id),
      KEY ix_notice_receipts_unread (user_id, read_at),
      KEY ix_notice_receipts_notice (notice_id),
      CONSTRAINT fk_notice_receipts_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE,
      CONSTRAINT fk_notice_receipts_notice FOREIGN KEY (notice_id) REFERENCES notices (id) ON DELETE CASCADE,
      CONSTRAINT fk_notice_receipts_series FOREIGN KEY (series_id) REFERENCES series (id) ON DELETE SET NULL
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS letter_choices (
      ${sql.id},
      user_id INT UNSIGNED NOT NULL,
      workroom_id INT UNSIGNED NOT NULL,
      kind ENUM('notices','nudges') NOT NULL,
      is_wanted TINYINT(1) NOT NULL,
      wording INT UNSIGNED NOT NULL,
      source ENUM('account','notices','seat','letter') NOT NULL,
      ${sql.born},
      KEY ix_letter_choices_newest (user_id, workroom_id, kind, id),
      CONSTRAINT fk_letter_choices_user FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE,
      CONSTRAINT fk_letter_choices_workroom FOREIGN KEY (workroom_id) REFERENCES workrooms (id) ON DELETE CASCADE
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS refused_addresses (
      address_key VARCHAR(254) CHARACTER SET ascii COLLATE ascii_nopad_bin NOT NULL PRIMARY KEY,
      reply VARCHAR(500) NOT NULL,
      ${sql.born}
    ) ${sql.end}`,
    "ALTER TABLE mails MODIFY COLUMN state ENUM('ready','done','dead','dropped') NOT NULL DEFAULT 'ready'",
    'ALTER TABLE mails ADD COLUMN IF NOT EXISTS list_workroom_id INT UNSIGNED NULL',
    "ALTER TABLE mails ADD COLUMN IF NOT EXISTS list_kind ENUM('notices','nudges') NULL",
    "ALTER TABLE workrooms ADD COLUMN IF NOT EXISTS postal_address VARCHAR(300) NOT NULL DEFAULT ''",
  ],
};
