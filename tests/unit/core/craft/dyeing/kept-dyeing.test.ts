import { describe, expect, test } from 'vitest';
import { amountOf } from '#core/craft/amounts.ts';
import { drawDyeing } from '#core/craft/dyeing/draw.ts';
import type { DyePiece } from '#core/craft/dyeing/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { expectKept } from '../../../../support/kept.ts';
import { tellFindings, tellPiece } from '../../../../support/tell-piece.ts';

const file = (name: string): URL => new URL(`../../../../fixtures/dyeing/${name}.json`, import.meta.url);

const WOOL: DyePiece = { craft: 'dyeing', fibre: { kind: 'wool', massG: 250 }, mordant: { agent: 'alum' }, tartar: {}, dye: { percent: 100 }, iron: {} };
const COTTON: DyePiece = { craft: 'dyeing', fibre: { kind: 'cotton', massG: 200, label: 'Fen cotton', colour: '#efe9da' }, mordant: { agent: 'aluminium-acetate', percent: 10 }, tannin: { percent: 6 }, dye: { percent: 150, label: 'Madder', colour: '#a4452f' }, liquorRatio: 40 };

const PIECES: Readonly<Record<string, DyePiece>> = {
  'wool, by the usual numbers': WOOL,
  'wool, by own numbers': { ...WOOL, mordant: { agent: 'alum', percent: 12 }, tartar: { percent: 5 }, iron: { percent: 1 }, liquorRatio: 10 },
  'cotton': COTTON,
  'cotton, by the usual numbers': { ...COTTON, mordant: { agent: 'aluminium-acetate' }, tannin: {} },
  'silk without a mordant': { craft: 'dyeing', fibre: { kind: 'silk', massG: 40 }, mordant: { agent: 'none' }, dye: { percent: 300 } },
  'some plant fibre': { ...COTTON, fibre: { kind: 'other-cellulose', massG: 15 } },
};

function drawn(piece: DyePiece): ReturnType<typeof drawDyeing> {
  const plan = planPiece(piece);
  if (!plan.ok) throw new Error('it cannot be dyed');
  return drawDyeing({ piece, plan: plan.value }, 'Skeins');
}

describe.each(Object.entries(PIECES))('a dyeing: %s', (name, piece) => {
  test('is reckoned, told and drawn as it was found right', () => {
    const { laid, ...rest } = drawn(piece);
    const strands = laid.map((item) => (typeof item === 'object' && 'way' in item ? `${item.colour} ${String(item.widthMm)} mm: ${item.way.map((at) => at.toFixed(1)).join(' ')}` : item));
    expectKept(file('told'), name, { ...tellPiece(piece), drawn: { ...rest, strands } });
  });
});

describe('skeins on a rod', () => {
  test('stand side by side without touching, each of nine strands that hang to 173 to 197 mm', () => {
    const { laid, widthMm } = drawn(WOOL);
    const ways = laid.flatMap((item) => (typeof item === 'object' && 'way' in item ? [item.way] : []));
    expect(ways).toHaveLength(4 * 9);
    // Four skeins of 64 mm, each in 86.4 mm of room.
    expect(widthMm).toBeCloseTo(4 * 86.4, 9);
    for (const [index, way] of ways.entries()) {
      const middle = 86.4 * (Math.floor(index / 9) + 0.5);
      expect(way[0]).toBeGreaterThanOrEqual(middle - 32);
      expect(way.at(-2)).toBeLessThanOrEqual(middle + 32);
      // A loop: as far out at its left as at its right, and over the rod at both.
      expect((way[0] ?? 0) + (way.at(-2) ?? 0)).toBeCloseTo(2 * middle, 9);
      expect([way[1], way.at(-1)]).toEqual([-12, -12]);
      expect(Math.max(...way.filter((_, at) => at % 2 === 1))).toBe(173 + 3 * (index % 9));
    }
  });

  test('are three without iron, and in the colours the piece says', () => {
    const colours = (piece: DyePiece): (string | undefined)[] => [...new Set(drawn(piece).laid.map((item) => (typeof item === 'object' && 'colour' in item ? item.colour : undefined)))];
    expect(colours(COTTON)).toHaveLength(4);
    expect(colours(COTTON)).toContain('#efe9da');
    expect(colours(COTTON).at(-1)).toBe('#a4452f');
    // With iron the last skein is darker than the dyed one.
    expect(colours(WOOL)).toHaveLength(5);
  });
});

describe('what is said of a dyeing', () => {
  test.each<[string, unknown]>([
    ['thirty per cent of alum, which is not too much', { ...WOOL, mordant: { agent: 'alum', percent: 30 } }],
    ['a third of acetate', { ...COTTON, mordant: { agent: 'aluminium-acetate', percent: 33 } }],
    ['much tartar', { ...WOOL, tartar: { percent: 40 } }],
    ['four per cent of iron, which is not too much', { ...WOOL, iron: { percent: 4 } }],
    ['more dyestuff than fibre, which is usual', { ...WOOL, dye: { percent: 200 } }],
    ['acetate for wool', { ...WOOL, mordant: { agent: 'aluminium-acetate' } }],
    ['tannin for wool', { ...WOOL, tannin: {} }],
    ['tannin and acetate for silk', { ...WOOL, fibre: { kind: 'silk', massG: 10 }, tannin: {}, mordant: { agent: 'aluminium-acetate' } }],
    ['linen with tannin but no mordant', { ...COTTON, fibre: { kind: 'linen', massG: 10 }, mordant: { agent: 'none' } }],
    ['a number for a mordant', { ...WOOL, mordant: { agent: 7 } }],
    ['a bath of nine litres for a kilogram', { ...WOOL, liquorRatio: 9 }],
    ['a bath of a hundred litres for a kilogram', { ...WOOL, liquorRatio: 100 }],
    ['labels nobody can read to the end', { ...WOOL, fibre: { ...WOOL.fibre, label: 'x'.repeat(121) }, dye: { percent: 100, label: 'y'.repeat(121) } }],
    ['colours in words', { ...WOOL, fibre: { ...WOOL.fibre, colour: 'white' }, dye: { percent: 100, colour: 'yellow' } }],
    ['no dyestuff', { ...WOOL, dye: { percent: 0 } }],
  ])('%s', (name, piece) => {
    expectKept(file('findings'), name, tellFindings(piece));
  });

  test.each([
    ['bath', '7.5 litres'], ['baths', '4 baths'], ['agent.tannin', 'This dyeing uses no “tannin”.'], ['agent', 'No amount is called “agent”.'], ['yarn.alum', 'No amount is called “yarn.alum”.'],
  ])('%s of 250 g of wool is %s', (key, expected) => {
    const plan = planPiece(WOOL);
    if (!plan.ok) throw new Error('it cannot be dyed');
    const amount = amountOf(key, WOOL, plan.value);
    expect(amount.ok ? amount.value.kind === 'count' && `${String(amount.value.count)} ${amount.value.many}` : amount.problems[0]?.message).toBe(expected);
  });
});
