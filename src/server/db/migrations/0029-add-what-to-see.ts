import type { Migration } from '#server/db/migration.ts';

/** Where it says how to mend what a verdict speaks of. */
export const addWhatToSee: Migration = {
  name: '0029-add-what-to-see',
  statements: [
    'ALTER TABLE progress_photos ADD COLUMN IF NOT EXISTS see VARCHAR(80) NULL AFTER verdict_words',
    'ALTER TABLE held_verdicts ADD COLUMN IF NOT EXISTS see VARCHAR(80) NULL AFTER words',
  ],
};
