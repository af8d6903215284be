/** What a pattern comes to on other looms, as it was found right; `ways-to-fit.test.ts` reckons the chief of these by hand. */
import { describe, expect, test } from 'vitest';
import { fitPiece, type FitWay, type MyPiece } from '#core/craft/fit.ts';
import { lowerTo } from '#core/craft/fitting/leave-out.ts';
import { tellRoom } from '#core/craft/fitting/tell-room.ts';
import { isWorthChoosing, waysToFit, widestOn } from '#core/craft/fitting/ways-to-fit.ts';
import { roomOnLoom } from '#core/craft/frame-loom/room.ts';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import type { Outcome, Problem } from '#core/outcome.ts';
import type { FittedPiece } from '#core/craft/fit.ts';
import { expectKept, thousandths } from '../../../../support/kept.ts';
import { lowTide } from '../../../../support/low-tide.ts';
import { pieceWith, planOf, PLAIN_PIECE } from '../a-piece.ts';
import { loom } from '../frame-loom/woven-pieces.ts';

const file = (name: string): URL => new URL(`../../../../fixtures/fitting/${name}.json`, import.meta.url);
const plain = (words: string): string => words.replaceAll('\u00a0', ' ');
const said = (found: readonly Problem[]): string[] => found.map(({ code, path, message }) => plain(`${code} ${path}: ${message}`));
const HEM: Band = { technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 };
const PILE: Band = { technique: 'rya', name: 'fringe', yarn: 'pile', strands: 3, legEnds: 1, pileMm: 150, trimMm: 10, rows: 1, heightMm: 10 };
const yarns: FrameLoomPiece['yarns'] = { ground: { metresPer100g: 180 }, pile: { metresPer100g: 100, wrapsPerInch: 7.5 } };

/** With a band that fills, and shapes. */
const HILLS = pieceWith({
  yarns, dowel: { diameterMm: 12, lengthMm: 380 }, finish: { bottom: 'knotted', fringeMm: 60 }, ...loom({ insideHeightMm: 580 }),
  bands: [
    HEM, { technique: 'tabby', name: 'foot', yarn: 'ground', heightMm: 60 }, PILE,
    { technique: 'tabby', name: 'hill', yarn: 'ground', heightMm: 90, shapes: [{ shape: 'triangle', yarn: 'ground', baseMm: 150, heightMm: 80, centreMm: 120, leanMm: 20 }, { shape: 'circle', yarn: 'ground', radiusMm: 30, centreMm: 240, bottomMm: 10 }] },
    { technique: 'soumak', name: 'ridge', yarn: 'pile', over: 4, back: 2, rows: 3, tabbyBetween: 2, tabbyYarn: 'ground' },
    PLAIN_PIECE.bands[0], HEM,
  ],
});
/** As high as its bands come to. */
const STRIPES = pieceWith({
  yarns, size: { widthMm: 300, heightMm: 190 }, ...loom({ insideHeightMm: 400, insideWidthMm: 400 }),
  bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 100 }, { technique: 'loop-pile', yarn: 'pile', rodMm: 8, rows: 3, heightMm: 20 }, { technique: 'tabby', name: 'top', yarn: 'ground', heightMm: 70 }],
});
const PATTERNS = { 'hills under a sky': HILLS, 'stripes without a band that fills': STRIPES, 'the worked piece': await lowTide() } as const;

const LOOMS: Readonly<Record<string, MyPiece>> = {
  'her own loom is the pattern’s': {},
  'narrow': { loom: { insideWidthMm: 250 } }, 'far too narrow': { loom: { insideWidthMm: 70 } }, 'low': { loom: { insideHeightMm: 300 } }, 'far too low': { loom: { insideHeightMm: 120 } },
  'narrow and low': { loom: { insideWidthMm: 250, insideHeightMm: 350 } }, 'a little higher': { loom: { insideHeightMm: 660 } }, 'far larger': { loom: { insideWidthMm: 1200, insideHeightMm: 1500 } },
  'of close nails': { loom: { nailPitchMm: 4 } }, 'of wide nails': { loom: { nailPitchMm: 20 } }, 'of very wide nails': { loom: { nailPitchMm: 35 } },
  'two rows of nails': { loom: { kind: 'two-row-frame', nailPitchMm: 16 } }, 'the inner of two rows': { loom: { kind: 'two-row-frame', nailRows: 'inner' } }, 'notches': { loom: { kind: 'notched-frame', nailPitchMm: 6 } },
  'along two nails': { loom: { warping: 'two-nail', insideHeightMm: 400 } }, 'ends in pairs': { endsTogether: 2 }, 'wider': { widthMm: 330, loom: { insideWidthMm: 380 } }, 'narrower of her own will': { widthMm: 150 },
  'a thick yarn of her own': { yarns: { ground: { tex: 6000, label: 'Attic' } } }, 'a thin one, three together': { yarns: { ground: { metresPer100g: 600, strands: 3, colour: '#112233' } }, loom: { insideHeightMm: 420 } },
};

