import { describe, expect, test } from 'vitest';
import { madeFor } from '#core/craft/made-for.ts';
import { NOTHING_WOVEN } from '#core/craft/rest/woven-so-far.ts';
import type { GatheringLine } from '#core/gathering/merge.ts';
import { gatherRows, loomWords, partRows, partsWords, yarnSum, type ShownFor } from '#core/gathering/rows.ts';
import { lowTide } from '../../../support/low-tide.ts';

const pattern = await lowTide();
const shownFor = (mine = {}, woven = NOTHING_WOVEN): ShownFor => ({ made: madeFor(pattern, mine, 'cm', woven), pattern, units: 'cm' });
let count = 0;
function line(part: number, given: Partial<GatheringLine>): GatheringLine {
  count += 1;
  return { publicId: `id${count}`, part, kind: 'tool', name: 'Blunt needle', amountKey: null, amountText: '1', standIn: null, untilPart: null, note: null, lookOut: null, getFrom: null, ticked: false, ...given };
}
const estuary = { kind: 'yarn', name: 'Fenwool 6/2, Estuary', amountText: null } as const;
const textOf = (amount: unknown): string => (Array.isArray(amount) ? amount.map(({ text }: { text: string }) => text).join('') : String(amount));

describe('the list of a whole series', () => {
  test('a tool that three parts ask for stands once, and one tick is enough', () => {
    const rows = gatherRows([line(1, {}), line(2, { ticked: true }), line(5, {})], shownFor());
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({ ticked: true, when: 'Parts 1, 2 and 5' });
    expect(rows[0]?.items).toHaveLength(3);
  });

  test('the yarn of one band, and what is left of a yarn, are within the yarn’s own line', () => {
    const rows = gatherRows([line(1, { ...estuary, amountKey: 'yarn.shore' }), line(4, { ...estuary, amountKey: 'band.dark-shore.yarn' }), line(5, { ...estuary, amountText: 'what is left of it' })], shownFor());
    expect(rows).toHaveLength(1);
    expect(textOf(rows[0]?.amount)).toMatch(/^\d+\u00a0m$/);
    // Of the same yarn another role is woven, too: balls are told of both together.
    expect(rows[0]?.also).toMatch(/^\d+\u00a0g$/);
  });

  test('her own yarn stands under its own name, without what could stand in for the other', () => {
    const mine = { yarns: { shore: { label: 'Attic blue', tex: 300 } } };
    const [row] = gatherRows([line(1, { ...estuary, amountKey: 'yarn.shore', standIn: 'Any dark yarn' })], shownFor(mine));
    expect(row).toMatchObject({ name: 'Attic blue (for Fenwool 6/2, Estuary)', standIn: '' });
  });

  test('says by what a good one is known, and where to get it, in the words of the first part that has any', () => {
    const [row] = gatherRows([line(1, {}), line(2, { lookOut: 'Its eye takes the yarn', getFrom: 'A haberdasher' }), line(3, { lookOut: 'Blunt' })], shownFor());
    expect(row).toMatchObject({ lookOut: 'Its eye takes the yarn', getFrom: 'A haberdasher' });
  });

  test('of a yarn she has her own of, nobody is sent to buy another', () => {
    const [row] = gatherRows([line(1, { ...estuary, amountKey: 'yarn.shore', getFrom: 'A yarn shop', lookOut: 'Two plies' })], shownFor({ yarns: { shore: { label: 'Attic blue', tex: 300 } } }));
    expect(row).toMatchObject({ lookOut: '', getFrom: '' });
  });

  test('without a piece the teacher’s own words are left', () => {
    const [row] = gatherRows([line(1, { ...estuary, amountKey: 'yarn.shore', amountText: 'one ball' })], { made: null, pattern: null, units: 'cm' });
    expect(row).toMatchObject({ amount: 'one ball', also: '' });
  });
});

test('the list of one part keeps its own amount, and ticks the thing wherever it is asked for', () => {
  const lines = [line(1, { ...estuary, amountKey: 'yarn.shore', ticked: true }), line(4, { ...estuary, amountKey: 'band.dark-shore.yarn' })];
  const [whole] = gatherRows(lines, shownFor());
  const [own] = partRows(lines, 4, shownFor());
  expect(own).toMatchObject({ ticked: true, key: whole?.key, when: 'Part 4' });
  expect(textOf(own?.amount)).not.toBe(textOf(whole?.amount));
});

test.each([
  [[3], null, 'Part 3'],
  [[1, 2], 7, 'Parts 1 and 2, kept until Part 7'],
  [[6, 2, 3, 4], 6, 'Parts 2 to 4 and 6'],
])('parts %j until %s read: %s', (parts, until, words) => {
  expect(partsWords(parts, until)).toBe(words);
});

test('the loom is told as its owner would tell it', () => {
  const made = madeFor(pattern, { loom: { insideWidthMm: 360, nailPitchMm: 4 }, widthMm: 300, endsTogether: 2 }, 'cm');
  expect(made && loomWords(made, 'cm')).toMatch(/^36\u00a0cm inside, nails every 4\u00a0mm.*, doubled ends: \d+ ends, woven 30\u00a0cm wide$/);
});

test('a piece that no longer fits the changed pattern gives way to it, and says why', () => {
  const made = madeFor(pattern, { loom: { insideWidthMm: 60 } }, 'cm');
  expect(made?.isOwn).toBe(false);
  expect(made?.problems[0]?.path).toBe('/loom/insideWidthMm');
});

describe('the list of a piece that is half woven', () => {
  // Both bands of fringe and the foot between them are finished.
  const begun = { bandsDone: pattern.bands.findIndex(({ name }) => name === 'dark-shore') };
  const list = (key: string, woven = begun) => gatherRows([line(1, { ...estuary, amountKey: key })], shownFor({}, woven))[0];
  const metres = (key: string, woven = begun): number => Number.parseFloat(textOf(list(key, woven)?.amount));

  test('asks for the yarn of what is still to weave', () => {
    expect(metres('yarn.shore')).toBeGreaterThan(0);
    expect(metres('yarn.shore')).toBeLessThan(metres('yarn.shore', NOTHING_WOVEN));
    expect(metres('yarn.water')).toBe(metres('yarn.water', NOTHING_WOVEN));
  });

  test('asks for none of a yarn that is woven, nor for the warp on the loom', () => {
    expect(list('yarn.fringe')).toMatchObject({ amount: 'Woven', also: '' });
    expect(list('warp')).toMatchObject({ amount: 'On the loom', also: '' });
    const made = shownFor({}, begun).made;
    const rest = made?.halfway?.rest;
    expect(made && yarnSum(made).lengthMm).toBeCloseTo(Object.values(rest?.yarns ?? {}).reduce((sum, { withMarginMm }) => sum + withMarginMm, 0), 6);
  });

  test('of a part asks for the yarn of its band only while that is not woven', () => {
    const ofPart = (key: string) => partRows([line(4, { ...estuary, amountKey: key })], 4, shownFor({}, begun))[0]?.amount;
    expect(ofPart('band.foot.yarn')).toBe('Woven');
    expect(textOf(ofPart('band.dark-shore.yarn'))).toMatch(/m$/);
  });
});
