/**
 * Rows as a queue, for jobs and mails alike: a worker claims what is due, holds it by a lease, and says how it ended.
 * At least once: a worker that dies leaves a lease that runs out, and the row is claimed again. Raw SQL, because
 * Sequelize 6 silently drops SKIP LOCKED for this database.
 */
import { QueryTypes } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { withTransaction } from '#server/db/transaction.ts';

export type QueueTable = 'jobs' | 'mails';

export interface Claim {
  readonly id: number;
  readonly attempts: number;
}

/** Jobs of some types only, or of all but some. */
export type OfTypes = { readonly only: readonly string[] } | { readonly not: readonly string[] };

/** Claims up to `limit` rows that are due, for `leaseSeconds`. Attempts rise here, so that a row that kills its worker still runs out of tries. */
export async function claimDue(table: QueueTable, owner: string, limit: number, leaseSeconds: number, types: OfTypes = { not: [] }): Promise<Claim[]> {
  const named = 'only' in types ? types.only : types.not;
  const ofTypes = named.length === 0 ? '' : `AND type ${'only' in types ? 'IN' : 'NOT IN'} (${named.map(() => '?').join(',')})`;
  return withTransaction(async () => {
    const due = await sequelize.query<Claim>(
      `SELECT id, attempts FROM ${table}
        WHERE state = 'ready' AND run_at <= UTC_TIMESTAMP(3) AND (lease_until IS NULL OR lease_until < UTC_TIMESTAMP(3)) ${ofTypes}
        ORDER BY run_at, id LIMIT ${limit} FOR UPDATE SKIP LOCKED`,
      { replacements: [...named], type: QueryTypes.SELECT },
    );
    if (due.length === 0) return [];
    await sequelize.query(
      `UPDATE ${table} SET lease_owner = ?, lease_until = UTC_TIMESTAMP(3) + INTERVAL ? SECOND, attempts = attempts + 1 WHERE id IN (${due.map(() => '?').join(',')})`,
      { replacements: [owner, leaseSeconds, ...due.map(({ id }) => id)], type: QueryTypes.UPDATE },
    );
    return due.map(({ id, attempts }) => ({ id, attempts: attempts + 1 }));
  });
}

/** Holds a row longer. @returns false when it is held by another by now: this one was too slow. */
export async function renewLease(table: QueueTable, owner: string, id: number, leaseSeconds: number): Promise<boolean> {
  const [, affected] = await sequelize.query(
    `UPDATE ${table} SET lease_until = UTC_TIMESTAMP(3) + INTERVAL ? SECOND WHERE id = ? AND lease_owner = ? AND state = 'ready'`,
    { replacements: [leaseSeconds, id, owner], type: QueryTypes.UPDATE },
  );
  return affected === 1;
}

async function finish(table: QueueTable, owner: string, id: number, set: string, values: unknown[]): Promise<boolean> {
  // The owner is checked: a worker whose lease ran out must not end what another one now holds.
  const [, affected] = await sequelize.query(
    `UPDATE ${table} SET ${set}, lease_owner = NULL, lease_until = NULL, updated_at = UTC_TIMESTAMP(3) WHERE id = ? AND lease_owner = ?`,
    { replacements: [...values, id, owner], type: QueryTypes.UPDATE },
  );
  return affected === 1;
}

export function finishDone(table: QueueTable, owner: string, id: number): Promise<boolean> {
  return finish(table, owner, id, table === 'mails' ? "state = 'done', sent_at = UTC_TIMESTAMP(3)" : "state = 'done'", []);
}

export function finishLater(table: QueueTable, owner: string, id: number, waitSeconds: number, error: string): Promise<boolean> {
  return finish(table, owner, id, 'run_at = UTC_TIMESTAMP(3) + INTERVAL ? SECOND, last_error = ?', [waitSeconds, error.slice(0, 500)]);
}

export function finishDead(table: QueueTable, owner: string, id: number, error: string): Promise<boolean> {
  return finish(table, owner, id, "state = 'dead', last_error = ?", [error.slice(0, 500)]);
}

/** A letter that is not to be sent after all. */
export function finishDropped(owner: string, id: number, why: string): Promise<boolean> {
  return finish('mails', owner, id, "state = 'dropped', last_error = ?", [why.slice(0, 500)]);
}

/** Gives back what a stopping worker has claimed but not begun. */
export async function releaseAll(table: QueueTable, owner: string): Promise<void> {
  await sequelize.query(
    `UPDATE ${table} SET lease_owner = NULL, lease_until = NULL, attempts = attempts - 1 WHERE lease_owner = ? AND state = 'ready'`,
    { replacements: [owner], type: QueryTypes.UPDATE },
  );
}

/** Seconds by which the oldest due row is late; 0 when nothing is due. */
export async function lagSeconds(table: QueueTable): Promise<number> {
  const [row] = await sequelize.query<{ lag: number | null }>(
    `SELECT TIMESTAMPDIFF(SECOND, MIN(run_at), UTC_TIMESTAMP(3)) AS lag FROM ${table} WHERE state = 'ready' AND run_at <= UTC_TIMESTAMP(3)`,
    { type: QueryTypes.SELECT },
  );
  return row?.lag ?? 0;
}
