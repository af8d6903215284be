/**
 * Rows counted on this device: kept here at once, before anything is sent, and sent when there is signal. What is kept
 * is read anew for each row, so that two windows count together. Knows no screen; storage and sending are handed in.
 */
import type { RowsCounted } from '#contracts/rows.ts';
import { MOST_ROWS, newerTally, rowsOf, type RowCounts, type Tally } from '#core/following/row-count.ts';

export type RowsAnswer = { readonly kind: 'taken'; readonly rows: RowsCounted } | { readonly kind: 'later' | 'signed-out' | 'refused' };
export type SendRows = (device: string, tallies: Readonly<Record<string, Tally>>) => Promise<RowsAnswer>;

export interface RowStorage {
  read(): string | null;
  write(text: string | null): void;
}

/** What stands on the device. */
interface KeptRows {
  readonly device: string;
  readonly own: Readonly<Record<string, Tally>>;
  /** What all other devices counted, as it was last heard. */
  readonly others: RowCounts;
  /** Versions the house has. */
  readonly sent: Readonly<Record<string, number>>;
  /** What was counted here, the last one last. */
  readonly done: readonly { readonly band: string; readonly rows: number }[];
  /** The band she chose herself, and in which part. */
  readonly chosen: { readonly part: number; readonly band: string } | null;
  readonly isOpen: boolean;
}

export interface RowState {
  readonly counts: RowCounts;
  readonly chosen: KeptRows['chosen'];
  /** The counter is in hand: the space bar counts. */
  readonly isOpen: boolean;
  readonly canUndo: boolean;
  readonly waits: 'nothing' | 'later' | 'signed-out' | 'refused';
}

const MOST_DONE = 200;

export class RowStore {
  private kept: KeptRows;
  private waits: RowState['waits'] = 'nothing';
  private state: RowState;
  private sending: Promise<void> | null = null;
  private readonly listeners = new Set<() => void>();

  /** @param known what the page was drawn with; of use on a device that kept nothing yet */
  constructor(private readonly storage: RowStorage, private readonly send: SendRows, newDevice: () => string, known: RowCounts) {
    this.kept = readKept(storage.read()) ?? { device: newDevice(), own: {}, others: known, sent: {}, done: [], chosen: null, isOpen: false };
    this.state = this.stateNow();
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly current = (): RowState => this.state;

  /** Adds rows to a band, or takes some off, never below none. At this part it stays in hand until she goes on. */
  add(part: number, band: string, rows: number): void {
    this.look();
    const before = this.rowsIn(band);
    const step = Math.min(MOST_ROWS, Math.max(0, before + rows)) - before;
    if (step === 0) return;
    this.keep({ ...this.grown(band, step), done: [...this.kept.done, { band, rows: step }].slice(-MOST_DONE), chosen: { part, band } });
    void this.flush();
  }

  set(part: number, band: string, rows: number): void {
    this.look();
    this.add(part, band, rows - this.rowsIn(band));
  }

  /** Takes back what was counted here last, and answers in which band, which is then in hand at this part. */
  undo(part: number): string | undefined {
    this.look();
    const last = this.kept.done.at(-1);
    if (last === undefined) return undefined;
    this.keep({ ...this.grown(last.band, Math.max(-last.rows, -this.rowsIn(last.band))), done: this.kept.done.slice(0, -1), chosen: { part, band: last.band } });
    void this.flush();
    return last.band;
  }

  choose(part: number, band: string): void {
    this.look();
    this.keep({ ...this.kept, chosen: { part, band } });
  }

  open(isOpen: boolean): void {
    this.look();
    this.keep({ ...this.kept, isOpen });
  }

  /** Another window of this device changed what is kept. */
  readonly look = (): void => {
    const kept = readKept(this.storage.read());
    if (kept !== null) this.kept = kept;
    this.tell();
  };

  /** Sends what this device counted and hears what others did; one run at a time. */
  flush(): Promise<void> {
    this.sending ??= this.sendAll().finally(() => { this.sending = null; }).then(() => (this.waits === 'nothing' && this.isUnsent() ? this.flush() : undefined));
    return this.sending;
  }

  private async sendAll(): Promise<void> {
    const asked = this.kept.own;
    const answer = await this.send(this.kept.device, asked);
    this.look();
    this.waits = answer.kind === 'taken' ? 'nothing' : answer.kind;
    if (answer.kind === 'taken') this.take(asked, answer.rows);
    else this.tell();
  }

  private take(asked: KeptRows['own'], { own, others }: RowsCounted): void {
    const mine = Object.entries(this.kept.own).flatMap(([band, tally]): [string, Tally][] => {
      const known = own[band];
      if (known !== undefined) return [[band, newerTally(known, tally)]];
      // The pattern no longer has this band: it is let go, or it would be sent for ever.
      return asked[band]?.version === tally.version ? [] : [[band, tally]];
    });
    const sent = Object.fromEntries(Object.entries(own).map(([band, { version }]) => [band, version]));
    this.keep({ ...this.kept, own: { ...own, ...Object.fromEntries(mine) }, others, sent });
  }

  private isUnsent(): boolean {
    return Object.entries(this.kept.own).some(([band, { version }]) => version > (this.kept.sent[band] ?? 0));
  }

  private rowsIn(band: string): number {
    return rowsOf([this.kept.own[band]?.rows ?? 0, this.kept.others[band] ?? 0]);
  }

  private grown(band: string, rows: number): KeptRows {
    const before = this.kept.own[band] ?? { rows: 0, version: 0 };
    return { ...this.kept, own: { ...this.kept.own, [band]: { rows: before.rows + rows, version: before.version + 1 } } };
  }

  private keep(kept: KeptRows): void {
    this.kept = kept;
    this.storage.write(JSON.stringify(kept));
    this.tell();
  }

  private tell(): void {
    this.state = this.stateNow();
    for (const listener of this.listeners) listener();
  }

  private stateNow(): RowState {
    const { own, others, chosen, isOpen, done } = this.kept;
    const bands = new Set([...Object.keys(own), ...Object.keys(others)]);
    return { counts: Object.fromEntries([...bands].map((band) => [band, this.rowsIn(band)])), chosen, isOpen, canUndo: done.length > 0, waits: this.waits };
  }
}

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);
const isTally = (value: unknown): value is Tally => isObject(value) && typeof value['rows'] === 'number' && typeof value['version'] === 'number';
const isNumber = (value: unknown): value is number => typeof value === 'number';

function only<T>(value: unknown, is: (one: unknown) => one is T): Record<string, T> {
  return isObject(value) ? Object.fromEntries(Object.entries(value).filter((entry): entry is [string, T] => is(entry[1]))) : {};
}

/** Undefined parts of it are left out; null when it is none of ours. */
function readKept(text: string | null): KeptRows | null {
  try {
    const found: unknown = JSON.parse(text ?? 'null');
    if (!isObject(found) || typeof found['device'] !== 'string') return null;
    const { device, done, chosen } = found;
    return {
      device,
      own: only(found['own'], isTally),
      others: only(found['others'], isNumber),
      sent: only(found['sent'], isNumber),
      done: Array.isArray(done) ? done.filter((one): one is { band: string; rows: number } => isObject(one) && typeof one['band'] === 'string' && typeof one['rows'] === 'number') : [],
      chosen: isObject(chosen) && typeof chosen['part'] === 'number' && typeof chosen['band'] === 'string' ? { part: chosen['part'], band: chosen['band'] } : null,
      isOpen: found['isOpen'] === true,
    };
  } catch {
    return null;
  }
}
