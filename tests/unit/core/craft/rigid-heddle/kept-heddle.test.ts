import { describe, expect, test } from 'vitest';
import { CRAFTS } from '#core/craft/crafts.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { HeddlePiece } from '#core/craft/rigid-heddle/piece.ts';
import { expectKept } from '../../../../support/kept.ts';
import { tellFindings, tellPiece } from '../../../../support/tell-piece.ts';

const file = (name: string): URL => new URL(`../../../../fixtures/rigid-heddle/${name}.json`, import.meta.url);
const SCARF: HeddlePiece = CRAFTS['rigid-heddle'].example;
const NONE = { drawIn: 0, widthShrinkage: 0, lengthShrinkage: 0, takeUp: 0, fringeMm: 0, wasteMm: 0 };

const PIECES: Readonly<Record<string, HeddlePiece>> = {
  'the scarf': SCARF,
  'two towels of labelled yarn': {
    craft: 'rigid-heddle', size: { widthMm: 400, lengthMm: 600 }, heddle: { spacingMm: 25.4 / 12, widthMm: 600 }, picksPerCm: 4.5, pieces: 2,
    yarns: { warp: { tex: 200, label: 'Fenwool', colour: '#93a8a6', ball: { metres: 200, grams: 50 } }, weft: { tex: 100, strands: 2, label: 'Estuary', colour: '#2f5366', ball: { metres: 300, grams: 50 } } },
  },
  'every allowance of its own': { ...SCARF, pieces: 3, allowances: { drawIn: 0.05, widthShrinkage: 0.06, lengthShrinkage: 0.07, takeUp: 0.09, fringeMm: 200, gapMm: 50, wasteMm: 500, margin: 0.2 } },
  'rows beaten close': { ...SCARF, picksPerCm: 7 },
};

describe.each(Object.entries(PIECES))('a cloth on a rigid heddle: %s', (name, piece) => {
  test('is reckoned, told and drawn as it was found right', () => {
    const plan = planPiece(piece);
    if (!plan.ok) throw new Error(JSON.stringify(plan.problems));
    expectKept(file('told'), name, { ...tellPiece(piece), drawn: CRAFTS['rigid-heddle'].draw({ piece, plan: plan.value }, 'Scarf') });
  });
});

describe('where a rigid heddle ends', () => {
  // Ten ends to the inch and nothing that draws in: 2.54 mm for each end.
  const wide = (widthMm: number, holdsMm?: number): unknown => ({ ...SCARF, size: { widthMm, lengthMm: 500 }, heddle: { spacingMm: 2.54, ...(holdsMm === undefined ? {} : { widthMm: holdsMm }) }, allowances: NONE });

  test('a heddle holds a cloth that is just as wide as it', () => {
    expect(tellFindings(wide(254, 254))).toEqual([]);
    expect(tellFindings(wide(254.1, 254))[0]).toBe('E_FIT /heddle/widthMm: The cloth stands 25.5 cm wide in the heddle, which holds 25.4 cm. Up to 25.4 cm of finished width fit.');
  });

  test('a close cloth of thick weft bends as evenly as it can, and says so', () => {
    // Ends of 0.9 mm 4.2 mm apart, weft of 1.5 mm in rows of 1.8 mm: the weft alone has to bend.
    const close = { ...SCARF, heddle: { spacingMm: 4.2 }, picksPerCm: 10 / 1.8, yarns: { warp: { tex: 504.5 }, weft: { tex: 1401.3 } } };
    expect(tellFindings(close)).toEqual(['W_CLAMPED /picksPerCm: Warp and weft cannot bend alike in so close a cloth. The nearest that is possible is reckoned.']);
  });

  test('with a tenth drawn in and a tenth shrunk, a heddle of 300 mm weaves 243 mm', () => {
    const [found = ''] = tellFindings({ ...SCARF, size: { widthMm: 260, lengthMm: 500 }, heddle: { spacingMm: 2.54, widthMm: 300 }, allowances: { drawIn: 0.1, widthShrinkage: 0.1 } });
    expect(found.replaceAll('\u00a0', ' ')).toContain('Up to 24.3 cm of finished width fit.');
  });

  test.each<[string, unknown]>([
    ['three ends', wide(7.7)], ['four ends', wide(10.2)], ['two thousand ends', wide(2000 * 2.54)], ['two thousand and one ends', wide(2001 * 2.54)],
    ['a warp that is missing', { ...SCARF, yarns: { weft: SCARF.yarns.weft } }],
    ['a weft of no thickness', { ...SCARF, yarns: { warp: SCARF.yarns.warp, weft: {} } }],
    ['half a piece', { ...SCARF, pieces: 1.5 }],
    ['two fifths drawn in', { ...SCARF, allowances: { drawIn: 0.4 } }],
    ['half shrunk', { ...SCARF, allowances: { widthShrinkage: 0.5, lengthShrinkage: 0.51 } }],
    ['too narrow and too close at once', { ...SCARF, size: { widthMm: 4, lengthMm: 100 }, picksPerCm: 60 }],
  ])('%s', (name, piece) => {
    expectKept(file('findings'), name, tellFindings(piece));
  });
});
