import { describe, expect, test } from 'vitest';
import { CRAFTS } from '#core/craft/crafts.ts';
import { ownHeights } from '#core/craft/frame-loom/own-heights.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { PLAIN_PIECE, pieceOf, pieceWith, planOf } from '../a-piece.ts';

const WEAVING = CRAFTS['frame-loom'];
const made = (piece: FrameLoomPiece) => ({ piece, plan: planOf(piece) });
const summary = (piece: FrameLoomPiece): string => WEAVING.summary(made(piece), 'cm').replaceAll('\u00a0', ' ');

describe('a woven piece on a line', () => {
  test('says nails, ends and width, and of the loom what is known', () => {
    expect(summary(PLAIN_PIECE)).toBe('nails every 10 mm, single ends: 62 ends, woven 30 cm wide');
  });

  // Every second of nails 5 mm apart is a nail every 10; a loom of 40 cm holds the 35 it takes.
  test('says the inside width, the nails left out and ends in pairs', () => {
    const piece = pieceWith({ loom: { ...PLAIN_PIECE.loom, nailPitchMm: 5, everyNthNail: 2, insideWidthMm: 400 }, warp: { ...PLAIN_PIECE.warp, endsTogether: 2 } });
    expect(summary(piece)).toMatch(/^40 cm inside, nails every 5 mm, one in 2 used, doubled ends: 6\d ends, woven 30 cm wide$/u);
  });
});

describe('what is bought for a woven piece', () => {
  test('is the warp first, then every weft by its role, each with what its label says', () => {
    const piece = pieceWith({
      warp: { yarn: { tex: 400, label: 'Fenwool warp', colour: '#d8d2c1', ball: { metres: 250, grams: 100 } }, parity: 'even' },
    });
    // 36.05 m of warp with its margin: 14.4 g of 400 tex, one ball of 250 m.
    const [warp, ground] = WEAVING.materials(made(piece));
    expect(warp).toMatchObject({ key: 'warp', name: 'Warp', label: 'Fenwool warp', colour: '#d8d2c1', balls: 1 });
    expect(warp).not.toHaveProperty('role');
    expect((warp?.grams ?? 0) / ((warp?.lengthMm ?? 1) / 1e6)).toBeCloseTo(400, 9);
    expect(ground).toMatchObject({ key: 'yarn.ground', role: 'ground', name: 'ground' });
    for (const key of ['label', 'colour', 'balls']) expect(ground).not.toHaveProperty(key);
    // 180 m in 100 g: 5.556 g for every 10 m, with the margin as without.
    expect((ground?.grams ?? 0) / ((ground?.lengthMm ?? 1) / 1e6)).toBeCloseTo(100 / 180 * 1000, 6);
  });

  test.each([
    ['yarn.ground', 'ground'], ['yarn.ground.mass', 'ground'], ['band.sky.yarn', 'ground'], ['band.sky.height', undefined], ['band.dune.yarn', undefined], ['warp.yarn.mass', undefined], ['warp', undefined],
  ])('the amount %s speaks of the role %s', (key, role) => {
    expect(WEAVING.roleOfKey(key, PLAIN_PIECE)).toBe(role);
  });
});

describe('how high bands come out by themselves', () => {
  test('is what each says, or its rows times its yarn, and the filling one is open', () => {
    const heights = ownHeights(pieceOf({ technique: 'tabby', yarn: 'ground', heightMm: 30 }, { technique: 'rya', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 80, trimMm: 5, rows: 2, heightMm: 12 }));
    expect(heights).toEqual([30, 12, 'fill']);
  });

  test.each<[string, FrameLoomPiece]>([
    ['a size that is none', pieceWith({ size: { widthMm: -1, heightMm: 400 } })],
    ['a yarn that jams', pieceWith({ yarns: { ground: { tex: 20_000 } } })],
    ['a band of a yarn that is not there', pieceOf({ technique: 'tabby', yarn: 'sand', heightMm: 30 })],
    ['ends that are too few', pieceWith({ size: { widthMm: 1, heightMm: 400 } })],
  ])('is unknown for %s', (_, piece) => {
    expect(ownHeights(piece)).toBeUndefined();
  });
});
