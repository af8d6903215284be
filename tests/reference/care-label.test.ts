/**
 * The care label against the world outside. Fibre names: Annex I, table 1, of Regulation (EU) No 1007/2011 (numbers 1 to
 * 46 name fibres), read in the table of Directive 2008/121/EC that it took over. Signs: the order and the limits of
 * ISO 3758:2012 as vendors' care pages print them (washing, bleaching, drying, ironing, professional care; iron 110, 150
 * and 200 °C for one, two and three dots). What a fibre bears: common practice, no source.
 */
import { expect, test } from 'vitest';
import { careFor } from '#core/fibre/care.ts';
import { CARE_SIGNS } from '#core/fibre/care-signs.ts';
import { fibreContent } from '#core/fibre/content.ts';
import { FIBRES } from '#core/fibre/fibres.ts';
import { yarnsInPiece, yarnsUsed } from '#core/finish/yarns-in-piece.ts';
import { madeFor } from '#core/craft/made-for.ts';
import { lowTide } from '../support/low-tide.ts';

test('fibre names are those of Annex I', () => {
  const annex = ['wool', 'alpaca', 'llama', 'camel', 'cashmere', 'mohair', 'angora', 'vicuña', 'yak', 'guanaco', 'horsehair', 'silk', 'cotton', 'kapok', 'flax', 'true hemp', 'jute', 'abaca', 'coir', 'ramie', 'sisal', 'acetate', 'cupro', 'modal', 'triacetate', 'viscose', 'acrylic', 'modacrylic', 'polyamide', 'lyocell', 'polylactide', 'polyester', 'polyethylene', 'polypropylene', 'elastane', 'glass fibre', 'metal', 'paper'];
  expect(Object.keys(FIBRES).toSorted()).toEqual(annex.toSorted());
});

test('signs stand in the order of ISO 3758', () => {
  expect(careFor(['wool']).map(({ sign }) => sign)).toEqual(['hand-wash', 'no-bleach', 'no-tumble', 'flat-in-shade', 'iron-150', 'clean-p-mild']);
});

test('an iron has one dot up to 110 °C, two up to 150, three up to 200', () => {
  expect((['iron-110', 'iron-150', 'iron-200'] as const).map((sign) => CARE_SIGNS[sign].dots?.length)).toEqual([1, 2, 3]);
});

test('the worked piece is its wool and its cotton, by the mass of the plan without margins', async () => {
  const pattern = await lowTide();
  const made = madeFor(pattern, {}, 'cm');
  if (made?.piece.craft !== 'frame-loom') throw new RangeError('Low Tide is woven');
  const yarns = yarnsInPiece(made);
  // Second way: the mass of the whole piece, of which all but the warp is wool.
  expect(yarns.reduce((sum, { plannedGrams }) => sum + plannedGrams, 0)).toBeCloseTo(made.plan.massG, 6);
  const cotton = ('warp' in made.plan ? made.plan.warp.massG : 0) / made.plan.massG;
  expect(fibreContent(yarnsUsed(yarns, {}))).toEqual([{ fibre: 'wool', percent: 100 - Math.round(cotton * 100) }, { fibre: 'cotton', percent: Math.round(cotton * 100) }]);
});
