/**
 * How often somebody may do a costly thing. Counters live in the database, so that many web processes share them.
 */
import { createHash } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { AppError } from '#server/errors.ts';

export interface RateRule {
  /** What is limited, e.g. `checkout`. */
  readonly name: string;
  readonly limit: number;
  readonly windowSeconds: number;
}

/** Written numbers for everything that is limited: one table, so that they can be judged together. */
export const RATE_RULES = {
  reckon: { name: 'reckon', limit: 600, windowSeconds: 60 },
  /** Failed sign-ins from one network, at whatever account. */
  signInByNetwork: { name: 'sign-in-network', limit: 30, windowSeconds: 3_600 },
  /** Failed sign-ins at one account from one network or known browser; beyond it each try must wait, up to 30 s. */
  signInByAccount: { name: 'sign-in-account', limit: 5, windowSeconds: 900 },
  /** Failed sign-ins at one account in a row, from anywhere but its known browsers (NIST SP 800-63B-4 §3.2.2). */
  signInInARow: { name: 'sign-in-row', limit: 100, windowSeconds: 2_592_000 },
  /** Times a signed-in person mistypes the password she is asked for again. */
  prove: { name: 'prove', limit: 10, windowSeconds: 900 },
  /** Accounts opened from one network: a whole class may sit in one room. */
  signUp: { name: 'sign-up', limit: 60, windowSeconds: 3_600 },
  /** Letters of one kind to one address that anybody can cause; beyond it none is written, and the answer stays the same. */
  letterToAddress: { name: 'letter-address', limit: 5, windowSeconds: 3_600 },
  letterByNetwork: { name: 'letter-network', limit: 30, windowSeconds: 3_600 },
  /** Links tried, so that nobody can go through tokens; 256 bits would not let them anyway. */
  spendLink: { name: 'spend-link', limit: 60, windowSeconds: 3_600 },
  checkout: { name: 'checkout', limit: 10, windowSeconds: 3_600 },
  photo: { name: 'photo', limit: 60, windowSeconds: 3_600 },
  /** Certificates drawn for one person. */
  certificate: { name: 'certificate', limit: 60, windowSeconds: 3_600 },
  /** Questions and reports of one person. */
  question: { name: 'question', limit: 30, windowSeconds: 3_600 },
  report: { name: 'report', limit: 30, windowSeconds: 3_600 },
  /** Invitations of one teacher, to whomever. */
  invitation: { name: 'invitation', limit: 30, windowSeconds: 86_400 },
  /** Pictures put into texts by one teacher. */
  picture: { name: 'picture', limit: 120, windowSeconds: 3_600 },
  /** Videos begun by one teacher. */
  video: { name: 'video', limit: 60, windowSeconds: 3_600 },
  /** Series taken along or brought in by one teacher. */
  seriesFolder: { name: 'series-folder', limit: 60, windowSeconds: 3_600 },
  /** Notices to many, of one workroom. */
  notice: { name: 'notice', limit: 10, windowSeconds: 86_400 },
  /** Nudges of one workroom, to whomever. */
  nudge: { name: 'nudge', limit: 60, windowSeconds: 86_400 },
  /** Drafts kept by themselves, of one teacher. */
  lessonDraft: { name: 'lesson-draft', limit: 120, windowSeconds: 60 },
  pieceDraft: { name: 'piece-draft', limit: 120, windowSeconds: 60 },
} as const satisfies Record<string, RateRule>;

/** The part of a network address that one household or office shares: /24 of IPv4, /64 of IPv6. */
export function networkOf(ip: string): string {
  const v4 = /(?:^|:)(\d+\.\d+\.\d+)\.\d+$/.exec(ip);
  if (v4?.[1] !== undefined) return v4[1];
  const groupsOf = (side: string): string[] => (side === '' ? [] : side.split(':').map((group) => Number.parseInt(group, 16).toString(16)));
  // `::` stands for as many groups of noughts as are missing from eight.
  const [left = '', right = ''] = ip.split('::');
  const [head, tail] = [groupsOf(left), groupsOf(right)];
  const noughts = Array.from({ length: Math.max(0, 8 - head.length - tail.length) }, () => '0');
  return [...head, ...noughts, ...tail].slice(0, 4).join(':');
}

const idOf = (rule: RateRule, who: string): string => `${rule.name}:${createHash('sha256').update(who).digest('hex').slice(0, 40)}`;

export interface Use {
  readonly within: boolean;
  /** Uses in the running window, this one included. */
  readonly count: number;
  readonly retryAfterSeconds: number;
}

/** Counts one more use of `rule` by `who` (an account's or network's name; kept hashed) and tells whether it is within the limit. */
export async function noteUse(rule: RateRule, who: string): Promise<Use> {
  const id = idOf(rule, who);
  const [row] = await sequelize.query<{ count: number; left: number }>(
    `INSERT INTO rate_windows (id, count, ends_at) VALUES (?, 1, UTC_TIMESTAMP(3) + INTERVAL ? SECOND)
     ON DUPLICATE KEY UPDATE
       count = IF(ends_at <= UTC_TIMESTAMP(3), 1, count + 1),
       ends_at = IF(ends_at <= UTC_TIMESTAMP(3), VALUES(ends_at), ends_at)
     RETURNING count, TIMESTAMPDIFF(SECOND, UTC_TIMESTAMP(3), ends_at) AS \`left\``,
    { replacements: [id, rule.windowSeconds], type: QueryTypes.SELECT },
  );
  const { count, left } = row ?? { count: 1, left: rule.windowSeconds };
  return { within: count <= rule.limit, count, retryAfterSeconds: Math.max(1, left) };
}

/**
 * Counts one more use of `rule` by `who`.
 * @throws {AppError} RATE_LIMITED with the seconds to wait, once the limit is passed.
 */
export async function countUse(rule: RateRule, who: string): Promise<void> {
  const use = await noteUse(rule, who);
  if (!use.within) throw new AppError('RATE_LIMITED', { retryAfterSeconds: use.retryAfterSeconds });
}

/** Takes one use back that turned out to be harmless. Counting first and taking back leaves no gap for many tries at once. */
export async function takeBackUse(rule: RateRule, who: string): Promise<void> {
  await sequelize.query('UPDATE rate_windows SET count = count - 1 WHERE id = ? AND count > 0', { replacements: [idOf(rule, who)], type: QueryTypes.UPDATE });
}

/** Begins the count anew. */
export async function forgetUses(rule: RateRule, who: string): Promise<void> {
  await sequelize.query('DELETE FROM rate_windows WHERE id = ?', { replacements: [idOf(rule, who)], type: QueryTypes.DELETE });
}

/** Forgets counters that have run out. */
export async function forgetOldCounters(): Promise<void> {
  await sequelize.query('DELETE FROM rate_windows WHERE ends_at < UTC_TIMESTAMP(3) - INTERVAL 1 DAY', { type: QueryTypes.DELETE });
}
