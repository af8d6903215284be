/** Workings of whole pieces, held to their own formulas by another program's arithmetic (mathjs). */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { planPiece } from '#core/craft/plan.ts';
import { explainPiece } from '#core/craft/show-how/explain.ts';
import type { Working } from '#core/craft/show-how/working.ts';
import { cases } from '../../support/random-cases.ts';
import { expectClose } from '../close.ts';
import workedPiece from '../worked-piece.json' with { type: 'json' };
import { isWoven, richPieces } from '../random-pieces.ts';
import { figures, TABLE } from '../worked-piece-table.ts';
import { IMPERIAL, planOf } from '../worked-piece.ts';
import { expectReachable, faultsOf, workingsOf } from './follow.ts';
import { WORKING_OF_ROW } from './worked-piece-rows.ts';

const explained = (piece: unknown): readonly Working[] => workingsOf(explainPiece(piece));
const byId = (piece: unknown): ReadonlyMap<string, Working> => new Map(explained(piece).map((working) => [working.id, working]));

describe('the worked piece', () => {
  const workings = byId(workedPiece);

  test('has a working for every row of its table', () => {
    expect(Object.keys(WORKING_OF_ROW).sort()).toEqual(TABLE.map(([row]) => row).sort());
    expect(new Set(TABLE.map(([row]) => row.split(' ')[0])).size).toBe(84);
  });

  test.each(TABLE)('row %s is explained, and comes to the printed %f', (row, printed) => {
    const working = workings.get(WORKING_OF_ROW[row] ?? '');
    expectClose(working?.value ?? Number.NaN, printed, figures(printed));
  });
});

const CHANGES: Readonly<Record<string, object>> = {
  'as it is': {},
  'counted on a swatch': { beat: { picksPerCm: 7 } },
  'without parity': { warp: { ...workedPiece.warp, parity: 'any' } },
  'with an odd number of ends': { warp: { ...workedPiece.warp, parity: 'odd' } },
  'with ends pinned': { warp: { ...workedPiece.warp, endCount: 62 } },
  'with doubled ends, an even number of pairs': { warp: { ...workedPiece.warp, endsTogether: 2 } },
  'on notches': { loom: { ...workedPiece.loom, kind: 'notched-frame', warping: 'two-nail', nailPitchMm: 5 } },
  'on two rows of nails': { loom: { ...workedPiece.loom, kind: 'two-row-frame', nailPitchMm: 20 } },
  'balanced': { mode: 'balanced' },
  'with every default': { allowances: {}, loom: { nailPitchMm: 10, warping: 'zigzag', insideHeightMm: 520 }, dowel: { diameterMm: 12 } },
  'without a dowel': { dowel: undefined },
  'lashed to its dowel': { dowel: { diameterMm: 12, fixing: 'lashed' } },
  'tied to its dowel': { dowel: { diameterMm: 12, fixing: 'tied' }, loom: { ...workedPiece.loom, insideHeightMm: 560 } },
  'with one band of basket weave and one of doubled weft': {
    bands: workedPiece.bands.map((band, index) => (index === 1 ? { ...band, basket: true } : index === 7 ? { ...band, strands: 2 } : index === 2 ? { ...band, edgeEnds: 1 } : band)),
  },
  'with an unused yarn': { yarns: { ...workedPiece.yarns, spare: { class: 4, strands: 2 } } },
};

describe.each(Object.entries(CHANGES))('%s, the worked piece', (_, change) => {
  const piece = { ...workedPiece, ...change };

  test('gives every number by its formula, from what was given or said before', () => {
    expect(faultsOf(explained(piece), piece)).toEqual([]);
  });

  test('has every number of its plan explained', () => {
    expectReachable(explained(piece), planOf(piece), /^bands\.\d+\.index$/u);
  });
});

test('typed in inches it holds as well', () => {
  expect(faultsOf(explained(IMPERIAL), IMPERIAL)).toEqual([]);
});

test('a piece that cannot be woven says what is wrong, as its plan does', () => {
  const outcome = explainPiece({ ...workedPiece, loom: { ...workedPiece.loom, insideHeightMm: 500 } });
  expect(outcome.ok ? [] : outcome.problems.map(({ code, path }) => [code, path])).toEqual([['E_FIT', '/loom/insideHeightMm']]);
});

