import type { Migration } from '#server/db/migration.ts';

/** How often letters about answers come: at once, gathered once a day, or never. */
export const addAnswerLetters: Migration = {
  name: '0040-add-answer-letters',
  statements: [
    "ALTER TABLE letter_choices MODIFY COLUMN kind ENUM('notices','nudges','answers') NOT NULL",
    'ALTER TABLE letter_choices ADD COLUMN IF NOT EXISTS is_daily TINYINT(1) NOT NULL DEFAULT 0 AFTER is_wanted',
    "ALTER TABLE mails MODIFY COLUMN list_kind ENUM('notices','nudges','answers') NULL",
  ],
};
