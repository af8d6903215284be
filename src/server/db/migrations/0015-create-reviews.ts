import { sql, type Migration } from '#server/db/migration.ts';

export const createReviews: Migration = {
  name: '0015-create-reviews',
  statements: [
    `CREATE TABLE IF NOT EXISTS reviews (
      ${sql.id}, ${sql.publicId},
      enrolment_id INT UNSIGNED NOT NULL,
      series_id INT UNSIGNED NOT NULL,
      shown_name VARCHAR(80) NOT NULL,
      words VARCHAR(2000) NOT NULL,
      would_make_again TINYINT(1) NOT NULL,
      answer VARCHAR(2000) NOT NULL DEFAULT '',
      answered_at DATETIME(3) NULL,
      hidden_at DATETIME(3) NULL,
      hidden_why VARCHAR(300) NOT NULL DEFAULT '',
      ${sql.stamps},
      UNIQUE KEY uq_reviews_public_id (public_id),
      UNIQUE KEY uq_reviews_enrolment_id (enrolment_id),
      KEY ix_reviews_series (series_id, hidden_at, created_at),
      CONSTRAINT fk_reviews_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE,
      CONSTRAINT fk_reviews_series FOREIGN KEY (series_id) REFERENCES series (id) ON DELETE CASCADE
    ) ${sql.end}`,
  ],
};
