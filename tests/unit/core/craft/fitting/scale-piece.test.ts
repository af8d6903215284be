import { describe, expect, test } from 'vitest';
import { scalePiece } from '#core/craft/fitting/scale-piece.ts';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import { PLAIN_PIECE, pieceWith, planOf } from '../a-piece.ts';

const scaled = (band: Band, factor = 2): Band | undefined => scalePiece(pieceWith({ bands: [band, ...PLAIN_PIECE.bands] }), factor).bands[0];

describe('a piece made twice as large', () => {
  test('is twice as wide and high on the same loom, with a dowel that stands out as far as before', () => {
    const piece = scalePiece(pieceWith({ dowel: { diameterMm: 12, lengthMm: 380 } }), 2);
    expect(piece).toMatchObject({ size: { widthMm: 600, heightMm: 800 }, dowel: { diameterMm: 12, lengthMm: 680 }, loom: PLAIN_PIECE.loom });
  });

  test.each<[Band, object]>([
    [{ technique: 'tabby', yarn: 'ground', heightMm: 30 }, { heightMm: 60 }],
    [{ technique: 'soumak', yarn: 'ground', over: 4, back: 2, rows: 3, tabbyBetween: 2, tabbyYarn: 'ground' }, { rows: 6, over: 4, back: 2 }],
    [{ technique: 'rya', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 80, trimMm: 5, rows: 2, heightMm: 12 }, { pileMm: 160, trimMm: 5, rows: 4, heightMm: 24, strands: 3 }],
    [{ technique: 'roving', yarn: 'ground', over: 4, bulgeMm: 12, heightMm: 40 }, { bulgeMm: 24, heightMm: 80, over: 4 }],
    [{ technique: 'loop-pile', yarn: 'ground', rodMm: 8, rows: 3, heightMm: 20 }, { rodMm: 8, rows: 6, heightMm: 40 }],
    [{ technique: 'loop-pile', yarn: 'ground', loopMm: 20, rows: 3, heightMm: 20 }, { loopMm: 40, rows: 6, heightMm: 40 }],
    [{ technique: 'twining', yarn: 'ground', rows: 2 }, { rows: 2 }],
    [{ technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 }, { bundleEnds: 2, reachPicks: 2 }],
  ])('has %j grown', (band, grown) => {
    expect(scaled(band)).toMatchObject(grown);
  });

  test.each([
    [{ shape: 'circle', radiusMm: 30 }, { radiusMm: 60 }],
    [{ shape: 'triangle', baseMm: 60, heightMm: 40 }, { baseMm: 120, heightMm: 80 }],
    [{ shape: 'points', points: [{ xMm: 0, yMm: 0 }, { xMm: 40, yMm: 0 }, { xMm: 20, yMm: 30 }] }, { points: [{ xMm: 0, yMm: 0 }, { xMm: 80, yMm: 0 }, { xMm: 40, yMm: 60 }] }],
  ] as const)('has its %j where it was, in its share of the cloth', (measures, grown) => {
    const shape = { ...measures, yarn: 'ground', centreMm: 100, bottomMm: 5, leanMm: -20 };
    expect(scaled({ technique: 'tabby', yarn: 'ground', heightMm: 100, shapes: [shape] })).toMatchObject({ shapes: [{ ...grown, centreMm: 200, bottomMm: 10, leanMm: -40 }] });
  });

  test('has twice the ends and about four times the yarn of its ground', () => {
    const roomy: FrameLoomPiece = pieceWith({ loom: { ...PLAIN_PIECE.loom, insideHeightMm: 1000 } });
    const [small, large] = [planOf(roomy), planOf(scalePiece(roomy, 2))];
    expect(large.ends.count).toBe(122);
    expect((large.yarns['ground']?.netMm ?? 0) / (small.yarns['ground']?.netMm ?? 1)).toBeCloseTo(4, 0);
  });

  test('keeps a row at least, however small it gets', () => {
    expect(scaled({ technique: 'soumak', yarn: 'ground', over: 4, back: 2, rows: 3, tabbyBetween: 2, tabbyYarn: 'ground' }, 0.1)).toMatchObject({ rows: 1 });
  });

  test('stays as it is where its width is no number', () => {
    const piece = pieceWith({ size: { widthMm: Number.NaN, heightMm: 400 } });
    expect(scalePiece(piece, 2)).toBe(piece);
  });
});
