import { describe, expect, test } from 'vitest';
import { fitPiece, type FitWay, type MyPiece } from '#core/craft/fit.ts';
import { scalePiece } from '#core/craft/fitting/scale-piece.ts';
import { isWorthChoosing, LEAST_WIDTH_MM, waysToFit } from '#core/craft/fitting/ways-to-fit.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { PLAIN_PIECE, pieceWith } from '../a-piece.ts';

/** 62 ends at 5 mm: 31 knots in a row of rya, 124 in four of them. */
const SHORE: FrameLoomPiece = pieceWith({
  yarns: { ground: { metresPer100g: 180 }, pile: { metresPer100g: 100, label: 'Foam' } },
  bands: [
    { technique: 'tabby', yarn: 'ground', heightMm: 60 },
    { technique: 'soumak', name: 'ridge', yarn: 'pile', over: 4, back: 2, rows: 8, tabbyBetween: 2, tabbyYarn: 'ground' },
    { technique: 'rya', name: 'fringe', yarn: 'pile', strands: 3, legEnds: 1, pileMm: 150, trimMm: 10, rows: 4, heightMm: 40 },
    { technique: 'tabby', name: 'far-sky', yarn: 'ground', fill: true },
  ],
});
const told = (mine: MyPiece, pattern = SHORE): readonly string[] => {
  const fitted = fitPiece(pattern, mine);
  if (!fitted.ok) throw new Error(JSON.stringify(fitted.problems));
  return fitted.value.changes.map((words) => words.replaceAll('\u00a0', ' '));
};

describe('what differs is told in order, each thing once', () => {
  // 150/0.98 at 5 mm are 30.6 ends, 32 for an even number: 16 knots in a row, and two rows of them.
  test('of a piece half as large', () => {
    expect(told({ way: { kind: 'scaled', factor: 0.5 } })).toEqual([
      'The piece is 15 cm wide instead of 30 cm.',
      'The piece is 20 cm high instead of 40 cm.',
      'There are 32 ends instead of 62.',
      'Fringe: 7.5 cm long instead of 15 cm.',
      'Far sky: 13 cm high instead of 26 cm.',
      expect.stringMatching(/^\d+ rows of tabby become 119\.$/u),
      '8 rows of soumak become 4.',
      '124 knots become 32.',
    ]);
  });

  test('of bands left out, one without a name by its place; what is no more is not counted again', () => {
    const changes = told({ way: { kind: 'fewer-bands', leaveOut: ['#0', 'fringe'], heightMm: 300 } });
    expect(changes.slice(0, 2)).toEqual(['The piece is 30 cm high instead of 40 cm.', 'Left out: the first band and fringe.']);
    expect(changes.join(' ')).not.toMatch(/knots|soumak|instead of 1[^0-9]/u);
    expect(told({ way: { kind: 'fewer-bands', leaveOut: ['ridge', 'fringe'] } })).toContain('No Foam (pile) is needed.');
  });

  test('of yarns: whose they are, and how many strands go together', () => {
    const changes = told({ yarns: { ground: { metresPer100g: 200 }, pile: { metresPer100g: 50, label: 'Attic', strands: 2 } } });
    expect(changes.slice(0, 3)).toEqual(['Your own yarn is the ground yarn.', 'Attic is the pile yarn.', 'Take 2 strands of Attic (pile) together instead of 1.']);
    // One strand is what a yarn is where nothing is said, and the same yarn is no change.
    expect(told({ yarns: { ground: { metresPer100g: 180, strands: 1 }, pile: { metresPer100g: 100, label: 'Foam' } } })).toEqual([]);
    const doubled: FrameLoomPiece = { ...SHORE, yarns: { ...SHORE.yarns, ground: { metresPer100g: 360, strands: 2 } } };
    expect(told({ way: { kind: 'coarser', strands: { ground: 1 } } }, doubled)[0]).toBe('Take a single strand of the ground yarn instead of 2.');
  });

  test('of another kind of loom, how it is dressed and what the warp goes round', () => {
    expect(told({ loom: { kind: 'two-row-frame', nailRows: 'inner' } })).toEqual([expect.stringMatching(/^The warp goes round inner and outer nails by turns/u), 'The warp goes round every inner nail.']);
    expect(told({ loom: { kind: 'notched-frame' } }).slice(1, 5)).toEqual([
      'The warp steps along two nails at a time.', 'The warp goes round every notch.', 'Ends stand 10 mm apart instead of 5 mm.', 'There are 32 ends instead of 62.',
    ]);
  });
});

