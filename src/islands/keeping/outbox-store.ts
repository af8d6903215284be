/** Where the outbox lies: in this browser's database, or in the page's memory where the browser keeps nothing. */
import { openDB, type DBSchema, type IDBPDatabase } from 'idb';

/** A form's fields are sent as a form would send them; files among them are kept as they are. */
export type EntryBody = { readonly json: unknown } | { readonly form: readonly (readonly [name: string, value: string | Blob])[] };

export interface NewEntry {
  /** Whose it is, by public id: on a device of two people neither sends for the other. */
  readonly person: string;
  /** What sort of thing: `tick`. */
  readonly kind: string;
  /** Which one of its sort. A later one takes the place of one that still waits. */
  readonly name: string;
  /** Endpoint that takes it by POST. */
  readonly address: string;
  readonly body: EntryBody;
  /** The house's answer stays here, for pages that were made before it, until another entry takes its place. */
  readonly keepsAnswer?: boolean;
}

export interface Entry extends NewEntry {
  /** Counts what was ever put in on this device; never goes back, whatever the clock does. */
  readonly sequence: number;
  /** By the device's clock, which may be wrong: good for telling how long it waited, nothing else. */
  readonly madeAt: number;
  /** Undefined while it waits. */
  readonly answer?: unknown;
}

export interface OutboxStore {
  /** Of this browser, by chance; says nothing of who uses it. */
  readonly device: string;
  all(person: string): Promise<Entry[]>;
  add(entry: NewEntry, madeAt: number): Promise<Entry>;
  /** The house has it. Does nothing where another has taken its place meanwhile. */
  settle(sequence: number, answer: unknown): Promise<void>;
  remove(sequences: readonly number[]): Promise<void>;
  removeAll(person: string): Promise<void>;
}

interface Shape extends DBSchema {
  entries: { key: number; value: Omit<Entry, 'sequence'> & { sequence?: number }; indexes: { person: string } };
  device: { key: 'id'; value: string };
}

const NAME = 'fellmark-outbox';
/** What nobody came back for. */
const OLDEST_MS = 60 * 86_400_000;

/** Same person, sort and name, and not answered: the newer one says it all. */
const isReplacedBy = (old: NewEntry & { answer?: unknown }, entry: NewEntry): boolean => old.person === entry.person && old.kind === entry.kind && old.name === entry.name;

function newDevice(): string {
  return Array.from(crypto.getRandomValues(new Uint8Array(12)), (byte) => byte.toString(16).padStart(2, '0')).join('');
}

/** @throws where the browser has no database, or lets nobody use it (some private windows). */
export async function browserStore(now: () => number = Date.now): Promise<OutboxStore> {
  const database = await openDB<Shape>(NAME, 1, {
    upgrade(db) {
      db.createObjectStore('entries', { keyPath: 'sequence', autoIncrement: true }).createIndex('person', 'person');
      db.createObjectStore('device');
    },
    // Another page wants it gone.
    blocking(_current, _wanted, event) { (event.target as IDBDatabase).close(); },
  });
  return {
    device: await deviceOf(database),
    all: async (person) => {
      const entries = (await database.getAllFromIndex('entries', 'person', person)) as Entry[];
      const old = entries.filter(({ madeAt }) => now() - madeAt > OLDEST_MS);
      await removeFrom(database, old.map(({ sequence }) => sequence));
      return entries.filter((entry) => !old.includes(entry));
    },
    add: async (entry, madeAt) => {
      const act = database.transaction('entries', 'readwrite');
      for (const old of (await act.store.index('person').getAll(entry.person)) as Entry[]) if (isReplacedBy(old, entry)) await act.store.delete(old.sequence);
      const sequence = await act.store.add({ ...entry, madeAt });
      await act.done;
      return { ...entry, madeAt, sequence };
    },
    settle: async (sequence, answer) => {
      const act = database.transaction('entries', 'readwrite');
      const entry = await act.store.get(sequence);
      if (entry?.keepsAnswer === true) await act.store.put({ ...entry, body: { json: null }, answer });
      else await act.store.delete(sequence);
      await act.done;
    },
    remove: (sequences) => removeFrom(database, sequences),
    removeAll: async (person) => removeFrom(database, await database.getAllKeysFromIndex('entries', 'person', person)),
  };
}

async function removeFrom(database: IDBPDatabase<Shape>, sequences: readonly number[]): Promise<void> {
  if (sequences.length === 0) return;
  const act = database.transaction('entries', 'readwrite');
  await Promise.all([...sequences.map((sequence) => act.store.delete(sequence)), act.done]);
}

async function deviceOf(database: IDBPDatabase<Shape>): Promise<string> {
  const act = database.transaction('device', 'readwrite');
  const device = (await act.store.get('id')) ?? newDevice();
  await act.store.put(device, 'id');
  await act.done;
  return device;
}

export function memoryStore(): OutboxStore {
  let entries: readonly Entry[] = [];
  let last = 0;
  return {
    device: newDevice(),
    all: (person) => Promise.resolve(entries.filter((entry) => entry.person === person)),
    add: (entry, madeAt) => {
      last += 1;
      const added = { ...entry, madeAt, sequence: last };
      entries = [...entries.filter((old) => !isReplacedBy(old, entry)), added];
      return Promise.resolve(added);
    },
    settle: (sequence, answer) => {
      entries = entries.flatMap((entry) => (entry.sequence !== sequence ? [entry] : entry.keepsAnswer === true ? [{ ...entry, answer }] : []));
      return Promise.resolve();
    },
    remove: (sequences) => {
      entries = entries.filter(({ sequence }) => !sequences.includes(sequence));
      return Promise.resolve();
    },
    removeAll: (person) => {
      entries = entries.filter((entry) => entry.person !== person);
      return Promise.resolve();
    },
  };
}
