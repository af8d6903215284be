import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { amountKeysOf, amountOf } from '#core/craft/amounts.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { CRAFTS } from '#core/craft/crafts.ts';
import { fitPiece } from '#core/craft/fit.ts';
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

  // 230.795 m of warp and 10 % in reserve are 253.9 m: two balls of 200 m.
  const LABELLED: HeddlePiece = { ...SCARF, yarns: { warp: { ...SCARF.yarns.warp, label: 'Fenwool', ball: { metres: 200, grams: 50 } }, weft: { tex: 250 } } };
  test.each([
    ['yarn.warp', 'Fenwool'], ['yarn.weft', 'weft'], ['yarn.warp.balls', 'Balls of Fenwool'],
    ['yarn.weft.balls', 'A yarn has mass and, where its label says, balls.'], ['yarn.warp.colour', 'A yarn has mass and, where its label says, balls.'],
    ['yarn.sky', 'No amount is called “yarn.sky”.'], ['heddle.width', 'Width in the heddle'], ['nails', 'No amount is called “nails”.'],
  ])('%s is told as %s', (key, label) => {
    const amount = amountOf(key, LABELLED, planOf(LABELLED));
    expect(amount.ok ? amount.value.label : amount.problems[0]?.message).toBe(label);
  });

  test('is bought by role, and a student’s own yarn and width go into it', () => {
    const heddle = CRAFTS['rigid-heddle'];
    expect(heddle.materials({ piece: LABELLED, plan: planOf(LABELLED) })).toMatchObject([{ key: 'yarn.warp', label: 'Fenwool', balls: 2 }, { key: 'yarn.weft', role: 'weft' }]);
    expect([heddle.roleOfKey('yarn.warp.mass', SCARF), heddle.roleOfKey('ends', SCARF)]).toEqual(['warp', undefined]);
    const fitted = fitPiece(SCARF, { widthMm: 100, yarns: { weft: { tex: 300 } } });
    // Half as wide: 45.05 ends of 90.09, 45.
    expect(fitted.ok && fitted.value).toMatchObject({ piece: { yarns: { warp: SCARF.yarns.warp, weft: { tex: 300 } } }, changes: ['There are 45 ends instead of 90.'] });
  });

  test('without allowances takes the usual ones, and two pieces share a warp', () => {
    const { allowances: _, ...bare } = SCARF;
    // 1500/(0.9 · 0.9) + 610 mm; 200/(0.92 · 0.9)/2.54 = 95.1 ends.
    expect(planOf(bare).warpEndMm).toBeCloseTo(1500 / 0.81 + 610, 9);
    expect(planOf(bare).ends.count).toBe(95);
    const two = planOf({ ...bare, pieces: 2, allowances: { gapMm: 100 } });
    expect(two.warpEndMm).toBeCloseTo(3000 / 0.81 + 100 + 610, 9);
    expect(two.picks).toBe(1200);
  });

  test('a cloth of too many ends is refused', () => {
    const planned = planPiece({ ...SCARF, size: { widthMm: 9000, lengthMm: 100 } });
    expect(planned.ok ? '' : planned.problems[0]?.message).toMatch(/ends are too many to weave with/);
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