describe('a way that was kept is read again', () => {
  const refused = (way: unknown): string[] => {
    const fitted = fitPiece(SHORE, { way: way as FitWay });
    return fitted.ok ? [] : fitted.problems.map(({ code, path }) => `${code} ${path}`);
  };

  test('with all it may say', () => {
    expect(refused({ kind: 'fewer-bands', leaveOut: ['ridge'], from: 'last', heightMm: 300, widthMm: 280 })).toEqual([]);
    expect(refused({ kind: 'fewer-bands', leaveOut: Array.from({ length: 200 }, (_, place) => `band-${String(place)}`) })).toEqual([]);
    expect(refused({ kind: 'coarser', endsTogether: 1, strands: {} })).toEqual([]);
  });

  test.each<[unknown, string]>([
    [{ kind: 'fewer-bands', leaveOut: Array.from({ length: 201 }, () => 'ridge') }, 'E_ENUM /way/leaveOut'],
    [{ kind: 'fewer-bands', leaveOut: ['ridge', 3] }, 'E_ENUM /way/leaveOut'],
    [{ kind: 'fewer-bands', leaveOut: [], from: 'both' }, 'E_ENUM /way/from'],
    [{ kind: 'coarser', everyNthNail: 1.5, strands: {} }, 'E_COUNT /way/everyNthNail'],
    [{ kind: 'coarser', endsTogether: 3, strands: {} }, 'E_RANGE /way/endsTogether'],
    [{ kind: 'coarser', strands: { ground: 1.5 } }, 'E_COUNT /way/strands/ground'],
    [{ kind: 'coarser', endsTogether: 2 }, 'E_ENUM /way/strands'],
    [{ kind: 'narrower', widthMm: 0 }, 'E_RANGE /way/widthMm'],
  ])('%j is refused', (way, problem) => {
    expect(refused(way)).toEqual([problem]);
  });

  test('ends in pairs are worked singly again where it says so', () => {
    const pairs: FrameLoomPiece = { ...SHORE, warp: { ...SHORE.warp, endsTogether: 2 }, yarns: { ...SHORE.yarns, ground: { metresPer100g: 180, strands: 6 } } };
    expect(told({ way: { kind: 'coarser', endsTogether: 1, strands: { ground: 1 } } }, pairs)).toContain('Each end is worked by itself.');
  });
});

describe('a number of ends the pattern pinned', () => {
  const pinned: FrameLoomPiece = { ...SHORE, warp: { yarn: { tex: 400 }, endCount: 60 } };
  const ends = (way: FitWay): number => {
    const fitted = fitPiece(pinned, { way });
    return fitted.ok ? fitted.value.plan.ends.count : 0;
  };

  test('stays while bands alone are left out, and is reckoned anew for another width or spacing', () => {
    expect(ends({ kind: 'fewer-bands', leaveOut: ['ridge'] })).toBe(60);
    // 200/0.98 at 5 mm are 40.8.
    expect(ends({ kind: 'fewer-bands', leaveOut: ['ridge'], widthMm: 200 })).toBe(41);
    expect(ends({ kind: 'narrower', widthMm: 200 })).toBe(41);
  });
});

describe('what a way cannot do', () => {
  const way = (mine: MyPiece, id: string) => waysToFit(SHORE, mine).find((one) => one.id === id);

  test('is said: a loom too narrow for anything, or so low that little would be left', () => {
    // 110 inside: 8 nails, 15 ends, 73.5 mm.
    expect(LEAST_WIDTH_MM).toBe(80);
    expect(way({ loom: { insideWidthMm: 110 } }, 'narrower')).toMatchObject({ way: undefined, outcome: { ok: false } });
    // 165 high: 63.7 mm of 400, less than three tenths.
    expect(way({ loom: { insideHeightMm: 165 } }, 'scaled')).toMatchObject({ way: undefined, outcome: { problems: [{ message: 'Made so small, little of this piece would be left. A larger loom is needed.' }] } });
  });

  test('is not offered: ends in pairs twice, ends much further apart, bands nobody asked to leave out', () => {
    const ids = (mine: MyPiece, chosen: readonly string[] = []): string[] => waysToFit(SHORE, mine, 'cm', chosen).map(({ id }) => id);
    expect(ids({ endsTogether: 2 })).not.toContain('doubled');
    expect(ids({})).toContain('doubled');
    expect(ids({ loom: { nailPitchMm: 50 } })).not.toContain('fewer-nails');
    expect(ids({ loom: { nailPitchMm: 30 } })).toContain('fewer-nails');
    expect(ids({})).not.toContain('leave-chosen');
    expect(ids({}, ['ridge'])).toContain('leave-chosen');
    expect(ids({ loom: { insideWidthMm: 280 } })).not.toContain('leave-last');
    expect(ids({ loom: { insideHeightMm: 450 } })).not.toContain('narrower');
    // A yarn that jams is no matter of the loom's room, so nothing is scaled for it.
    expect(ids({ yarns: { ground: { tex: 20_000 } } })).toEqual(['as-it-is', 'doubled', 'fewer-nails']);
  });

  test('and a choice is shown where one was made or the loom asks for one', () => {
    const worth = (mine: MyPiece): boolean => isWorthChoosing(waysToFit(SHORE, mine), mine);
    expect(worth({ way: { kind: 'scaled', factor: 0.9 } })).toBe(true);
    expect(worth({})).toBe(false);
    expect(isWorthChoosing([], {})).toBe(false);
    expect(isWorthChoosing(waysToFit(SHORE, {}).slice(0, 1), { way: { kind: 'scaled', factor: 0.9 } })).toBe(false);
  });
});

test('a fringe of its own ends grows with the piece', () => {
  expect(scalePiece(pieceWith({ finish: { bottom: 'knotted', fringeMm: 80 } }), 1.5).finish).toMatchObject({ bottom: 'knotted', fringeMm: 120 });
  expect(scalePiece(PLAIN_PIECE, 1.5)).not.toHaveProperty('finish');
});
