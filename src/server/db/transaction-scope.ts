/** Which transaction the running code is in. Sequelize asks through its CLS interface, over AsyncLocalStorage. */
import { AsyncLocalStorage } from 'node:async_hooks';

const store = new AsyncLocalStorage<Map<string, unknown>>();

export const transactionScope = {
  get: (key: string): unknown => store.getStore()?.get(key),
  set: (key: string, value: unknown): void => { store.getStore()?.set(key, value); },
  run: (work: () => unknown): unknown => store.run(new Map(store.getStore() ?? []), work),
  bind: (work: (...args: unknown[]) => unknown) => {
    const kept = store.getStore() ?? new Map<string, unknown>();
    return (...args: unknown[]): unknown => store.run(kept, () => work(...args));
  },
};

/** True inside `withTransaction`. */
export function inTransaction(): boolean {
  return transactionScope.get('transaction') !== undefined;
}
