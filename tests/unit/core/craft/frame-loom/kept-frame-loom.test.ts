import { describe, expect, test } from 'vitest';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { expectKept, thousandths } from '../../../../support/kept.ts';
import { tellFindings, tellPiece } from '../../../../support/tell-piece.ts';
import { pieceOf, pieceWith, planOf, PLAIN_PIECE, warningsOf } from '../a-piece.ts';
import { FILL, loom, WOVEN_PIECES } from './woven-pieces.ts';

const file = (name: string): URL => new URL(`../../../../fixtures/frame-loom/${name}.json`, import.meta.url);

describe.each(Object.entries(WOVEN_PIECES))('a woven piece: %s', (name, piece) => {
  test('is reckoned and told as it was found right', () => {
    const { workings: _workings, ...told } = tellPiece(piece) as { workings: unknown };
    expectKept(file('told'), name, told);
  });
});

/** Rows of a shape are many: the first, every tenth and the last tell its slope. */
const everyTenth = (_span: unknown, index: number, all: readonly unknown[]): boolean => index % 10 === 0 || index === all.length - 1;

describe('what is drawn of a woven piece', () => {
  test.each(Object.entries(WOVEN_PIECES))('%s', (name, piece) => {
    const cloth = clothPieceOf(piece, planOf(piece), 'Low Tide');
    const bands = cloth.bands.map((band) => (band.technique === 'tabby' ? { ...band, shapes: band.shapes.map((shape) => ({ ...shape, spans: shape.spans.filter(everyTenth).map(({ row, from, to }) => `${String(row)}: ${String(from)} to ${String(to)}`) })) } : band));
    expectKept(file('cloth'), name, thousandths({ ...cloth, bands }));
  });
});

describe('the numbers that are kept', () => {
  test('are those of the plain piece: 62 ends on 32 and 31 nails, 277 rows, a card of 325 by 60 mm', () => {
    const { ends, bands, cut } = planOf(PLAIN_PIECE);
    expect(ends).toMatchObject({ count: 62, working: 62, spacingMm: 5, nailsTop: 32, nailsBottom: 31, woundWidthMm: 305 });
    expect(bands[0]?.picks).toBe(277);
    expect(cut.spacerCard).toEqual({ widthMm: 325, heightMm: 60 });
  });
});

