import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fitPiece } from '#core/craft/fit.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { mergeShopping, type PieceToShop, type Shopping } from '#core/craft/shopping/merge-shopping.ts';
import { cases } from '../../../../support/random-cases.ts';
import { lowTide } from '../../../../support/low-tide.ts';
import { pieceWith, planOf } from '../a-piece.ts';

const pattern = await lowTide();
const BALL = { metres: 90, grams: 50 };
const WOOL = { label: 'Fenwool 6/2, Sky', metresPer100g: 180, ball: BALL } as const;
const SKY: FrameLoomPiece = pieceWith({ yarns: { ground: WOOL } });
const shop = (...pieces: PieceToShop[]): Shopping => {
  const merged = mergeShopping(pieces);
  if (!merged.ok) throw new Error(JSON.stringify(merged.problems));
  return merged.value;
};

describe('yarn', () => {
  // 277 rows of 328.4816 mm and 12 loads of 8 m with 100 mm tails: 92.189 m, with 15 % 106.02 m: two balls of 90 m for
  // one piece, but three for two pieces, 212.03 m of 270.
  test('is added up before it is rounded to balls, and what is left over is told', () => {
    const [one, two] = [shop({ name: 'One', piece: SKY }), shop({ name: 'One', piece: SKY }, { name: 'Other', piece: SKY })];
    const wool = (list: Shopping) => list.yarns.find(({ name }) => name === WOOL.label);
    expect(wool(one)?.balls?.count).toBe(2);
    expect(wool(two)).toMatchObject({ balls: { count: 3 }, pieces: ['One', 'Other'] });
    expect((wool(two)?.withMarginMm ?? 0) / 1000).toBeCloseTo(212.03, 1);
    expect((wool(two)?.balls?.leftOverMm ?? 0) / 1000).toBeCloseTo(270 - 212.03, 1);
  });

  // 177 rows and 8 loads: 58.94 m, with 15 % 67.78 m: one ball of 90 m, and no warp.
  test('of a piece half woven is that of what is still to weave', () => {
    const list = shop({ name: 'One', piece: SKY, woven: { bandsDone: 0, rows: 100 } });
    expect(list.yarns.map(({ name, balls }) => [name, balls?.count])).toEqual([[WOOL.label, 1]]);
    expect(list.yarns[0]?.withMarginMm).toBeCloseTo(67_780, -2);
    expect(shop({ name: 'One', piece: SKY, woven: { bandsDone: 9 } })).toEqual(shop({ name: 'One', piece: SKY }));
  });

  test('is the same only with label, fineness, colour and ball', () => {
    const other = (yarn: FrameLoomPiece['yarns'][string]): number => shop({ name: 'A', piece: SKY }, { name: 'B', piece: pieceWith({ yarns: { ground: yarn } }) }).yarns.filter(({ isWarp }) => !isWarp).length;
    expect(other({ ...WOOL, label: 'FENWOOL 6/2, sky ' })).toBe(1);
    expect(other({ ...WOOL, label: 'Fenwool 6/2, Mud' })).toBe(2);
    expect(other({ ...WOOL, metresPer100g: 170 })).toBe(2);
    expect(other({ ...WOOL, colour: '#112233' })).toBe(2);
    expect(other({ ...WOOL, ball: { metres: 180, grams: 100 } })).toBe(2);
  });

  test('of no name and no colour is never taken for another', () => {
    const bare = pieceWith({});
    expect(shop({ name: 'A', piece: bare }, { name: 'B', piece: bare }).yarns).toHaveLength(4);
  });

  test('of two roles in one piece is one yarn, and the warp comes first', () => {
    const { yarns } = shop({ name: 'Low Tide', piece: pattern });
    expect(yarns[0]).toMatchObject({ isWarp: true });
    // Shore and ridge are both Estuary, the ridge in four strands.
    const plan = planOf(pattern);
    expect(yarns.filter(({ name }) => name === 'Fenwool 6/2, Estuary')).toEqual([expect.objectContaining({ netMm: (plan.yarns['shore']?.netMm ?? 0) + (plan.yarns['ridge']?.netMm ?? 0) })]);
  });

  test('that leaves too little over is warned of', () => {
    // 106.02 m of two balls of 54 m leave 1.98 m.
    const merged = mergeShopping([{ name: 'One', piece: pieceWith({ yarns: { ground: { ...WOOL, ball: { metres: 54, grams: 30 } } } }) }]);
    expect(merged.ok && merged.warnings.map(({ code, path }) => `${code} ${path}`)).toEqual(['W_TIGHT /yarns/1']);
  });

  test('of a piece on a student’s own loom is hers', () => {
    const fitted = fitPiece(pattern, { yarns: { water: { label: 'Attic', tex: 330 } } });
    const { yarns } = shop({ name: 'Mine', piece: fitted.ok ? fitted.value.piece : null });
    expect(yarns.map(({ name }) => name)).toContain('Attic');
  });
});

