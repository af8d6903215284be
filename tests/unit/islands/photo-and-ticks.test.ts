import { describe, expect, test, vi } from 'vitest';
import { photoFault, sentOf } from '#islands/photo/photo-rules.ts';
import { uploadAfter, type UploadState } from '#islands/photo/upload-state.ts';
import { TickQueue, type SendAnswer, type TickChange } from '#islands/ticks/tick-queue.ts';

const change = (id: string, ticked = true): TickChange => ({ id, body: { ticked, changedAt: '2026-12-01T10:00:00Z' } });
function storage(text: string | null = null) {
  const kept = { text };
  return { kept, read: () => kept.text, write: (next: string | null) => { kept.text = next; } };
}

describe('ticks on their way', () => {
  test('leave the device only when the server has them', async () => {
    const store = storage();
    const answers: SendAnswer[] = ['later', 'taken'];
    const queue = new TickQueue(store, () => Promise.resolve(answers.shift() ?? 'taken'));
    queue.put(change('needle'));
    await queue.flush();
    expect(queue.current()).toMatchObject({ waits: 'later', unsent: new Set(['needle']) });
    expect(store.kept.text).toContain('needle');
    await queue.flush();
    expect(queue.current()).toMatchObject({ waits: 'nothing', unsent: new Set() });
    expect(store.kept.text).toBeNull();
  });

  test('a later change of the same thing takes the place of the one that waits', async () => {
    const send = vi.fn((_change: TickChange): Promise<SendAnswer> => Promise.resolve('later'));
    const queue = new TickQueue(storage(), send);
    queue.put(change('needle', true));
    await queue.flush();
    queue.put(change('needle', false));
    await queue.flush();
    expect(queue.kept()).toEqual(new Map([['needle', false]]));
  });

  test('a change made while the one before is on its way is not lost', async () => {
    let answer: (given: SendAnswer) => void = () => undefined;
    const sent: boolean[] = [];
    const queue = new TickQueue(storage(), ({ body }) => new Promise((resolve) => { sent.push(body.ticked); answer = resolve; }));
    queue.put(change('needle', true));
    queue.put(change('needle', false));
    const done = queue.flush();
    answer('taken');
    await vi.waitFor(() => { expect(sent).toEqual([true, false]); });
    answer('taken');
    await done;
    expect(queue.kept().size).toBe(0);
  });

  test('a change made just as a run ends is sent all the same', async () => {
    const send = vi.fn((): Promise<SendAnswer> => Promise.resolve('taken'));
    const queue = new TickQueue(storage(), send);
    const first = queue.flush();
    queue.put(change('needle'));
    await first;
    expect(send).toHaveBeenCalledTimes(1);
    expect(queue.kept().size).toBe(0);
  });

  test('what the server will never take is told, and does not hold up the rest', async () => {
    const queue = new TickQueue(storage(), ({ id }) => Promise.resolve(id === 'gone' ? 'refused' : 'taken'));
    queue.put(change('gone'));
    queue.put(change('needle'));
    await queue.flush();
    expect(queue.current()).toMatchObject({ refused: new Set(['gone']), unsent: new Set() });
  });

  test('what was kept by a page before is sent by the next; what is no tick is dropped', () => {
    const store = storage(JSON.stringify([change('needle'), { id: 3 }, 'x', { id: 'y', body: {} }]));
    expect(new TickQueue(store, () => Promise.resolve('later')).kept()).toEqual(new Map([['needle', true]]));
    expect(new TickQueue(storage('{broken'), () => Promise.resolve('later')).kept().size).toBe(0);
  });
});

describe('what is taken as a photo', () => {
  test.each([
    [{ name: 'loom.jpg', size: 2_000_000, type: 'image/jpeg' }, null],
    [{ name: 'loom.heic', size: 2_000_000, type: '' }, /Send it as JPEG/],
    [{ name: 'notes.pdf', size: 2_000, type: 'application/pdf' }, /Use JPEG, PNG or WebP, up to 25 MB/],
    [{ name: 'loom.png', size: 31_000_000, type: 'image/png' }, /^This photo is 31\.0\u00a0MB\. At most 25 MB work/],
    [{ name: 'loom.webp', size: 0, type: 'image/webp' }, /empty/],
  ])('%j', (file, fault) => {
    if (fault === null) expect(photoFault(file)).toBeNull();
    else expect(photoFault(file)).toMatch(fault);
  });

  test('how far it has come is told in the same unit', () => {
    expect(sentOf(3_100_000, 5_000_000)).toBe('3.1 of 5.0\u00a0MB');
    expect(sentOf(6_000_000, 5_000_000)).toBe('5.0 of 5.0\u00a0MB');
  });
});

describe('a photo on its way', () => {
  const file = new File(['x'], 'loom.jpg', { type: 'image/jpeg' });
  const after = (...events: Parameters<typeof uploadAfter>[1][]): UploadState => events.reduce(uploadAfter, { at: 'choosing' });

  test('waits where the line dropped, counts the tries, and goes on', () => {
    const dropped = after({ kind: 'choose', file }, { kind: 'send' }, { kind: 'progress', sent: 5 }, { kind: 'dropped' });
    expect(dropped).toMatchObject({ at: 'waiting', sent: 5, tries: 1 });
    expect(uploadAfter(dropped, { kind: 'dropped' })).toMatchObject({ tries: 2 });
    expect(uploadAfter(dropped, { kind: 'progress', sent: 1 })).toMatchObject({ at: 'sending', sent: 1 });
  });

  test('stopped, it is still chosen; refused, another is asked for with the reason', () => {
    expect(after({ kind: 'choose', file }, { kind: 'send' }, { kind: 'stop' })).toEqual({ at: 'chosen', file });
    expect(after({ kind: 'choose', file }, { kind: 'send' }, { kind: 'refused', says: 'No.' })).toEqual({ at: 'choosing', fault: 'No.' });
  });

  test('news of an upload that was put away changes nothing', () => {
    expect(after({ kind: 'choose', file }, { kind: 'put-away' }, { kind: 'progress', sent: 9 }, { kind: 'done' })).toEqual({ at: 'choosing' });
  });
});
