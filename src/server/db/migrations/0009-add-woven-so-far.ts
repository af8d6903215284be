import type { Migration } from '#server/db/migration.ts';

/** What a student has woven already of her own piece. */
export const addWovenSoFar: Migration = {
  name: '0009-add-woven-so-far',
  statements: ['ALTER TABLE my_pieces ADD COLUMN IF NOT EXISTS woven JSON NULL AFTER data'],
};
