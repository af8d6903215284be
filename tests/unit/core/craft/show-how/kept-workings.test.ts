/** Workings as they were found right: their arithmetic is followed by another program in `tests/reference/show-how`. */
import { describe, expect, test } from 'vitest';
import type { Band, FrameLoomPiece, Yarn } from '#core/craft/piece.ts';
import { explainPiece, explainRya, explainShape, explainSoumak, explainTakeUp, explainYarn } from '#core/craft/show-how/explain.ts';
import type { Working } from '#core/craft/show-how/working.ts';
import type { Outcome } from '#core/outcome.ts';
import { expectKept } from '../../../../support/kept.ts';
import { tellWorkings } from '../../../../support/tell-piece.ts';
import { PLAIN_PIECE, pieceOf, pieceWith } from '../a-piece.ts';
import { loom, WOVEN_PIECES } from '../frame-loom/woven-pieces.ts';

const file = (name: string): URL => new URL(`../../../../fixtures/show-how/${name}.json`, import.meta.url);
const WARP = PLAIN_PIECE.warp;
const tabby = (more: object): FrameLoomPiece => pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 100, ...more } as Band);
const finished = (finish: FrameLoomPiece['finish']): FrameLoomPiece => pieceWith({ ...loom({ insideHeightMm: 700 }), ...(finish === undefined ? {} : { finish }) });

const PIECES: Readonly<Record<string, FrameLoomPiece>> = {
  ...WOVEN_PIECES,
  'ends tucked in': finished({ bottom: 'tucked' }),
  'ends left plain': finished({ bottom: 'plain', fringeMm: 50 }),
  'ends knotted as is usual': finished({ bottom: 'knotted' }),
  'a pinned number of ends': pieceWith({ warp: { ...WARP, endCount: 64 } }),
  'a dowel of a usual length, slipped on': pieceWith({ ...loom({ insideHeightMm: 700 }), dowel: { diameterMm: 12 } }),
  'shapes that meet in every way': tabby({ shapes: [
    { shape: 'triangle', yarn: 'ground', baseMm: 80, heightMm: 60, centreMm: 60, join: 'dovetail' }, { shape: 'circle', yarn: 'ground', radiusMm: 30, centreMm: 150, join: 'interlock' },
    { shape: 'rectangle', yarn: 'ground', baseMm: 40, heightMm: 30, centreMm: 250, bottomMm: 20, symmetric: true },
  ] }),
  'a shape drawn by points, leaning': tabby({ shapes: [{ shape: 'points', yarn: 'ground', points: [{ xMm: 0, yMm: 0 }, { xMm: 80, yMm: 0 }, { xMm: 40, yMm: 60 }], centreMm: 150, leanMm: 20 }] }),
  'roving in two passes, and loops drawn by hand': pieceOf(
    { technique: 'roving', yarn: 'ground', over: 4, bulgeMm: 12, heightMm: 40, passes: 2 }, { technique: 'loop-pile', yarn: 'ground', rows: 2, loopMm: 15, heightMm: 16 },
    { technique: 'twining', yarn: 'ground', rows: 2, endsPerTwist: 2 }, { technique: 'rya', yarn: 'ground', strands: 2, legEnds: 2, edgeEnds: 2, pileMm: 40, trimMm: 0, rows: 2, heightMm: 12 },
  ),
};

const linesOf = (piece: unknown): readonly string[] => tellWorkings(explainPiece(piece));
const PLAIN = linesOf(PLAIN_PIECE);

describe('the workings of a woven piece', () => {
  test('plain', () => {
    expectKept(file('pieces'), 'plain', PLAIN);
    // As reckoned by hand beside the amounts: 300/0.98 at 5 mm; 277 rows of 328.48 mm of yarn.
    expect(PLAIN).toContain('ends.count = 62 count: n + r (practice)');
  });

  const plain = new Set(PLAIN);
  test.each(Object.entries(PIECES).filter(([name]) => name !== 'plain'))('%s, where it differs from the plain one', (name, piece) => {
    expectKept(file('pieces'), name, linesOf(piece).filter((line) => !plain.has(line)));
  });
});