test('rods and cards are used again, dowels and cords stay in their pieces', () => {
  const looped = pieceWith({ dowel: { diameterMm: 12, lengthMm: 380 }, bands: [{ technique: 'loop-pile', yarn: 'ground', rodMm: 8, rows: 3, heightMm: 12 }, { technique: 'tabby', yarn: 'ground', fill: true }] });
  const { tools } = shop({ name: 'A', piece: looped }, { name: 'B', piece: looped });
  expect(tools.map(({ kind, count, acrossMm, pieces }) => [kind, count, acrossMm, pieces.length])).toEqual([
    ['rod', 1, 8, 2], ['spacer-card', 1, 60, 2], ['dowel', 2, 12, 2], ['cord', 2, undefined, 2],
  ]);
});

test('nothing to shop for is an empty list, and a piece that cannot be woven is refused at its place', () => {
  expect(shop()).toEqual({ yarns: [], tools: [] });
  const merged = mergeShopping([{ name: 'A', piece: SKY }, { name: '', piece: { ...SKY, size: { widthMm: -1, heightMm: 400 } } }]);
  expect(merged.ok ? [] : merged.problems.map(({ code, path }) => `${code} ${path}`)).toEqual(['E_ENUM /pieces/1/name', 'E_RANGE /pieces/1/piece/size/widthMm']);
});

test('the total of a merged list is the sum of its pieces, and never more balls than bought one by one', () => {
  const piece = fc.record({
    width: fc.double({ min: 100, max: 380, noNaN: true }),
    colour: fc.constantFrom('#111111', '#222222', '#333333'),
    label: fc.constantFrom('Fenwool', 'Dune'),
  }).map(({ width, colour, label }) => pieceWith({ size: { widthMm: width, heightMm: 400 }, yarns: { ground: { label, colour, metresPer100g: 180, ball: BALL } }, warp: { yarn: { label: 'Warp 12/6', tex: 400, ball: { metres: 250, grams: 100 } }, parity: 'even' } }));
  fc.assert(
    fc.property(fc.array(piece, { minLength: 1, maxLength: 4 }), (pieces) => {
      const plans = pieces.map(planOf);
      const { yarns } = shop(...pieces.map((one, index) => ({ name: `Piece ${String(index)}`, piece: one })));
      const sum = plans.reduce((total, { warp, yarns: own }) => total + warp.withMarginMm + Object.values(own).reduce((mm, { withMarginMm }) => mm + withMarginMm, 0), 0);
      const balls = plans.reduce((total, { warp, yarns: own }) => total + (warp.balls ?? 0) + Object.values(own).reduce((count, one) => count + (one.balls ?? 0), 0), 0);
      expect(yarns.reduce((mm, { withMarginMm }) => mm + withMarginMm, 0)).toBeCloseTo(sum, 3);
      expect(yarns.reduce((count, one) => count + (one.balls?.count ?? 0), 0)).toBeLessThanOrEqual(balls);
    }),
    { numRuns: cases(1000), seed: 20261101 },
  );
});
