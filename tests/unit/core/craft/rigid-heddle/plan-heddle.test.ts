import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { amountKeysOf } from '#core/craft/amounts.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { CRAFTS } from '#core/craft/crafts.ts';
import { pickGeometry, pickLength } from '#core/craft/picks.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { HeddlePiece, HeddlePlan } from '#core/craft/rigid-heddle/piece.ts';
import { cases } from '../../../../support/random-cases.ts';

const SCARF: HeddlePiece = CRAFTS['rigid-heddle'].example;
function planOf(piece: HeddlePiece): HeddlePlan {
  const planned = planPiece(piece);
  if (!planned.ok) throw new Error(JSON.stringify(planned.problems));
  return planned.value;
}

describe('a cloth on a rigid heddle', () => {
  test('a scarf 20 by 150 cm at ten to the inch: 90 ends of 2564.386 mm, 230.795 m of warp (reckoned a second way by hand)', () => {
    const { ends, warpEndMm, yarns } = planOf(SCARF);
    expect(ends.raw).toBeCloseTo(90.0917, 4);
    expect(ends.count).toBe(90);
    expect(warpEndMm).toBeCloseTo(2564.386, 3);
    expect(yarns.warp.netMm / 1000).toBeCloseTo(230.795, 3);
  });

  test('84 ends of 68 inches are 158.67 yards, where a project book lists 160', () => {
    const piece: HeddlePiece = { ...SCARF, size: { widthMm: 21 * 25.4, lengthMm: 40 * 25.4 }, heddle: { spacingMm: 25.4 / 4 }, allowances: { drawIn: 0, widthShrinkage: 0, lengthShrinkage: 0, takeUp: 0, fringeMm: 4 * 25.4, wasteMm: 24 * 25.4 } };
    const { ends, yarns } = planOf(piece);
    expect(ends.count).toBe(84);
    expect(yarns.warp.netMm / 914.4).toBeCloseTo(158.6667, 4);
  });

  test('weft bends as in Peirce’s balanced cloth', () => {
    const plan = planOf(SCARF);
    const d = 0.0360635898 * Math.sqrt(250) / 0.9;
    const laid = pickGeometry({ spacingMm: 2.54, warpDiameterMm: d, weftDiameterMm: d, pickSpacingMm: 2.5, mode: 'balanced' });
    expect(plan.weft.pickMm).toBeCloseTo(laid === undefined ? 0 : pickLength(90, laid), 6);
    expect(plan.picks).toBe(600);
  });

  test.each<[string, unknown, string]>([
    ['a heddle too narrow', { ...SCARF, heddle: { spacingMm: 2.54, widthMm: 200 } }, 'E_FIT /heddle/widthMm'],
    ['yarns too thick', { ...SCARF, yarns: { warp: { tex: 9000 }, weft: { tex: 9000 } } }, 'E_JAM /picksPerCm'],
    ['two ends', { ...SCARF, size: { widthMm: 4, lengthMm: 100 } }, 'E_RANGE /size/widthMm'],
    ['an unknown key', { ...SCARF, reed: 10 }, 'E_ENUM /reed'],
    ['text for a number', { ...SCARF, picksPerCm: '4' }, 'E_NUM /picksPerCm'],
  ])('%s is refused', (_, piece, problem) => {
    const planned = planPiece(piece);
    expect(planned.ok ? [] : planned.problems.map(({ code, path }) => `${code} ${path}`)).toEqual([problem]);
  });

  test('is drawn as balanced cloth, and tells its amounts', () => {
    const plan = planOf(SCARF);
    expect(drawCloth(clothOf(SCARF, plan, 'Scarf'), { id: 'a', as: 'hanging', width: 120 })).toContain('150\u00a0cm of tabby');
    expect(amountKeysOf(SCARF, plan)).toContain('yarn.warp.mass');
  });

  test('longer, wider or with more allowance never needs less yarn, and the unit of typing does not matter', () => {
    fc.assert(fc.property(fc.double({ min: 60, max: 900, noNaN: true }), fc.double({ min: 100, max: 4000, noNaN: true }), fc.double({ min: 1, max: 1.5, noNaN: true }), (widthMm, lengthMm, more) => {
      const all = (piece: HeddlePiece): number => { const { yarns } = planOf(piece); return yarns.warp.netMm + yarns.weft.netMm; };
      const piece = { ...SCARF, size: { widthMm, lengthMm } };
      const before = all(piece);
      expect(all({ ...SCARF, size: { widthMm: widthMm * more, lengthMm } })).toBeGreaterThanOrEqual(before - 1e-6);
      expect(all({ ...SCARF, size: { widthMm, lengthMm: lengthMm * more } })).toBeGreaterThanOrEqual(before - 1e-6);
      expect(all({ ...piece, allowances: { ...SCARF.allowances, takeUp: 0.2 } })).toBeGreaterThanOrEqual(before);
      expect(all({ ...SCARF, size: { widthMm: (widthMm / 25.4) * 25.4, lengthMm: (lengthMm / 25.4) * 25.4 } })).toBeCloseTo(before, 3);
    }), { numRuns: cases(1000) });
  });

  test('nothing a person may send makes it throw', () => {
    fc.assert(fc.property(fc.jsonValue({ maxDepth: 4 }), fc.constantFrom('size', 'heddle', 'yarns', 'picksPerCm', 'pieces', 'allowances'), (nonsense, key) => {
      expect(() => planPiece({ ...SCARF, [key]: nonsense })).not.toThrow();
    }), { numRuns: cases(1500) });
  });
});
