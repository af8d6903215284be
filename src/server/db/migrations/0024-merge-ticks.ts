import type { Migration } from '#server/db/migration.ts';

/**
 * Which of a seat's changes of ticks was the last of each, and of which browser it came: what two devices told is then
 * put together without asking their clocks.
 */
export const mergeTicks: Migration = {
  name: '0024-merge-ticks',
  statements: [
    'ALTER TABLE ticks ADD COLUMN IF NOT EXISTS revision INT UNSIGNED NOT NULL DEFAULT 0',
    'ALTER TABLE ticks ADD COLUMN IF NOT EXISTS device VARCHAR(32) CHARACTER SET ascii COLLATE ascii_nopad_bin NULL',
    'ALTER TABLE ticks ADD COLUMN IF NOT EXISTS sequence INT UNSIGNED NULL',
  ],
};
