import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { newerTally, type Tally } from '#core/following/row-count.ts';
import { RowStore, type RowsAnswer } from '#islands/lesson/row-store.ts';

/** The house as it keeps tallies; `gone` bands it passes over. */
function house(gone: readonly string[] = []) {
  const kept = new Map<string, Record<string, Tally>>();
  let isAway = false;
  return {
    away: (yes: boolean): void => { isAway = yes; },
    send: (device: string, tallies: Readonly<Record<string, Tally>>): Promise<RowsAnswer> => {
      if (isAway) return Promise.resolve({ kind: 'later' });
      const own = { ...kept.get(device) };
      for (const [band, tally] of Object.entries(tallies)) if (!gone.includes(band)) own[band] = own[band] === undefined ? tally : newerTally(own[band], tally);
      kept.set(device, own);
      const others: Record<string, number> = {};
      for (const [other, all] of kept) if (other !== device) for (const [band, { rows }] of Object.entries(all)) others[band] = (others[band] ?? 0) + rows;
      return Promise.resolve({ kind: 'taken', rows: { own, others } });
    },
  };
}

function device(name: string, send: ReturnType<typeof house>['send'], given: string | null = null) {
  let text = given;
  const storage = { read: () => text, write: (next: string | null) => { text = next; } };
  return { open: () => new RowStore(storage, send, () => name, {}), text: () => text, restore: (before: string | null) => { text = before; } };
}

describe('rows on a device', () => {
  test('are there again after the battery died, before anything was sent', () => {
    const site = house();
    site.away(true);
    const phone = device('phone', site.send);
    const store = phone.open();
    for (let row = 0; row < 7; row += 1) store.add(3, 'foot', 1);
    expect(phone.open().current()).toMatchObject({ counts: { foot: 7 }, chosen: { part: 3, band: 'foot' }, canUndo: true });
  });

  test('that the house had and the device lost come back', async () => {
    const site = house();
    const phone = device('phone', site.send);
    const store = phone.open();
    store.add(3, 'foot', 1);
    const before = phone.text();
    store.add(3, 'foot', 1);
    await store.flush();
    phone.restore(before);
    const again = phone.open();
    await again.flush();
    expect(again.current().counts).toEqual({ foot: 2 });
  });

  test('counted in two windows of one browser are all counted', () => {
    const site = house();
    site.away(true);
    const phone = device('phone', site.send);
    const [one, two] = [phone.open(), phone.open()];
    one.add(3, 'foot', 1);
    two.add(3, 'foot', 1);
    one.add(3, 'foot', 1);
    expect(one.current().counts).toEqual({ foot: 3 });
  });

  test('never fall below none, and undoing takes back only what was counted here', () => {
    const store = device('phone', house().send).open();
    store.add(3, 'foot', -4);
    expect(store.undo(3)).toBeUndefined();
    store.set(3, 'foot', 5);
    store.set(3, 'foot', 2);
    expect(store.current().counts).toEqual({ foot: 2 });
    expect(store.undo(3)).toBe('foot');
    expect(store.current().counts).toEqual({ foot: 5 });
  });

  test('of two devices come together whatever each did while the other was away, and no row is lost or doubled', async () => {
    const act = fc.record({ who: fc.constantFrom('phone' as const, 'tablet' as const), rows: fc.integer({ min: 1, max: 4 }), away: fc.boolean() });
    await fc.assert(fc.asyncProperty(fc.array(act, { maxLength: 12 }), async (acts) => {
      const site = house();
      const stores = { phone: device('phone', site.send).open(), tablet: device('tablet', site.send).open() };
      for (const { who, rows, away } of acts) {
        site.away(away);
        stores[who].add(3, 'foot', rows);
        await stores[who].flush();
      }
      site.away(false);
      for (const store of [stores.phone, stores.tablet, stores.phone]) await store.flush();
      const all = acts.reduce((sum, { rows }) => sum + rows, 0);
      for (const store of [stores.phone, stores.tablet]) expect(store.current().counts['foot'] ?? 0).toBe(all);
    }));
  });

  test('of a band that the pattern no longer has are let go, and the others are kept', async () => {
    const store = device('phone', house(['gone']).send).open();
    store.add(3, 'gone', 2);
    store.add(3, 'foot', 1);
    await store.flush();
    expect(store.current()).toMatchObject({ counts: { foot: 1 }, waits: 'nothing' });
  });

  test('in a storage that holds something else begin anew', () => {
    for (const text of ['', 'no json', '[]', '{"device":3}', '{"device":"d","own":{"foot":{"rows":"x"}},"others":[1],"done":[{"band":1}],"chosen":{"part":"3"}}']) {
      const store = device('phone', house().send, text).open();
      store.add(3, 'foot', 1);
      expect(store.current().counts, text).toEqual({ foot: 1 });
    }
  });
});
