/**
 * What a person did on this device and the house does not have yet: ticks, places, photos. Each is kept in the browser
 * first and leaves it only when the house has it. Every page of a signed-in person sends what waits (`on-this-device.ts`);
 * an island puts in, and looks at what waits, through `outboxOf`.
 */
import { browserStore, memoryStore, type Entry, type NewEntry, type OutboxStore } from './outbox-store.ts';
import { sendEntry, type SendAnswer } from './send-entry.ts';

export interface Refusal {
  readonly entry: Entry;
  readonly says: string;
}

export interface OutboxState {
  /** False until the browser's database was looked into. */
  readonly isRead: boolean;
  /** What waits, and what was answered and keeps its answer; in the order of its putting in. */
  readonly entries: readonly Entry[];
  /** Why the last sending stopped. */
  readonly waits: 'nothing' | 'later' | 'signed-out';
  /** What the house would not take, since this page was opened; it is out of the outbox. */
  readonly refused: readonly Refusal[];
}

export const isWaiting = ({ answer }: Entry): boolean => answer === undefined;

/** A change that the database has not numbered yet stands at the end. */
const UNNUMBERED = Number.MAX_SAFE_INTEGER;

export class Outbox {
  private state: OutboxState = { isRead: false, entries: [], waits: 'nothing', refused: [] };
  private sending: Promise<void> | null = null;
  private asksAgain = false;
  private readonly listeners = new Set<() => void>();
  private readonly neighbours = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel('fellmark-outbox');
  private writing: Promise<unknown>;

  constructor(readonly person: string, private readonly store: Promise<OutboxStore>, private readonly send: (entry: Entry, device: string) => Promise<SendAnswer> = sendEntry, private readonly now: () => number = Date.now) {
    this.writing = this.read();
    // Another page of this browser has put in or sent something.
    this.neighbours?.addEventListener('message', () => { void this.read(); });
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly current = (): OutboxState => this.state;

  /** Shows in `current` at once; resolves when it is kept. Sending begins by itself. */
  put(change: Omit<NewEntry, 'person'>): Promise<void> {
    const entry = { ...change, person: this.person };
    const madeAt = this.now();
    const shown: Entry = { ...entry, madeAt, sequence: UNNUMBERED };
    const others = this.state.entries.filter(({ kind, name }) => kind !== entry.kind || name !== entry.name);
    const refused = this.state.refused.filter(({ entry: { kind, name } }) => kind !== entry.kind || name !== entry.name);
    this.tell({ entries: [...others, shown], refused });
    const kept = this.writing.then(async () => {
      const numbered = await (await this.store).add(entry, madeAt);
      this.tell({ entries: [...this.state.entries.filter((one) => one !== shown && one.sequence !== numbered.sequence), numbered] });
      this.neighbours?.postMessage(null);
    });
    this.writing = kept.catch(() => undefined);
    void kept.then(() => this.flush());
    return kept;
  }

  /** Sends what waits, in order, of this and every other page; one run at a time. */
  flush(): Promise<void> {
    if (this.sending !== null) {
      // Something may have come after the run had looked for the last time.
      this.asksAgain = true;
      return this.sending;
    }
    this.sending = this.writing.then(() => inOnePage(() => this.sendAll())).finally(() => {
      this.sending = null;
      if (!this.asksAgain) return;
      this.asksAgain = false;
      void this.flush();
    });
    return this.sending;
  }

  /** For signing out: nothing of this person stays, sent or not. */
  async empty(): Promise<void> {
    this.tell({ entries: [], refused: [], waits: 'nothing' });
    await (await this.store).removeAll(this.person);
    this.neighbours?.postMessage(null);
  }

  private async read(): Promise<void> {
    const entries = await (await this.store).all(this.person);
    this.tell({ isRead: true, entries: [...entries, ...this.state.entries.filter(({ sequence }) => sequence === UNNUMBERED)] });
  }

  private async sendAll(): Promise<void> {
    const store = await this.store;
    /** A sort that has to wait does not hold up another. */
    const later = new Set<string>();
    let waits: OutboxState['waits'] = 'nothing';
    for (;;) {
      const entry = (await store.all(this.person)).find((one) => isWaiting(one) && !later.has(one.kind));
      if (entry === undefined) break;
      const answer = await this.send(entry, store.device);
      if (answer.kind === 'later' || answer.kind === 'away' || answer.kind === 'signed-out') {
        waits = answer.kind === 'signed-out' ? 'signed-out' : 'later';
        if (answer.kind !== 'later') break;
        later.add(entry.kind);
        continue;
      }
      if (answer.kind === 'taken') await store.settle(entry.sequence, answer.answer);
      else await store.remove([entry.sequence]);
      if (answer.kind === 'refused') this.tell({ refused: [...this.state.refused, { entry, says: answer.says }] });
      await this.read();
      this.neighbours?.postMessage(null);
    }
    this.tell({ waits });
  }

  private tell(change: Partial<OutboxState>): void {
    this.state = { ...this.state, ...change };
    for (const listener of this.listeners) listener();
  }
}

/** Two pages of a browser never send the same thing. */
async function inOnePage(work: () => Promise<void>): Promise<void> {
  // Absent from pages that came by plain http.
  if ('locks' in navigator) await navigator.locks.request('fellmark-outbox', work);
  else await work();
}

const opened = new Map<string, Outbox>();

/** The outbox of this person in this browser: one for all islands of a page. */
export function outboxOf(person: string): Outbox {
  const known = opened.get(person);
  if (known !== undefined) return known;
  const outbox = new Outbox(person, browserStore().catch(memoryStore));
  opened.set(person, outbox);
  return outbox;
}

/** Who this page was made for; null where nobody is signed in. */
export function personOfPage(): string | null {
  return document.documentElement.dataset['person'] ?? null;
}
