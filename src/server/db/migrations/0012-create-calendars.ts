import type { Migration } from '#server/db/migration.ts';

/** Calendars of students: which address of a calendar is the newest, and how often a part's day was changed. */
export const createCalendars: Migration = {
  name: '0012-create-calendars',
  statements: [
    'ALTER TABLE enrolments ADD COLUMN IF NOT EXISTS calendar_revision INT UNSIGNED NOT NULL DEFAULT 0',
    'ALTER TABLE lessons ADD COLUMN IF NOT EXISTS timetable_revision INT UNSIGNED NOT NULL DEFAULT 0',
  ],
};
