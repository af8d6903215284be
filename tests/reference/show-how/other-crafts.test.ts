/** Workings of pieces that are not woven on a frame, held to their own formulas by another program's arithmetic (mathjs). */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { CRAFTS, CRAFT_NAMES } from '#core/craft/crafts.ts';
import { planPiece } from '#core/craft/plan.ts';
import { explainPiece } from '#core/craft/show-how/explain.ts';
import { cases } from '../../support/random-cases.ts';
import { WIRE_ROWS } from '../wire-rows.ts';
import { expectReachable, faultsOf, workingsOf } from './follow.ts';

/** Places, and the list of what to cut, which says the columns' own numbers once more. */
const TOLD_ELSEWHERE = /(?:^|\.)index$|^cut\./u;

function holdsUp(piece: unknown): void {
  const planned = planPiece(piece);
  const explained = explainPiece(piece);
  if (!planned.ok) {
    expect(explained).toEqual(planned);
    return;
  }
  expect(explained.ok && explained.warnings).toEqual(planned.warnings);
  expect(faultsOf(workingsOf(explained), piece)).toEqual([]);
  expectReachable(workingsOf(explained), planned.value, TOLD_ELSEWHERE);
}

test.each(CRAFT_NAMES)('the example of %s has every number of its plan explained', (name) => {
  holdsUp(CRAFTS[name].example);
});

const PIECES = WIRE_ROWS.flatMap(({ row, question }) => {
  const { piece } = question as { readonly piece?: { readonly craft: string } };
  return piece === undefined || piece.craft === 'frame-loom' ? [] : [[row, piece] as const];
});

describe('of the check rows', () => {
  test.each(PIECES)('%s', (_, piece) => {
    holdsUp(piece);
  });
});

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const whole = (min: number, max: number) => fc.integer({ min, max });
const RUNS = { numRuns: cases(500), seed: 20261201 };
const gapMm = between(0, 30);
const yarn = fc.record({ metresPer100g: between(110, 700), strands: whole(1, 2), ball: fc.record({ metres: between(50, 400), grams: fc.constant(100) }) }, { requiredKeys: ['metresPer100g'] });

const section = fc.oneof(
  fc.record({ technique: fc.constant('square-knots'), knots: whole(1, 30), gapMm, spiral: fc.boolean() }, { requiredKeys: ['technique', 'knots'] }),
  fc.record({ technique: fc.constant('square-knots'), heightMm: between(1, 400), gapMm }, { requiredKeys: ['technique', 'heightMm'] }),
  fc.record({ technique: fc.constant('alternating'), rows: whole(1, 9), gapMm }, { requiredKeys: ['technique', 'rows'] }),
  fc.record({ technique: fc.constant('half-hitches'), rows: whole(1, 4), slant: fc.constantFrom('level', 'left', 'right') }, { requiredKeys: ['technique', 'rows'] }),
  fc.record({ technique: fc.constant('plain'), heightMm: between(1, 300) }),
  fc.record({ technique: fc.constant('gathering'), wraps: whole(1, 9), yarn: fc.constantFrom('main', 'thin') }, { requiredKeys: ['technique', 'wraps'] }),
);
const knotted = fc.record({
  craft: fc.constant('macrame'),
  rod: fc.oneof(
    fc.record({ kind: fc.constant('rod'), diameterMm: between(5, 40), lengthMm: between(100, 900) }, { requiredKeys: ['kind', 'diameterMm'] }),
    fc.record({ kind: fc.constant('ring'), diameterMm: between(50, 200), thickMm: between(3, 12) }, { requiredKeys: ['kind', 'diameterMm'] }),
  ),
  yarns: fc.record({ main: fc.record({ diameterMm: between(1, 8), tex: between(200, 20_000), ball: fc.constant({ metres: 50, grams: 300 }) }, { requiredKeys: ['diameterMm'] }), thin: yarn }),
  columns: fc.array(fc.record({ yarn: fc.constantFrom('main', 'thin'), cords: whole(1, 4).map((pairs) => 2 * pairs), sections: fc.array(section, { minLength: 1, maxLength: 4 }) }), { minLength: 1, maxLength: 4 }),
  foot: fc.constant([{ technique: 'plain', heightMm: 30 }, { technique: 'gathering', wraps: 4, yarn: 'thin' }, { technique: 'fringe', heightMm: 90 }]),
  takes: fc.record({ squareKnot: between(11.5, 20), squareRise: between(2, 6), doubleHalfHitch: between(12.5, 25) }, { requiredKeys: [] }),
  allowances: fc.record({ margin: between(0, 0.5), tailMm: between(0, 100) }, { requiredKeys: [] }),
}, { requiredKeys: ['craft', 'rod', 'yarns', 'columns'] });

test('of hundreds of knotted pieces every number is explained', () => {
  fc.assert(fc.property(knotted, holdsUp), RUNS);
}, 120_000);

const dyed = fc.record({
  craft: fc.constant('dyeing'), fibre: fc.record({ kind: fc.constantFrom('wool', 'silk', 'cotton'), massG: between(1, 5000) }),
  mordant: fc.record({ agent: fc.constantFrom('alum', 'aluminium-acetate', 'none'), percent: between(1, 30) }, { requiredKeys: ['agent'] }),
  tartar: fc.record({ percent: between(1, 20) }, { requiredKeys: [] }), tannin: fc.record({ percent: between(1, 20) }, { requiredKeys: [] }), iron: fc.record({ percent: between(1, 8) }, { requiredKeys: [] }),
  dye: fc.record({ percent: between(1, 300) }), liquorRatio: between(10, 100),
}, { requiredKeys: ['craft', 'fibre', 'mordant', 'dye'] });

test('of hundreds of dyeings', () => {
  fc.assert(fc.property(dyed, holdsUp), RUNS);
}, 60_000);

const share = between(0, 0.3);
const heddled = fc.record({
  craft: fc.constant('rigid-heddle'), size: fc.record({ widthMm: between(60, 700), lengthMm: between(100, 3000) }), heddle: fc.record({ spacingMm: between(1.5, 8) }), picksPerCm: between(1, 8), pieces: whole(1, 4),
  yarns: fc.record({ warp: yarn, weft: yarn }),
  allowances: fc.record({ drawIn: share, widthShrinkage: share, lengthShrinkage: share, takeUp: share, fringeMm: between(0, 300), gapMm: between(0, 100), wasteMm: between(0, 900), margin: share }, { requiredKeys: [] }),
}, { requiredKeys: ['craft', 'size', 'heddle', 'picksPerCm', 'yarns'] });

test('of hundreds of cloths on a rigid heddle', () => {
  fc.assert(fc.property(heddled, holdsUp), RUNS);
}, 60_000);
