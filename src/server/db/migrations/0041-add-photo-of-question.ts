import type { Migration } from '#server/db/migration.ts';

/** The photo of her own that a question is about. */
export const addPhotoOfQuestion: Migration = {
  name: '0041-add-photo-of-question',
  statements: [
    'ALTER TABLE questions ADD COLUMN IF NOT EXISTS photo_id INT UNSIGNED NULL AFTER step_id',
    'ALTER TABLE questions ADD CONSTRAINT fk_questions_photo FOREIGN KEY IF NOT EXISTS (photo_id) REFERENCES progress_photos (id) ON DELETE SET NULL',
  ],
};