describe('the workings of a yarn', () => {
  test.each<[string, Yarn]>([
    ['by tex', { tex: 400 }], ['by metres', { metresPer100g: 180, strands: 3 }], ['by its class alone', { class: 4 }], ['by its ball', { class: 4, ball: { metres: 180, grams: 100 } }],
    ['by a count of metres', { count: { text: '2/16', system: 'nm' } }], ['by a cotton count', { count: { text: '8/2', system: 'ne-cotton' } }], ['by a count of grams', { count: { text: '3600', system: 'denier' } }],
    ['by a count of one ply', { count: { text: '16', system: 'ne-cotton' } }], ['by a count of silk', { count: { text: '40/2', system: 'ne-cotton' }, fibre: 'silk' }],
    ['by spun silk', { count: { text: '40/2', system: 'spun-silk' } }], ['by a count in either order', { count: { text: '6/6', system: 'nm' } }],
    ['wrapped', { tex: 400, wrapsPerInch: 12 }], ['measured as it lies', { tex: 400, freeDiameterMm: 2 }], ['of a class, wrapped', { class: 4, wrapsPerInch: 10.5 }], ['with a K of its own', { tex: 400, ashenhurstK: 0.84, strands: 2 }],
  ] as [string, Yarn][])('%s', (name, yarn) => {
    expectKept(file('yarns'), name, tellWorkings(explainYarn(yarn)));
  });
});

describe('the workings of a single question', () => {
  const CLOTH = { warpDiameterMm: 0.8, weftDiameterMm: 1, warpSpacingMm: 5, weftSpacingMm: 1.5 };
  const KNOT = { legEnds: 1, strands: 3, spacingMm: 5, warpDiameterMm: 0.8, strandLoftMm: 1.5, pileMm: 100, trimMm: 10, ends: 62, edgeEnds: 0, rows: 2, cardThicknessMm: 3 };
  const GRID = { spacingMm: 5, pickSpacingMm: 1.5, ends: 62 };
  test.each<[string, (question: unknown) => Outcome<readonly Working[]>, object]>([
    ['take-up where both bend', explainTakeUp, { ...CLOTH, weftSpacingMm: 4, mode: 'balanced' }], ['take-up over a straight warp', explainTakeUp, { ...CLOTH, mode: 'straight-warp' }], ['take-up of a wave', explainTakeUp, { ...CLOTH, weftSpacingMm: 4, weftWaveMm: 1.2 }],
    ['soumak', explainSoumak, { over: 4, back: 2, spacingMm: 5, diameterSumMm: 2, ends: 62 }], ['rya', explainRya, KNOT],
    ['a triangle', explainShape, { ...GRID, shape: 'triangle', baseMm: 60, heightMm: 40, symmetric: true }], ['a rectangle alike on both sides', explainShape, { ...GRID, shape: 'rectangle', baseMm: 60, heightMm: 4, symmetric: true }],
    ['a circle', explainShape, { ...GRID, shape: 'circle', radiusMm: 10, symmetric: false }], ['points', explainShape, { ...GRID, shape: 'points', symmetric: false, points: [{ xMm: 0, yMm: 0 }, { xMm: 40, yMm: 0 }, { xMm: 20, yMm: 9 }] }],
    ['take-up of threads that jam', explainTakeUp, { ...CLOTH, warpSpacingMm: 1, weftSpacingMm: 0.5 }], ['soumak that goes back too far', explainSoumak, { over: 4, back: 4, spacingMm: 5, diameterSumMm: 2, ends: 62 }],
    ['rya on no ends', explainRya, { ...KNOT, ends: 1 }], ['a shape of nothing', explainShape, GRID],
  ])('%s', (name, explain, question) => {
    expectKept(file('questions'), name, tellWorkings(explain(question)));
  });

  test('of a question that names itself is the same', () => {
    expect(explainSoumak({ what: 'soumak', over: 4, back: 2, spacingMm: 5, diameterSumMm: 2, ends: 62 })).toMatchObject({ ok: true });
    expect(explainYarn({ what: 'yarn', tex: 400 })).toMatchObject({ ok: false });
  });
});
