import { sql, type Migration } from '#server/db/migration.ts';

/** What students ask on a part, what is answered, and reports of words that should not stand there. */
export const createQuestions: Migration = {
  name: '0018-create-questions',
  statements: [
    `CREATE TABLE IF NOT EXISTS questions (
      ${sql.id}, ${sql.publicId},
      enrolment_id INT UNSIGNED NOT NULL,
      lesson_id INT UNSIGNED NOT NULL,
      author_id INT UNSIGNED NOT NULL,
      step_id ${sql.outside(64)} NULL,
      words VARCHAR(2000) NOT NULL,
      is_for_class TINYINT(1) NOT NULL,
      wants_letter TINYINT(1) NOT NULL,
      answered_at DATETIME(3) NULL,
      changed_at DATETIME(3) NULL,
      taken_out_at DATETIME(3) NULL,
      taken_out_by_id INT UNSIGNED NULL,
      ${sql.stamps},
      UNIQUE KEY uq_questions_public_id (public_id),
      KEY ix_questions_waiting (lesson_id, answered_at, created_at),
      FULLTEXT KEY ft_questions_words (words),
      CONSTRAINT fk_questions_enrolment FOREIGN KEY (enrolment_id) REFERENCES enrolments (id) ON DELETE CASCADE,
      CONSTRAINT fk_questions_lesson FOREIGN KEY (lesson_id) REFERENCES lessons (id),
      CONSTRAINT fk_questions_author FOREIGN KEY (author_id) REFERENCES users (id),
      CONSTRAINT fk_questions_taken_out_by FOREIGN KEY (taken_out_by_id) REFERENCES users (id)
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS question_answers (
      ${sql.id}, ${sql.publicId},
      question_id INT UNSIGNED NOT NULL,
      author_id INT UNSIGNED NOT NULL,
      words VARCHAR(2000) NOT NULL,
      changed_at DATETIME(3) NULL,
      taken_out_at DATETIME(3) NULL,
      taken_out_by_id INT UNSIGNED NULL,
      ${sql.stamps},
      UNIQUE KEY uq_question_answers_public_id (public_id),
      KEY ix_question_answers_question (question_id, created_at),
      CONSTRAINT fk_question_answers_question FOREIGN KEY (question_id) REFERENCES questions (id) ON DELETE CASCADE,
      CONSTRAINT fk_question_answers_author FOREIGN KEY (author_id) REFERENCES users (id),
      CONSTRAINT fk_question_answers_taken_out_by FOREIGN KEY (taken_out_by_id) REFERENCES users (id)
    ) ${sql.end}`,
    `CREATE TABLE IF NOT EXISTS word_reports (
      ${sql.id}, ${sql.publicId},
      question_id INT UNSIGNED NULL,
      answer_id INT UNSIGNED NULL,
      reporter_id INT UNSIGNED NOT NULL,
      why VARCHAR(600) NOT NULL,
      settled_at DATETIME(3) NULL,
      settled_by_id INT UNSIGNED NULL,
      ${sql.stamps},
      UNIQUE KEY uq_word_reports_public_id (public_id),
      UNIQUE KEY uq_word_reports_question_reporter (question_id, reporter_id),
      UNIQUE KEY uq_word_reports_answer_reporter (answer_id, reporter_id),
      CONSTRAINT ck_word_reports_of_one CHECK ((question_id IS NULL) <> (answer_id IS NULL)),
      CONSTRAINT fk_word_reports_question FOREIGN KEY (question_id) REFERENCES questions (id) ON DELETE CASCADE,
      CONSTRAINT fk_word_reports_answer FOREIGN KEY (answer_id) REFERENCES question_answers (id) ON DELETE CASCADE,
      CONSTRAINT fk_word_reports_reporter FOREIGN KEY (reporter_id) REFERENCES users (id),
      CONSTRAINT fk_word_reports_settled_by FOREIGN KEY (settled_by_id) REFERENCES users (id)
    ) ${sql.end}`,
  ],
};
