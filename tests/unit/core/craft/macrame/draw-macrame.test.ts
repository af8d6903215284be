import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { amountChoices } from '#core/craft/amount-choices.ts';
import { amountKeysOf, amountOf } from '#core/craft/amounts.ts';
import { clothOf } from '#core/craft/cloth-of.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { fitPiece } from '#core/craft/fit.ts';
import { EXAMPLE } from '#core/craft/macrame/example.ts';
import type { MacramePiece, Section } from '#core/craft/macrame/piece.ts';
import { yarnTable } from '#core/gathering/yarn-table.ts';
import { amountText } from '#core/units/format-amount.ts';
import { cases } from '../../../../support/random-cases.ts';
import { planOf } from './a-hanging.ts';

const PLAN = planOf(EXAMPLE);
const draw = (piece: MacramePiece): string => drawCloth(clothOf(piece, planOf(piece), 'Net <b>'), { id: 'a', as: 'hanging', width: 320 });

describe('a knotted piece drawn', () => {
  test('says itself in words, in the person’s own units, with the title made safe', () => {
    expect(draw(EXAMPLE)).toContain('aria-label="Net &#60;b&#62;, knotted hanging, 6 cords on a rod, 36\u00a0cm long. From the top: body of 6 folded cords: a rib of 11 double half hitches, a net of 13 square knots');
    expect(drawCloth(clothOf(EXAMPLE, PLAN, 'Net'), { id: 'a', as: 'hanging', width: 320, units: 'in' })).toMatch(/aria-label="[^"]*in long/);
  });

  test('holds no style, no script and no broken number, and keeps within its size', () => {
    const techniques: Section[] = [
      { technique: 'alternating', rows: 400 }, { technique: 'square-knots', knots: 500, spiral: true }, { technique: 'half-hitches', rows: 40, slant: 'right' }, { technique: 'fringe', heightMm: 300 },
    ];
    fc.assert(fc.property(fc.subarray(techniques, { minLength: 1 }), fc.integer({ min: 1, max: 100 }), fc.constantFrom('rod' as const, 'ring' as const), (sections, pairs, kind) => {
      const svg = draw({ ...EXAMPLE, rod: { kind, diameterMm: 40 }, columns: [{ yarn: 'main', cords: 2 * pairs, sections }], foot: [{ technique: 'gathering', wraps: 12 }] });
      expect(svg).not.toMatch(/NaN|undefined|Infinity|\sstyle=|<script/);
      expect(svg.length).toBeLessThan(400 * 1024);
    }), { numRuns: cases(60) });
  });

  test('a knot is drawn once and placed wherever it comes again', () => {
    expect(draw(EXAMPLE).match(/<g id="a-knot/g)?.length).toBeLessThan(8);
    expect(draw(EXAMPLE).match(/<use href="#a-knot/g)?.length).toBeGreaterThan(30);
  });
});

describe('amounts of a knotted piece', () => {
  const words = (key: string): string => {
    const amount = amountOf(key, EXAMPLE, PLAN);
    return amount.ok ? amountText(amount.value, 'cm').replaceAll('\u00a0', ' ') : (amount.problems[0]?.message ?? '');
  };

  test.each([
    ['cords', '6 cords'], ['ends', '12 ends'], ['knots', '48 knots'], ['column.body.cut', '217.5 cm'], ['section.net.knots', '13 knots'], ['section.braids.height', '11 cm'],
    ['yarn.main', '14 m'], ['yarn.gold', 'This piece has no cord in the role “gold”.'], ['section.tips.knots', 'A stretch that is fringe has no knots.'], ['nails', 'No amount is called “nails”.'],
  ])('%s is %s', (key, expected) => {
    expect(words(key)).toBe(expected);
  });

  test('every key it tells can be asked for, and the lists for a teacher name them', () => {
    for (const key of amountKeysOf(EXAMPLE, PLAN)) expect(amountOf(key, EXAMPLE, PLAN).ok).toBe(true);
    expect(amountChoices(EXAMPLE, PLAN, 'cm').map(({ title }) => title)).toEqual(['Size and rod', 'Cords', 'To buy', 'Knots', 'Time']);
  });

  test('what to buy stands under its label', () => {
    expect(yarnTable(EXAMPLE, PLAN).lines).toMatchObject([{ name: 'Cotton cord', detail: '4 mm', colour: '#ddd3bb' }]);
  });

  test('a thicker cord of one’s own makes the piece longer and is told', () => {
    const fitted = fitPiece(EXAMPLE, { yarns: { main: { tex: 20_000, label: 'Dune Roving' } } });
    expect(fitted.ok && fitted.value.changes.join(' ')).toMatch(/Dune Roving is the main cord\..*instead of 36/s);
  });
});