describe('what is said of a woven piece', () => {
  const yarns = (many: number): FrameLoomPiece['yarns'] => Object.fromEntries(Array.from({ length: many }, (__, index) => [index === 0 ? 'ground' : `y${String(index)}`, { metresPer100g: 180 }]));
  const wide = (widthMm: number): FrameLoomPiece => pieceWith({ size: { widthMm, heightMm: 400 } });
  test.each<[string, unknown]>([
    ['sixty-one yarns', pieceWith({ yarns: yarns(61) })],
    ['a yarn whose role begins with a figure', pieceWith({ yarns: { ...PLAIN_PIECE.yarns, '2nd': { tex: 400 } } })],
    ['a yarn of a long role', pieceWith({ yarns: { ...PLAIN_PIECE.yarns, ['x'.repeat(41)]: { tex: 400 } } })],
    ['a zigzag in notches', pieceWith(loom({ kind: 'notched-frame' }))],
    ['rows of nails where there is one', pieceWith(loom({ nailRows: 'inner' }))],
    ['rows of nails on a notched frame', pieceWith(loom({ kind: 'notched-frame', warping: 'two-nail', nailRows: 'inner' }))],
    ['two bands that fill', pieceWith({ bands: [FILL, { technique: 'tabby', yarn: 'ground', fill: true }] })],
    ['bands higher than the piece', pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 500 })],
    ['bands exactly as high, and one that fills', pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 400 })],
    ['bands too low', pieceWith({ bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 300 }] })],
    ['bands too high', pieceWith({ bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 430 }] })],
    ['bands half a millimetre too low', pieceWith({ bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 399.5 }] })],
    ['bands a hair more than half a millimetre too low', pieceWith({ bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 399.49 }] })],
    ['a band of a yarn that is not there', pieceOf({ technique: 'tabby', yarn: 'sand', heightMm: 30 })],
    ['two bands of one name', pieceOf({ technique: 'tabby', name: 'sky', yarn: 'ground', heightMm: 30 })],
    ['a yarn that jams', pieceWith({ yarns: { ground: { tex: 20_000 } } })],
    ['a yarn of strands that jams', pieceWith({ yarns: { ground: { tex: 5000, strands: 4 } } })],
    ['a yarn too thick to beat down', pieceWith({ yarns: { ground: { metresPer100g: 100, wrapsPerInch: 5 } } })],
    ['a yarn that slips', pieceWith({ yarns: { ground: { metresPer100g: 1200, strands: 2 } } })],
    ['a swatch closer than the yarn allows', pieceWith({ beat: { picksPerCm: 25 } })],
    ['three ends', wide(14)],
    ['four ends', wide(18)],
    ['two thousand ends and more', pieceWith({ size: { widthMm: 19_000, heightMm: 400 } })],
    ['thirty-one pairs where an even number of them is asked', pieceWith({ warp: { yarn: { tex: 400 }, endsTogether: 2, parity: 'even', endCount: 62 } })],
    ['an odd number of single ends where an even one is asked', pieceWith({ warp: { yarn: { tex: 400 }, parity: 'even', endCount: 61 } })],
    ['an even number where an odd one is asked', pieceWith({ warp: { yarn: { tex: 400 }, parity: 'odd', endCount: 62 } })],
    ['an odd number of pairs', pieceWith({ warp: { yarn: { tex: 400 }, endsTogether: 2, parity: 'odd' } })],
    ['one end more than fits', pieceWith({ warp: { yarn: { tex: 400 }, endCount: 66 } })],
    ['two ends more than asked', pieceWith({ warp: { yarn: { tex: 400 }, endCount: 63 } })],
    ['a loom too narrow', pieceWith(loom({ insideWidthMm: 300 }))],
    ['a loom where no width fits', pieceWith(loom({ insideWidthMm: 20 }))],
    ['a loom too low', pieceWith(loom({ insideHeightMm: 500 }))],
    ['a loom where no height fits', pieceWith(loom({ insideHeightMm: 90 }))],
    ['a loom that is just high enough', pieceWith(loom({ insideHeightMm: 400 / 0.98 + 100 }))],
    ['a dowel that sags and is too short', pieceWith({ ...loom({ insideHeightMm: 700 }), dowel: { diameterMm: 1, lengthMm: 200 } })],
    ['a dowel just as long as the cloth is wide', pieceWith({ ...loom({ insideHeightMm: 700 }), dowel: { diameterMm: 12, lengthMm: 300 } })],
    ['a finish that needs more warp than was left', pieceWith({ ...loom({ insideHeightMm: 700 }), allowances: { bottomMm: 50 }, finish: { bottom: 'twisted', fringeMm: 120 } })],
    ['a band in pairs where an odd number is asked', pieceWith({ warp: { yarn: { tex: 400 }, parity: 'odd' }, bands: [{ technique: 'tabby', yarn: 'ground', basket: true, fill: true }] })],
    ['a band in pairs where nothing is asked', pieceWith({ warp: { yarn: { tex: 400 } }, bands: [{ technique: 'tabby', yarn: 'ground', basket: true, fill: true }] })],
    ['shapes of more rows than can be stepped out', pieceWith({ ...loom({ insideHeightMm: 20_000 }), size: { widthMm: 300, heightMm: 15_000 }, beat: { picksPerCm: 21 }, yarns: { ground: { tex: 60 } }, bands: [{ technique: 'tabby', yarn: 'ground', fill: true, shapes: [{ shape: 'rectangle', yarn: 'ground', baseMm: 100, heightMm: 14_500 }] }] })],
    ['no bands', pieceWith({ bands: [] })],
    ['a band of no known technique beside one that is sound', pieceOf({ technique: 'felting', yarn: 'ground', heightMm: 30 } as never)],
    ['a wave beside a mode that has none', { ...PLAIN_PIECE, weftWaveMm: 1 }],
    ['a wave that is missing', pieceWith({ mode: 'given' })],
    ['a wave no yarn can have', { ...PLAIN_PIECE, mode: 'given', weftWaveMm: 9 }],
    ['a take-up of two thirds', { ...PLAIN_PIECE, mode: 'measured', takeUp: 0.66, warpTakeUp: 0.61 }],
    ['a piece that is nothing', null],
    ['a ball that hardly suffices', pieceWith({ yarns: { ground: { metresPer100g: 180, ball: { metres: 54, grams: 30 } } } })],
    ['a warp that hardly suffices', pieceWith({ warp: { yarn: { tex: 400, ball: { metres: 36.5, grams: 15 } }, parity: 'even' } })],
    ['a dowel of a fixing nobody knows', pieceWith({ dowel: { diameterMm: 12, lengthMm: 59, fixing: 'glued' as never } })],
  ])('%s', (name, piece) => {
    expectKept(file('findings'), name, tellFindings(piece));
  });

  test('sixty yarns are read, however many of them are used', () => {
    expect(warningsOf(pieceWith({ yarns: yarns(60) })).filter((found) => found.startsWith('W_UNUSED'))).toHaveLength(59);
  });

  test('an end too many is told as soon as it is more than two', () => {
    const given = (endCount: number): string[] => warningsOf(pieceWith({ warp: { yarn: { tex: 400 }, endCount } }));
    // 61.2 ends were reckoned.
    expect(given(63)).toEqual([]);
    expect(given(64)).toEqual(['W_WIDTH /warp/endCount']);
    expect(given(60)).toEqual([]);
    expect(given(59)).toEqual(['W_WIDTH /warp/endCount']);
  });
});
