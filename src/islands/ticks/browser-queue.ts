// The queue of this browser, one for each seat: two islands of a page share it, two people on one device do not.
import { TickQueue, type SendAnswer, type TickChange } from './tick-queue.ts';

const queues = new Map<string, TickQueue>();

export function tickQueue(seat: string): TickQueue {
  const known = queues.get(seat);
  if (known !== undefined) return known;
  const queue = new TickQueue(storageOf(`fellmark-ticks-${seat}`), sendTick);
  queues.set(seat, queue);
  window.addEventListener('online', () => { void queue.flush(); });
  document.addEventListener('visibilitychange', () => { if (document.visibilityState === 'visible') void queue.flush(); });
  return queue;
}

export async function sendTick({ body }: TickChange): Promise<SendAnswer> {
  try {
    const response = await fetch('/api/ticks', { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: JSON.stringify(body), keepalive: true });
    if (response.ok) return 'taken';
    if (response.status === 401) return 'signed-out';
    return response.status === 408 || response.status === 429 || response.status >= 500 ? 'later' : 'refused';
  } catch {
    return 'later';
  }
}

/** A browser that keeps nothing (private windows of some) still sends at once. */
function storageOf(key: string): { read(): string | null; write(text: string | null): void } {
  return {
    read: () => {
      try {
        return localStorage.getItem(key);
      } catch {
        return null;
      }
    },
    write: (text) => {
      try {
        if (text === null) localStorage.removeItem(key);
        else localStorage.setItem(key, text);
      } catch {
        // Full or forbidden: the tick is sent from memory.
      }
    },
  };
}