const madeIn = (outcome: Outcome<FittedPiece<FrameLoomPiece>>): unknown => {
  if (!outcome.ok) return said(outcome.problems);
  const { piece, plan, changes } = outcome.value;
  return { changes: changes.map(plain), warnings: said(outcome.warnings), size: piece.size, loom: piece.loom, dowel: piece.dowel, finish: piece.finish, ends: plan.ends.count, bands: piece.bands.map(({ yarn: _, ...band }) => JSON.stringify(thousandths(band))), needs: [plan.loom.insideWidthNeededMm, plan.loom.heightNeededMm] };
};

describe.each(Object.entries(PATTERNS))('%s', (name, pattern) => {
  test.each(Object.entries(LOOMS))('on a loom: %s', (of, mine) => {
    const chosen = of === 'low' ? ['hill', '#0', 'dunes'] : [];
    const ways = waysToFit(pattern, mine, 'cm', chosen);
    expectKept(file('ways'), `${name}; ${of}`, thousandths({
      ways: ways.map(({ id, way, outcome }) => ({ id, way, comesTo: id === 'as-it-is' ? madeIn(outcome) : outcome.ok ? outcome.value.changes.map(plain) : said(outcome.problems) })),
      worth: isWorthChoosing(ways, mine), widest: [widestOn(pattern, mine, 'cm'), widestOn(pattern, mine, 'in')],
    }));
  });

  test.each<[string, FitWay]>([
    ['two thirds as large', { kind: 'scaled', factor: 0.66 }], ['narrower', { kind: 'narrower', widthMm: 200 }], ['ends in pairs', { kind: 'coarser', endsTogether: 2, strands: { ground: 6, ash: 3 } }],
    ['every third nail', { kind: 'coarser', everyNthNail: 3, strands: {} }], ['a band less, and narrower', { kind: 'fewer-bands', leaveOut: ['#1', 'fringe', 'calm-low'], heightMm: 180, widthMm: 200 }],
  ])('made %s', (of, way) => {
    expectKept(file('made'), `${name}; ${of}`, thousandths(madeIn(fitPiece(pattern, { way }))));
  });

  test('told what a larger loom leaves', () => {
    const told = Object.entries(LOOMS).flatMap(([of, mine]) => {
      const fitted = fitPiece(pattern, mine);
      if (!fitted.ok) return [];
      return (['cm', 'in'] as const).map((units) => `${of}, ${units}: ${tellRoom({ piece: pattern, plan: planOf(pattern) }, fitted.value, units).map(plain).join(' ')}`);
    });
    expectKept(file('room'), name, told);
  });
});

describe('how low a piece can be made', () => {
  const bandsMm = 60 + 10 + 90;
  test('the band that fills gives way down to a finger’s width, and not at all where it is out', () => {
    const ridgeMm = (planOf(HILLS).bands[4]?.heightMm ?? 0);
    expect(lowerTo(HILLS, bandsMm + ridgeMm + 10, 'last', 5)).toMatchObject({ leaveOut: [] });
    expect(lowerTo(HILLS, bandsMm + ridgeMm + 9.9, 'last', 5)).toMatchObject({ leaveOut: ['ridge'] });
    expect(lowerTo(HILLS, bandsMm + ridgeMm, ['sky'], 5)).toEqual({ leaveOut: ['sky'] });
    expect(lowerTo(HILLS, bandsMm + ridgeMm - 0.1, ['sky'], 5)).toBeUndefined();
  });

  test('where it holds the whole piece, it stays as high as it is, whatever the steps', () => {
    expect(lowerTo(HILLS, 400, 'first', 30)).toEqual({ leaveOut: [], heightMm: 400 });
    expect(lowerTo(HILLS, 399.9, 'first', 30)).toEqual({ leaveOut: [], heightMm: 390 });
  });

  test('nothing but hem-stitch is no piece', () => {
    expect(lowerTo(STRIPES, 400, ['#0', '#1', 'top'], 5)).toBeUndefined();
    expect(lowerTo(STRIPES, 400, ['#0', '#1'], 5)).toEqual({ leaveOut: ['#0', '#1'] });
    expect(lowerTo({ ...STRIPES, bands: [HEM] }, 400, 'last', 5)).toBeUndefined();
    expect(lowerTo(STRIPES, 9, 'last', 5)).toBeUndefined();
  });

  test('a piece whose heights cannot be reckoned is left alone', () => {
    expect(lowerTo({ ...STRIPES, yarns: {} }, 100, 'last', 5)).toBeUndefined();
    expect(lowerTo({ ...HILLS, yarns: {} }, 100, 'last', 5)).toBeUndefined();
  });
});

test('room is told only where the loom tells its own size', () => {
  expect(roomOnLoom(HILLS)).toEqual({ heightMm: expect.any(Number) as unknown });
  expect(roomOnLoom(STRIPES)).toEqual({ widthMm: expect.any(Number) as unknown, heightMm: expect.any(Number) as unknown });
});
