import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';

export interface OfficeCounts {
  readonly people: number;
  readonly unconfirmed: number;
  readonly suspended: number;
  readonly workrooms: number;
  readonly seats: number;
  /** Reports of words that wait for the steward. */
  readonly reports: number;
  readonly letters: { readonly waiting: number; readonly dead: number; readonly lateSeconds: number };
  readonly jobs: { readonly waiting: number; readonly dead: number; readonly lateSeconds: number };
}

/** Seconds by which the oldest row that is due waits; 0 when none is. */
const late = (table: 'mails' | 'jobs'): string =>
  `(SELECT COALESCE(TIMESTAMPDIFF(SECOND, MIN(run_at), UTC_TIMESTAMP(3)), 0) FROM ${table} WHERE state = 'ready' AND run_at <= UTC_TIMESTAMP(3))`;

/** What the steward sees first: how many live here, and what waits or was given up. */
export async function countOffice(): Promise<OfficeCounts> {
  const [row] = await sequelize.query<Record<'people' | 'unconfirmed' | 'suspended' | 'workrooms' | 'seats' | 'reports' | 'lettersWaiting' | 'lettersDead' | 'jobsWaiting' | 'jobsDead' | 'lettersLate' | 'jobsLate', number>>(
    `SELECT (SELECT COUNT(*) FROM users) AS people,
            (SELECT COUNT(*) FROM users WHERE email_confirmed_at IS NULL) AS unconfirmed,
            (SELECT COUNT(*) FROM users WHERE suspended_at IS NOT NULL) AS suspended,
            (SELECT COUNT(*) FROM workrooms) AS workrooms,
            (SELECT COUNT(*) FROM enrolments) AS seats,
            (SELECT COUNT(*) FROM word_reports WHERE settled_at IS NULL) AS reports,
            (SELECT COUNT(*) FROM mails WHERE state = 'ready') AS lettersWaiting,
            (SELECT COUNT(*) FROM mails WHERE state = 'dead') AS lettersDead,
            (SELECT COUNT(*) FROM jobs WHERE state = 'ready') AS jobsWaiting,
            (SELECT COUNT(*) FROM jobs WHERE state = 'dead') AS jobsDead,
            ${late('mails')} AS lettersLate,
            ${late('jobs')} AS jobsLate`,
    { type: QueryTypes.SELECT },
  );
  return {
    people: row?.people ?? 0,
    unconfirmed: row?.unconfirmed ?? 0,
    suspended: row?.suspended ?? 0,
    workrooms: row?.workrooms ?? 0,
    seats: row?.seats ?? 0,
    reports: row?.reports ?? 0,
    letters: { waiting: row?.lettersWaiting ?? 0, dead: row?.lettersDead ?? 0, lateSeconds: row?.lettersLate ?? 0 },
    jobs: { waiting: row?.jobsWaiting ?? 0, dead: row?.jobsDead ?? 0, lateSeconds: row?.jobsLate ?? 0 },
  };
}