describe('a margin', () => {
  test('comes from what may differ: more when rows are guessed, less when a swatch was counted', () => {
    expectClose(byId(workedPiece).get('yarns.A.netMm')?.margin ?? 0, 0.1436, 5e-4);
    expectClose(byId({ ...workedPiece, beat: { picksPerCm: 7 } }).get('yarns.A.netMm')?.margin ?? 0, 0.07583, 5e-4);
  });

  test('is ten per cent for warp and five for strands that are cut', () => {
    expect(byId(workedPiece).get('warp.netMm')?.margin).toBe(0.1);
    expect(byId(workedPiece).get('yarns.B.netMm')?.margin).toBe(0.05);
  });
});

describe('trust', () => {
  const trustOf = (change: object, id: string) => byId({ ...workedPiece, ...change }).get(id)?.trust;

  test('of the yarn grows when a swatch is counted instead of guessed', () => {
    expect(trustOf({}, 'yarns.T.netMm')).toBe('practice');
    expect(trustOf({ beat: { picksPerCm: 7 } }, 'yarns.T.netMm')).toBe('formula');
    expect(trustOf({ beat: { picksPerCm: 7 } }, 'weft.pickSpacingMm')).toBe('measured');
  });

  test('of the warp is not lessened by ends that are wound and ties that are made', () => {
    expect(trustOf({ allowances: {} }, 'ends.loomWidthMm')).toBe('practice');
    expect(trustOf({ allowances: {} }, 'warp.netMm')).toBe('measured');
  });
});

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const whole = (min: number, max: number) => fc.integer({ min, max });
const role = fc.constantFrom('ground', 'figure');

const bands = fc.oneof(
  fc.record({ technique: fc.constant('tabby'), yarn: role, heightMm: between(0, 60) }),
  fc.record({
    technique: fc.constant('tabby'), yarn: role, heightMm: between(40, 60),
    shapes: fc.array(fc.record({
      shape: fc.constantFrom('triangle', 'rectangle'), yarn: role, baseMm: between(10, 110), heightMm: between(5, 40), join: fc.constantFrom('slit', 'dovetail', 'interlock'), symmetric: fc.boolean(),
    }), { minLength: 1, maxLength: 2 }),
  }),
  fc.record({
    technique: fc.constant('tabby'), yarn: role, heightMm: between(40, 60),
    shapes: fc.oneof(
      fc.record({ shape: fc.constant('circle'), yarn: role, radiusMm: between(4, 20) }),
      fc.constant({ shape: 'points', yarn: 'figure', points: [{ xMm: 0, yMm: 0 }, { xMm: 60, yMm: 4 }, { xMm: 30, yMm: 2 }, { xMm: 12, yMm: 38 }] }),
    ).map((shape) => [shape]),
  }),
  fc.record({ technique: fc.constant('soumak'), yarn: role, over: whole(3, 5), back: whole(1, 2), rows: whole(1, 4), tabbyBetween: whole(0, 2), tabbyYarn: role }),
  fc.record({ technique: fc.constant('rya'), yarn: role, strands: whole(1, 4), legEnds: whole(1, 2), pileMm: between(10, 200), trimMm: between(0, 12), rows: whole(1, 3), heightMm: between(3, 30) }),
  fc.record({ technique: fc.constant('roving'), yarn: role, over: whole(1, 6), bulgeMm: fc.oneof(fc.constant(0), between(1, 30)), heightMm: between(10, 40) }),
  fc.record({ technique: fc.constant('hem-stitch'), yarn: role, bundleEnds: whole(1, 5), reachPicks: whole(1, 4) }),
  fc.record({ technique: fc.constant('loop-pile'), yarn: role, rodMm: between(2, 20), rows: whole(1, 5), heightMm: between(3, 30) }),
  fc.record({ technique: fc.constant('loop-pile'), yarn: role, loopMm: between(2, 40), rows: whole(1, 5), heightMm: between(3, 30) }),
  fc.record({ technique: fc.constant('twining'), yarn: role, rows: whole(1, 4), endsPerTwist: whole(1, 3) }),
);

