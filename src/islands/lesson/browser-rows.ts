// The rows of this browser, one store for each seat.
import type { RowsCounted } from '#contracts/rows.ts';
import type { RowCounts } from '#core/following/row-count.ts';
import { ROWS_HERE } from '#islands/keeping/rows-here.ts';
import { outboxOf, personOfPage } from '#islands/keeping/outbox.ts';
import { RowStore, type RowStorage, type SendRows } from './row-store.ts';

const stores = new Map<string, RowStore>();

/** @param counts what the page was drawn with */
export function rowStore(seat: string, series: string, counts: RowCounts): RowStore {
  const known = stores.get(seat);
  if (known !== undefined) return known;
  const name = `${ROWS_HERE}${seat}`;
  const store = new RowStore(storageOf(name), sendTo(seat, series), newDevice, counts);
  stores.set(seat, store);
  window.addEventListener('online', () => { void store.flush(); });
  window.addEventListener('storage', ({ key }) => { if (key === name) store.look(); });
  document.addEventListener('visibilitychange', () => { if (document.visibilityState === 'visible') void store.flush(); });
  return store;
}

function newDevice(): string {
  return [...crypto.getRandomValues(new Uint8Array(12))].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}

const sendTo = (seat: string, series: string): SendRows => async (device, tallies) => {
  const address = '/api/rows';
  const rows = { series, device, tallies };
  try {
    const response = await fetch(address, { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: JSON.stringify(rows), keepalive: true });
    if (response.ok) return { kind: 'taken', rows: (await response.json()) as RowsCounted };
    if (response.status === 401) return { kind: 'signed-out' };
    return { kind: response.status === 408 || response.status === 429 || response.status >= 500 ? 'later' : 'refused' };
  } catch {
    // Whichever page she opens next sends them, if this one does not come to it. Twice does no harm.
    const person = personOfPage();
    if (person !== null) void outboxOf(person).put({ kind: 'rows', name: seat, address, body: { json: rows } });
    return { kind: 'later' };
  }
};

/** A browser that keeps nothing counts until the page is left. */
function storageOf(key: string): RowStorage {
  let memory: string | null = null;
  return {
    read: () => {
      try {
        return localStorage.getItem(key) ?? memory;
      } catch {
        return memory;
      }
    },
    write: (text) => {
      memory = text;
      try {
        if (text === null) localStorage.removeItem(key);
        else localStorage.setItem(key, text);
      } catch {
        // Full or forbidden.
      }
    },
  };
}
