import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { DYE_CAUTIONS } from '#core/craft/dyeing/cautions.ts';
import { amountKeysOf, amountOf } from '#core/craft/amounts.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import type { DyePiece, DyePlan } from '#core/craft/dyeing/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { amountText } from '#core/units/format-amount.ts';
import { cases } from '../../../../support/random-cases.ts';

const WOOL: DyePiece = { craft: 'dyeing', fibre: { kind: 'wool', massG: 250 }, mordant: { agent: 'alum' }, tartar: {}, dye: { percent: 100 }, iron: {} };
const COTTON: DyePiece = { craft: 'dyeing', fibre: { kind: 'cotton', massG: 200 }, mordant: { agent: 'aluminium-acetate' }, tannin: {}, dye: { percent: 150 } };

function planOf(piece: DyePiece): DyePlan {
  const planned = planPiece(piece);
  if (!planned.ok) throw new Error(JSON.stringify(planned.problems));
  return planned.value;
}
const found = (piece: unknown): string[] => {
  const planned = planPiece(piece);
  return (planned.ok ? planned.warnings : planned.problems).map(({ code, path }) => `${code} ${path}`);
};

describe('a dyeing', () => {
  test('250 g of wool take 37.5 g of alum, 15 g of cream of tartar, 7.5 litres and 5 g of iron (percentages of published recipes)', () => {
    const { steps, bathLitres } = planOf(WOOL);
    expect(bathLitres).toBe(7.5);
    expect(steps.map(({ step }) => step)).toEqual(['scour', 'mordant', 'dye', 'iron']);
    expect(steps.flatMap(({ agents }) => agents.map(({ agent, massG }) => [agent, massG]))).toEqual([['alum', 37.5], ['tartar', 15], ['dye', 250], ['iron', 5]]);
  });

  test('cotton has tannin first, then aluminium acetate', () => {
    expect(planOf(COTTON).steps.map(({ step }) => step)).toEqual(['scour', 'tannin', 'mordant', 'dye']);
    expect(found(COTTON)).toEqual([]);
  });

  test('its cautions send to local rules and qualified people', () => {
    for (const { says } of DYE_CAUTIONS) expect(says).toMatch(/follow your local rules.*qualified person/s);
  });

  test.each<[string, unknown, string[]]>([
    ['copper', { ...WOOL, mordant: { agent: 'copper' } }, ['E_ENUM /mordant/agent']],
    ['chrome', { ...WOOL, mordant: { agent: 'chrome' } }, ['E_ENUM /mordant/agent']],
    ['tin', { ...WOOL, mordant: { agent: 'tin' } }, ['E_ENUM /mordant/agent']],
    ['tartar on cotton', { ...COTTON, tartar: {} }, ['E_ENUM /tartar']],
    ['potash alum on cotton', { ...COTTON, mordant: { agent: 'alum' } }, ['E_ENUM /mordant/agent']],
    ['acetate on cotton without tannin', { ...COTTON, tannin: undefined }, ['W_TANNIN /tannin']],
    ['too much alum', { ...WOOL, mordant: { agent: 'alum', percent: 31 } }, ['W_HIGH /mordant/percent']],
    ['much iron', { ...WOOL, iron: { percent: 5 } }, ['W_FIBRE_DAMAGE /iron/percent']],
    ['text for a mass', { ...WOOL, fibre: { kind: 'wool', massG: '250' } }, ['E_NUM /fibre/massG']],
    ['an unknown key', { ...WOOL, salt: 1 }, ['E_ENUM /salt']],
  ])('%s is told', (_, piece, expected) => {
    expect(found(piece)).toEqual(expected);
  });

  test('the refusal of a poisonous metal says why, and what works', () => {
    const planned = planPiece({ ...WOOL, mordant: { agent: 'copper' } });
    expect(planned.ok ? '' : planned.problems[0]?.message).toMatch(/poisonous.*Alum for wool/s);
  });

  test('tells its amounts, and is drawn as skeins with words', () => {
    const plan = planOf(WOOL);
    const alum = amountOf('agent.alum', WOOL, plan);
    expect(alum.ok && amountText(alum.value, 'cm').replaceAll('\u00a0', ' ')).toBe('38 g');
    expect(amountKeysOf(WOOL, plan)).toEqual(['fibre', 'bath', 'baths', 'agent.alum', 'agent.tartar', 'agent.dye', 'agent.iron', 'hours']);
    expect(drawCloth(clothOf(WOOL, plan, 'Weld'), { id: 'a', as: 'hanging', width: 300 })).toContain('aria-label="Weld, dyeing, 4 skeins on a rod: as it was, mordanted, dyed, saddened with iron. 4 baths."');
  });

  test('twice the fibre needs twice of everything, and more of an agent never less', () => {
    fc.assert(fc.property(fc.double({ min: 1, max: 5000, noNaN: true }), fc.double({ min: 1, max: 30, noNaN: true }), (massG, percent) => {
      const at = (grams: number, share: number): number => planOf({ ...WOOL, fibre: { kind: 'wool', massG: grams }, mordant: { agent: 'alum', percent: share } }).steps[1]?.agents[0]?.massG ?? 0;
      expect(at(2 * massG, percent)).toBeCloseTo(2 * at(massG, percent), 9);
      expect(at(massG, percent + 1)).toBeGreaterThan(at(massG, percent));
    }), { numRuns: cases(1000) });
  });

  test('nothing a person may send makes it throw', () => {
    fc.assert(fc.property(fc.jsonValue({ maxDepth: 4 }), fc.constantFrom('fibre', 'mordant', 'tartar', 'tannin', 'dye', 'iron', 'liquorRatio'), (nonsense, key) => {
      expect(() => planPiece({ ...WOOL, [key]: nonsense })).not.toThrow();
    }), { numRuns: cases(1500) });
  });
});