const yarn = fc.record(
  { metresPer100g: between(110, 700), wrapsPerInch: between(6, 20), strands: whole(1, 2), ball: fc.record({ metres: between(50, 400), grams: fc.constant(100) }) },
  { requiredKeys: ['metresPer100g'] },
);

const pieces = fc.record({
  widthMm: between(120, 600), nailPitchMm: between(8, 20), warping: fc.constantFrom('zigzag', 'two-nail'), endsTogether: fc.constantFrom(1, 2), parity: fc.constantFrom('any', 'even', 'odd'),
  mode: fc.constantFrom('straight-warp', 'straight-warp', 'balanced'), warpTex: between(100, 600), ground: yarn, figure: yarn, bands: fc.array(bands, { minLength: 1, maxLength: 5 }),
  beat: fc.oneof(between(0.4, 1.6).map((picksPerWeftDiameter) => ({ picksPerWeftDiameter })), between(2, 9).map((picksPerCm) => ({ picksPerCm }))),
  allowances: fc.record({ drawIn: between(0, 0.1), relaxation: between(0, 0.1), tailMm: between(20, 80), loadMm: between(2000, 9000), marginWeft: between(0, 0.3) }, { requiredKeys: [] }),
  dowel: fc.record({ diameterMm: between(4, 30), lengthMm: between(100, 700) }, { requiredKeys: ['diameterMm'] }),
}).map((of) => ({
  craft: 'frame-loom', size: { widthMm: of.widthMm, heightMm: 700 }, loom: { nailPitchMm: of.nailPitchMm, warping: of.warping, insideHeightMm: 1200 },
  warp: { yarn: { tex: of.warpTex }, endsTogether: of.endsTogether, parity: of.parity }, beat: of.beat, mode: of.mode, allowances: of.allowances, dowel: of.dowel,
  yarns: { ground: of.ground, figure: of.figure }, bands: [...of.bands, { technique: 'tabby', yarn: 'ground', fill: true }],
}));

test('of a thousand pieces that can be woven every number is explained', () => {
  fc.assert(fc.property(pieces.filter((piece) => planPiece(piece).ok), (piece) => {
    const workings = explained(piece);
    expect(faultsOf(workings, piece)).toEqual([]);
    expectReachable(workings, planOf(piece), /^bands\.\d+\.index$/u);
  }), { numRuns: cases(1000), seed: 20260821 });
}, 300_000);

test('of a thousand pieces bent, finished and hung in every way every number is explained', () => {
  fc.assert(
    fc.property(richPieces, (piece) => {
      fc.pre(isWoven(piece));
      const workings = workingsOf(explainPiece(piece));
      expect(faultsOf(workings, piece)).toEqual([]);
      expectReachable(workings, planOf(piece), /^bands\.\d+\.index$/u);
    }),
    { numRuns: cases(1000), seed: 20260821 },
  );
}, 300_000);

const standing = (piece: unknown, id: string, symbol: string) => {
  const input = workingsOf(explainPiece(piece)).find((working) => working.id === id)?.inputs.find((one) => one.symbol === symbol);
  return input?.path ?? input?.source;
};

test('what finish, tying, strands and take-up bring along says its own source', () => {
  const piece = (more: object) => ({ ...workedPiece, loom: { ...workedPiece.loom, insideHeightMm: 900 }, ...more });
  expect(standing(piece({ finish: { bottom: 'knotted', fringeMm: 80 } }), 'loom.finishMm', 'n')).toContain('overhand knot');
  expect(standing(piece({ finish: { bottom: 'knotted', fringeMm: 80 } }), 'loom.finishMm', 'f')).toBe('/finish/fringeMm');
  expect(standing(piece({ finish: { bottom: 'twisted', fringeMm: 80 } }), 'loom.finishMm', 'r')).toContain('twisted cord');
  expect(standing(piece({ dowel: { diameterMm: 12, fixing: 'tied' } }), 'loom.topForTyingMm', 'l')).toContain('tied to the rod');
  expect(standing(piece({ mode: 'measured', takeUp: 0.07 }), 'weft.crimp', 'c')).toBe('/takeUp');
  expect(standing(piece({ mode: 'measured' }), 'weft.crimp', 'c')).toContain('measure a swatch');
});
