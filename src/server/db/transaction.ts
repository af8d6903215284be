/**
 * Transactions: the only door to them. A use-case opens one, whatever it calls joins it.
 * First statement inside is the lock; nothing slow (mail, payment, disk) happens inside.
 */
import { setTimeout as pause } from 'node:timers/promises';
import { DatabaseError } from 'sequelize';
import { sequelize } from '#server/db/sequelize.ts';
import { inTransaction, transactionScope } from '#server/db/transaction-scope.ts';

const TRIES = 5;
/** Deadlock, lock wait, changed snapshot, node not ready: the server gave up the whole transaction, so all of it may run again. */
const RETRIED = new Set([1213, 1205, 1020, 1047]);
const AFTER = 'afterCommit';

export function errnoOf(error: unknown): number | undefined {
  if (!(error instanceof DatabaseError)) return undefined;
  const { errno } = error.parent as { errno?: unknown };
  return typeof errno === 'number' ? errno : undefined;
}

function retriable(error: unknown): boolean {
  const errno = errnoOf(error);
  return errno !== undefined && RETRIED.has(errno);
}

/**
 * Runs `work` in the current transaction, or in a new one that is run again (up to five times) when the server
 * reports a deadlock or a lock wait. `work` must therefore change nothing but rows.
 */
export async function withTransaction<T>(work: () => Promise<T>): Promise<T> {
  if (inTransaction()) return work();
  for (let attempt = 1; ; attempt += 1) {
    const after: (() => Promise<void>)[] = [];
    try {
      const result = await sequelize.transaction(() => {
        transactionScope.set(AFTER, after);
        return work();
      });
      for (const act of after) await act().catch((error: unknown) => { console.error('after commit:', error); });
      return result;
    } catch (error) {
      if (attempt >= TRIES || !retriable(error)) throw error;
      await pause(Math.random() * 20 * 2 ** attempt);
    }
  }
}

/** Does `act` when the running transaction is committed; at once when there is none. A failure is logged: the rows are already kept. */
export async function afterCommit(act: () => Promise<void>): Promise<void> {
  const list = transactionScope.get(AFTER);
  if (inTransaction() && Array.isArray(list)) list.push(act);
  else await act();
}
