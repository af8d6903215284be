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
  reckon: { name: 'reckon', limit: 120, windowSeconds: 60 },
  signInByAddress: { name: 'sign-in-ip', limit: 60, windowSeconds: 3_600 },
  signInByAccount: { name: 'sign-in-account', limit: 10, windowSeconds: 900 },
  signUp: { name: 'sign-up', limit: 20, windowSeconds: 3_600 },
  mailForm: { name: 'mail-form', limit: 5, windowSeconds: 3_600 },
  checkout: { name: 'checkout', limit: 10, windowSeconds: 3_600 },
  photo: { name: 'photo', limit: 60, windowSeconds: 3_600 },
  preview: { name: 'preview', limit: 120, windowSeconds: 60 },
} as const satisfies Record<string, RateRule>;

/** The part of a network address that one household or office shares: /24 of IPv4, /64 of IPv6. */
export function networkOf(ip: string): string {
  const v4 = /(?:^|:)(\d+\.\d+\.\d+)\.\d+$/.exec(ip);
  if (v4?.[1] !== undefined) return v4[1];
  return ip.split(':').slice(0, 4).join(':');
}

/**
 * Counts one more use of `rule` by `who` (an account's or network's name; kept hashed).
 * @throws {AppError} RATE_LIMITED with the seconds to wait, once the limit is passed.
 */
export async function countUse(rule: RateRule, who: string): Promise<void> {
  const id = `${rule.name}:${createHash('sha256').update(who).digest('hex').slice(0, 40)}`;
  await sequelize.query(
    `INSERT INTO rate_windows (id, count, ends_at) VALUES (?, 1, UTC_TIMESTAMP(3) + INTERVAL ? SECOND)
     ON DUPLICATE KEY UPDATE
       count = IF(ends_at <= UTC_TIMESTAMP(3), 1, count + 1),
       ends_at = IF(ends_at <= UTC_TIMESTAMP(3), VALUES(ends_at), ends_at)`,
    { replacements: [id, rule.windowSeconds], type: QueryTypes.RAW },
  );
  const [row] = await sequelize.query<{ count: number; left: number }>(
    'SELECT count, TIMESTAMPDIFF(SECOND, UTC_TIMESTAMP(3), ends_at) AS `left` FROM rate_windows WHERE id = ?',
    { replacements: [id], type: QueryTypes.SELECT },
  );
  if (row !== undefined && row.count > rule.limit) {
    throw new AppError('RATE_LIMITED', { retryAfterSeconds: Math.max(1, row.left) });
  }
}

/** Forgets counters that have run out. */
export async function forgetOldCounters(): Promise<void> {
  await sequelize.query('DELETE FROM rate_windows WHERE ends_at < UTC_TIMESTAMP(3) - INTERVAL 1 DAY', { type: QueryTypes.DELETE });
}
