/**
 * Ticks on their way to the server. Each is kept on the device first and leaves it only when the server has it, so that
 * a list can be ticked in a shop without signal. Knows no screen; storage and sending are handed in.
 */

/** One change, as `POST /api/ticks` takes it. */
export interface TickChange {
  /** What it is about: a later change of the same thing takes its place. */
  readonly id: string;
  readonly body: Readonly<Record<string, unknown>> & { readonly ticked: boolean; readonly changedAt: string };
}

/** `later`: no signal, or the server is busy. `signed-out`: kept until she signs in. `refused`: it will never be taken. */
export type SendAnswer = 'taken' | 'later' | 'signed-out' | 'refused';

export interface QueueState {
  /** Ids that are kept here only. */
  readonly unsent: ReadonlySet<string>;
  /** Why they are. */
  readonly waits: 'nothing' | 'later' | 'signed-out';
  /** Ids the server would not take; their ticks are to be taken back. */
  readonly refused: ReadonlySet<string>;
}

export interface TickStorage {
  read(): string | null;
  write(text: string | null): void;
}

export class TickQueue {
  private changes: readonly TickChange[];
  private state: QueueState;
  private sending: Promise<void> | null = null;
  private readonly listeners = new Set<() => void>();

  constructor(private readonly storage: TickStorage, private readonly send: (change: TickChange) => Promise<SendAnswer>) {
    this.changes = readChanges(storage.read());
    this.state = { unsent: new Set(this.changes.map(({ id }) => id)), waits: 'nothing', refused: new Set() };
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly current = (): QueueState => this.state;

  /** What is kept here and not on the server yet: id to tick. */
  kept(): ReadonlyMap<string, boolean> {
    return new Map(this.changes.map(({ id, body }) => [id, body.ticked]));
  }

  put(change: TickChange): void {
    this.keep([...this.changes.filter(({ id }) => id !== change.id), change]);
    const refused = new Set(this.state.refused);
    refused.delete(change.id);
    this.tell({ refused });
    void this.flush();
  }

  /** Sends what waits, in order; one run at a time. */
  flush(): Promise<void> {
    this.sending ??= this.sendAll().then((allSent) => {
      this.sending = null;
      // A change may have come after the run had looked for the last time.
      return allSent && this.changes.length > 0 ? this.flush() : undefined;
    });
    return this.sending;
  }

  /** False when the rest has to wait. */
  private async sendAll(): Promise<boolean> {
    for (let change = this.changes[0]; change !== undefined; change = this.changes[0]) {
      const answer = await this.send(change);
      if (answer === 'later' || answer === 'signed-out') {
        this.tell({ waits: answer });
        return false;
      }
      // A change made while this one was on its way stays.
      const sent = change;
      this.keep(this.changes.filter((kept) => kept !== sent));
      this.tell(answer === 'refused' ? { refused: new Set([...this.state.refused, change.id]) } : {});
    }
    this.tell({ waits: 'nothing' });
    return true;
  }

  private keep(changes: readonly TickChange[]): void {
    this.changes = changes;
    this.storage.write(changes.length === 0 ? null : JSON.stringify(changes));
  }

  private tell(change: Partial<QueueState>): void {
    this.state = { ...this.state, ...change, unsent: new Set(this.changes.map(({ id }) => id)) };
    for (const listener of this.listeners) listener();
  }
}

function readChanges(text: string | null): readonly TickChange[] {
  try {
    const found: unknown = JSON.parse(text ?? '[]');
    return Array.isArray(found) ? found.filter(isChange) : [];
  } catch {
    return [];
  }
}

function isChange(value: unknown): value is TickChange {
  if (typeof value !== 'object' || value === null || !('id' in value) || !('body' in value)) return false;
  const { id, body } = value;
  return typeof id === 'string' && typeof body === 'object' && body !== null && 'ticked' in body && typeof body.ticked === 'boolean' && 'changedAt' in body && typeof body.changedAt === 'string';
}
