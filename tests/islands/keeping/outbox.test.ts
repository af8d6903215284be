import 'fake-indexeddb/auto';
import { IDBFactory } from 'fake-indexeddb';
import { beforeEach, describe, expect, test, vi } from 'vitest';
import { browserStore, memoryStore, type Entry, type OutboxStore } from '#islands/keeping/outbox-store.ts';
import { isWaiting, Outbox } from '#islands/keeping/outbox.ts';
import type { SendAnswer } from '#islands/keeping/send-entry.ts';

const tick = (name: string, ticked = true) => ({ kind: 'tick', name, address: '/api/ticks', body: { json: { ticked } }, keepsAnswer: true });
const taken: SendAnswer = { kind: 'taken', answer: { revision: 1 } };

beforeEach(() => { globalThis.indexedDB = new IDBFactory(); });

describe.each([['the browser’s database', () => browserStore()], ['the page’s memory', () => Promise.resolve(memoryStore())]])('the outbox in %s', (_where, open) => {
  let store: Promise<OutboxStore>;
  beforeEach(() => { store = open(); });
  const outboxOf = (person: string, send: (entry: Entry, device: string) => Promise<SendAnswer>) => new Outbox(person, store, send);
  const waiting = (outbox: Outbox): string[] => outbox.current().entries.filter(isWaiting).map(({ name }) => name);

  test('shows at once what is put in, and lets go of it only when the house has it', async () => {
    const answers: SendAnswer[] = [{ kind: 'away' }, taken];
    const outbox = outboxOf('maud', () => Promise.resolve(answers.shift() ?? taken));
    const kept = outbox.put(tick('needle'));
    expect(waiting(outbox)).toEqual(['needle']);
    await kept;
    await vi.waitFor(() => { expect(outbox.current().waits).toBe('later'); });
    expect((await (await store).all('maud')).map(isWaiting)).toEqual([true]);
    await outbox.flush();
    expect(outbox.current()).toMatchObject({ waits: 'nothing', entries: [{ name: 'needle', answer: { revision: 1 } }] });
    await outbox.put({ ...tick('needle', false), keepsAnswer: false });
    await vi.waitFor(async () => { expect(await (await store).all('maud')).toEqual([]); });
  });

  test('a later change of the same thing takes the place of the one that waits, under a higher number', async () => {
    const outbox = outboxOf('maud', () => Promise.resolve({ kind: 'away' }));
    await outbox.put(tick('needle', true));
    await outbox.put(tick('fork'));
    const [before] = await (await store).all('maud');
    await outbox.put(tick('needle', false));
    const entries = await (await store).all('maud');
    expect(entries.map(({ name, body }) => [name, body])).toEqual([['fork', { json: { ticked: true } }], ['needle', { json: { ticked: false } }]]);
    expect(entries[1]?.sequence).toBeGreaterThan(before?.sequence ?? Infinity);
  });

  test('a change made while the one before is on its way is not lost', async () => {
    let answer: (given: SendAnswer) => void = () => undefined;
    const sent: unknown[] = [];
    const outbox = outboxOf('maud', ({ body }) => new Promise((resolve) => { sent.push(body); answer = resolve; }));
    await outbox.put(tick('needle', true));
    await vi.waitFor(() => { expect(sent).toHaveLength(1); });
    await outbox.put(tick('needle', false));
    answer(taken);
    await vi.waitFor(() => { expect(sent).toHaveLength(2); });
    answer(taken);
    await vi.waitFor(() => { expect(waiting(outbox)).toEqual([]); });
    expect(sent).toEqual([{ json: { ticked: true } }, { json: { ticked: false } }]);
  });

  test('what the house will never take is told, and does not hold up the rest', async () => {
    const outbox = outboxOf('maud', ({ name }) => Promise.resolve(name === 'gone' ? { kind: 'refused', status: 404, says: 'It is not there.' } : taken));
    await outbox.put(tick('gone'));
    await outbox.put(tick('needle'));
    await vi.waitFor(() => { expect(outbox.current().entries).toMatchObject([{ name: 'needle', answer: { revision: 1 } }]); });
    expect(outbox.current().refused).toMatchObject([{ entry: { name: 'gone' }, says: 'It is not there.' }]);
  });

  test('a sort that the house is too busy for does not hold up another', async () => {
    const outbox = outboxOf('maud', ({ kind }) => Promise.resolve(kind === 'photo' ? { kind: 'later' } : taken));
    await outbox.put({ kind: 'photo', name: 'loom', address: '/api/photos', body: { form: [['note', 'slack?']] } });
    await outbox.put(tick('needle'));
    await vi.waitFor(() => { expect(waiting(outbox)).toEqual(['loom']); });
    expect(outbox.current().waits).toBe('later');
  });

  test('of two people on one device neither sends nor sees what is the other’s', async () => {
    const sent: string[] = [];
    const maud = outboxOf('maud', () => Promise.resolve({ kind: 'signed-out' }));
    await maud.put(tick('needle'));
    await vi.waitFor(() => { expect(maud.current().waits).toBe('signed-out'); });
    const jonas = outboxOf('jonas', ({ name }) => { sent.push(name); return Promise.resolve(taken); });
    await jonas.flush();
    expect([sent, jonas.current().entries]).toEqual([[], []]);
    await maud.empty();
    expect(await (await store).all('maud')).toEqual([]);
  });
});

test('a page opened later finds what waits, from the same device, and counts on', async () => {
  const before = new Outbox('maud', browserStore(), () => Promise.resolve({ kind: 'away' }));
  await before.put({ kind: 'photo', name: 'loom', address: '/api/photos', body: { form: [['photo', new Blob(['jpeg'])]] } });
  const [first] = before.current().entries;
  const sent: [number, string][] = [];
  const after = new Outbox('maud', browserStore(), ({ sequence }, device) => { sent.push([sequence, device]); return Promise.resolve(taken); });
  await after.flush();
  expect(sent).toEqual([[first?.sequence, (await browserStore()).device]]);
  await after.put(tick('needle'));
  expect((await (await browserStore()).all('maud')).map(({ sequence }) => sequence)).toEqual([(first?.sequence ?? 0) + 1]);
});
