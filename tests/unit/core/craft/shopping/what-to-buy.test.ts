import { describe, expect, test } from 'vitest';
import { EXAMPLE as KNOTTED } from '#core/craft/macrame/example.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { mergeShopping, type Shopping } from '#core/craft/shopping/merge-shopping.ts';
import { pieceWith, planOf, PLAIN_PIECE } from '../a-piece.ts';

const shop = (...pieces: { name: string; piece: unknown }[]): Shopping => {
  const merged = mergeShopping(pieces);
  if (!merged.ok) throw new Error(JSON.stringify(merged.problems));
  return merged.value;
};
const problems = (...pieces: unknown[]): string[] => {
  const merged = mergeShopping(pieces as { name: string; piece: unknown }[]);
  return merged.ok ? [] : merged.problems.map(({ code, path, message }) => `${code} ${path}: ${message}`);
};
const names = ({ yarns }: Shopping): string[] => yarns.map(({ name, isWarp, pieces }) => `${name}${isWarp ? ' (warp)' : ''} for ${pieces.join(', ')}`);

describe('a yarn on the list', () => {
  const sky = { tex: 555, colour: '#93A8A6' } as const;

  test('is the same for two pieces where it has no label but one colour, however that is written', () => {
    const [a, b] = [pieceWith({ yarns: { ground: sky } }), pieceWith({ yarns: { ground: { ...sky, colour: '#93a8a6' } } })];
    expect(names(shop({ name: 'A', piece: a }, { name: 'B', piece: b }))).toEqual(['Warp (warp) for A', 'Warp (warp) for B', 'ground for A, B']);
  });

  test('is never both warp and weft where no label says that it is one', () => {
    const piece = pieceWith({ yarns: { ground: sky }, warp: { ...PLAIN_PIECE.warp, yarn: sky } });
    expect(names(shop({ name: 'A', piece }))).toEqual(['Warp (warp) for A', 'ground for A']);
  });

  test('of one label serves as warp and weft, and stands among the warps', () => {
    const yarn = { ...sky, label: 'Fenwool' };
    const piece = pieceWith({ yarns: { ground: yarn }, warp: { ...PLAIN_PIECE.warp, yarn } });
    const list = shop({ name: 'A', piece });
    expect(names(list)).toEqual(['Fenwool (warp) for A']);
    const plan = planOf(piece);
    const metres = (plan.warp.withMarginMm + (plan.yarns['ground']?.withMarginMm ?? 0)) / 1000;
    // 555 g a kilometre.
    expect(list.yarns[0]?.massG).toBeCloseTo((metres * 555) / 1000, 6);
    expect(list.yarns[0]?.netMm).toBeCloseTo(plan.warp.netMm + (plan.yarns['ground']?.netMm ?? 0), 6);
    expect(list.yarns[0]).not.toHaveProperty('balls');
  });

  test('is left out where nothing is woven with it', () => {
    const piece = pieceWith({ yarns: { ...PLAIN_PIECE.yarns, spare: { tex: 300 } } });
    expect(names(shop({ name: 'A', piece }))).toEqual(['Warp (warp) for A', 'ground for A']);
  });
});

describe('tools on the list', () => {
  const told = (piece: FrameLoomPiece): unknown[] => shop({ name: 'A', piece }).tools.map(({ kind, acrossMm, lengthMm }) => [kind, acrossMm, lengthMm]);

  test('are a card of 325 by 60 mm for a piece without a dowel, and nothing else', () => {
    expect(told(pieceWith({}))).toEqual([['spacer-card', 60, 325]]);
  });

  test('hold a dowel as thick as the piece says, or as it takes not to sag', () => {
    const dowels = (diameterMm: number): unknown => told(pieceWith({ dowel: { diameterMm, lengthMm: 380 } }))[1];
    expect(dowels(25)).toEqual(['dowel', 25, 380]);
    const least = planOf(pieceWith({ dowel: { diameterMm: 1, lengthMm: 380 } })).cut.dowel?.minDiameterMm ?? 0;
    expect(least).toBeGreaterThan(1);
    expect(dowels(1)).toEqual(['dowel', least, 380]);
  });

  test('hold a rod for loops only where they are told by their rod', () => {
    const loops = (measure: { rodMm: number } | { loopMm: number }): FrameLoomPiece => pieceWith({ bands: [{ technique: 'loop-pile', yarn: 'ground', rows: 3, heightMm: 12, ...measure } as FrameLoomPiece['bands'][number], { technique: 'tabby', yarn: 'ground', fill: true }] });
    expect(told(loops({ rodMm: 8 }))[0]).toEqual(['rod', 8, undefined]);
    expect(told(loops({ loopMm: 12 }))).toHaveLength(1);
  });
});

describe('what cannot be shopped for', () => {
  test('is told at its place, once', () => {
    expect(problems({ name: 'Net', piece: KNOTTED })).toEqual(['E_ENUM /pieces/0/piece/craft: Only woven pieces can be put on one list.']);
    expect(problems({ name: 'A', piece: null })).toHaveLength(1);
    expect(problems({ name: 'A', piece: 'a hanging' })).toHaveLength(1);
    expect(problems({ name: 'A', piece: { ...PLAIN_PIECE, size: { widthMm: 300 } } }).map((line) => line.split(':')[0])).toEqual(['E_NUM /pieces/0/piece/size/heightMm']);
    expect(problems({ name: 'x'.repeat(201), piece: PLAIN_PIECE }).map((line) => line.split(':')[0])).toEqual(['E_RANGE /pieces/0/name']);
    expect(problems({ name: 'x'.repeat(200), piece: PLAIN_PIECE })).toEqual([]);
    expect(problems(...Array.from({ length: 51 }, () => ({ name: 'A', piece: PLAIN_PIECE })))).toHaveLength(1);
  });

  test('a piece that says no craft is asked for it', () => {
    const { craft: _, ...bare } = PLAIN_PIECE;
    expect(problems({ name: 'A', piece: bare })).toEqual([expect.stringMatching(/^E_ENUM \/pieces\/0\/piece\/craft: Craft is missing\./u)]);
  });
});
