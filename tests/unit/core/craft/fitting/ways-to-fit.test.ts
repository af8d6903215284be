import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fitPiece, type MyPiece } from '#core/craft/fit.ts';
import { tellRoom } from '#core/craft/fitting/tell-room.ts';
import { isWorthChoosing, wayIdOf, waysToFit, type WayId, type WayToFit } from '#core/craft/fitting/ways-to-fit.ts';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import { cases } from '../../../../support/random-cases.ts';
import { PLAIN_PIECE, pieceWith, planOf } from '../a-piece.ts';

const plain = (words: string): string => words.replaceAll('\u00a0', ' ');
const wayOf = (pattern: FrameLoomPiece, mine: MyPiece, id: WayId, chosen: readonly string[] = []): WayToFit => {
  const found = waysToFit(pattern, mine, 'cm', chosen).find((way) => way.id === id);
  if (found === undefined) throw new Error(`no way ${id}`);
  return found;
};
const fittedBy = (pattern: FrameLoomPiece, mine: MyPiece, id: WayId, chosen?: readonly string[]) => {
  const { outcome, way } = wayOf(pattern, mine, id, chosen);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
  return { way, ...outcome.value, changes: outcome.value.changes.map(plain) };
};
const idsOf = (pattern: FrameLoomPiece, mine: MyPiece): WayId[] => waysToFit(pattern, mine).map(({ id }) => id);
const whyNot = (pattern: FrameLoomPiece, mine: MyPiece, id: WayId): string => {
  const { outcome } = wayOf(pattern, mine, id);
  return outcome.ok ? '' : outcome.problems.map(({ message }) => message).join(' ');
};

const HEM: Band = { technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 };
/** Foot 60, fringe 10, hill 90, and a sky that fills the other 240 of 400. */
const HILLS: FrameLoomPiece = pieceWith({
  bands: [
    HEM,
    { technique: 'tabby', name: 'foot', yarn: 'ground', heightMm: 60 },
    { technique: 'rya', name: 'fringe', yarn: 'pile', strands: 3, legEnds: 1, pileMm: 150, trimMm: 10, rows: 1, heightMm: 10 },
    { technique: 'tabby', name: 'hill', yarn: 'ground', heightMm: 90, shapes: [{ shape: 'triangle', yarn: 'ground', baseMm: 150, heightMm: 80 }] },
    { technique: 'tabby', name: 'sky', yarn: 'ground', fill: true },
    HEM,
  ],
  yarns: { ground: { metresPer100g: 180 }, pile: { metresPer100g: 100, wrapsPerInch: 7.5 } },
});

describe('a loom that is too low', () => {
  // 450 high: (450 − 100) · 0.98 = 343 mm of cloth, 340 in steps of a rule.
  test('lets the filling band shrink first', () => {
    const { way, plan, changes } = fittedBy(HILLS, { loom: { insideHeightMm: 450 } }, 'leave-last');
    expect(way).toEqual({ kind: 'fewer-bands', leaveOut: [], from: 'last', heightMm: 340 });
    expect(plan.loom.heightNeededMm).toBeCloseTo(340 / 0.98 + 100, 9);
    expect(changes.slice(0, 2)).toEqual(['The piece is 34 cm high instead of 40 cm.', 'Sky: 18 cm high instead of 24 cm.']);
    expect(idsOf(HILLS, { loom: { insideHeightMm: 450 } })).not.toContain('leave-first');
  });

  // 240 high: 137.2 mm of cloth. Foot and fringe are 70, with the hill 160; the sky takes the rest.
  test('leaves out whole bands from the end that is asked, and keeps the hem-stitch', () => {
    const mine: MyPiece = { loom: { insideHeightMm: 240 } };
    const last = fittedBy(HILLS, mine, 'leave-last');
    expect(last.way).toEqual({ kind: 'fewer-bands', leaveOut: ['hill'], from: 'last', heightMm: 135 });
    expect(last.plan.bands.map(({ technique, heightMm }) => [technique, heightMm])).toEqual([['hem-stitch', 0], ['tabby', 60], ['rya', 10], ['tabby', 65], ['hem-stitch', 0]]);
    expect(last.changes).toContain('Left out: hill.');
    const first = fittedBy(HILLS, mine, 'leave-first');
    expect(first.way).toEqual({ kind: 'fewer-bands', leaveOut: ['foot'], from: 'first', heightMm: 135 });
    // Fringe 10 and hill 90 leave 35 for the sky.
    expect(first.plan.bands.map(({ heightMm }) => heightMm)).toEqual([0, 10, 90, 35, 0]);
  });

  test('tells the yarn that nothing is woven with any more, without a warning', () => {
    const { outcome, changes } = { ...wayOf(HILLS, { loom: { insideHeightMm: 210 } }, 'leave-first'), ...fittedBy(HILLS, { loom: { insideHeightMm: 210 } }, 'leave-first') };
    expect(changes).toEqual(expect.arrayContaining(['Left out: foot and fringe.', 'No pile yarn is needed.']));
    expect(outcome.ok && outcome.warnings.filter(({ code }) => code === 'W_UNUSED')).toEqual([]);
  });

  test('takes the bands she chose, whatever end they are at', () => {
    const { way, plan } = fittedBy(HILLS, { loom: { insideHeightMm: 240 } }, 'leave-chosen', ['foot', 'fringe']);
    // The hill's 90 leave 45 of 135 for the sky.
    expect(way).toEqual({ kind: 'fewer-bands', leaveOut: ['foot', 'fringe'], heightMm: 135 });
    expect(plan.bands.map(({ heightMm }) => heightMm)).toEqual([0, 90, 45, 0]);
    expect(whyNot(HILLS, { loom: { insideHeightMm: 240 } }, 'leave-chosen')).toBe('Tick the bands you would rather do without.');
  });

  test('is as high as its bands where none of them fills', () => {
    const fixed = { ...HILLS, size: { widthMm: 300, heightMm: 160 }, bands: HILLS.bands.filter(({ name }) => name !== 'sky') };
    const { piece, way } = fittedBy(fixed, { loom: { insideHeightMm: 220 } }, 'leave-last');
    expect(way).toEqual({ kind: 'fewer-bands', leaveOut: ['hill'], from: 'last' });
    expect(piece.size.heightMm).toBe(70);
  });

  test('that holds nothing at all says so', () => {
    expect(whyNot(HILLS, { loom: { insideHeightMm: 100 } }, 'leave-last')).toBe('The loom is too low: no bands of this piece fit between its rails. A higher loom is needed.');
  });

  test('of both sizes too small is fitted by leaving out and narrowing together', () => {
    const { way, plan } = fittedBy(HILLS, { loom: { insideHeightMm: 240, insideWidthMm: 280 } }, 'leave-last');
    expect(way).toMatchObject({ leaveOut: ['hill'], widthMm: 235 });
    expect(plan.loom.insideWidthNeededMm).toBeLessThanOrEqual(280);
  });
});

describe('a loom that is too narrow', () => {
  // 280 inside: (280 − 40)/10 = 24 gaps, 25 nails, 49 ends, even 48: 48 · 5 · 0.98 = 235.2 mm.
  test('takes fewer ends', () => {
    const { way, plan } = fittedBy(HILLS, { loom: { insideWidthMm: 280 } }, 'narrower');
    expect(way).toEqual({ kind: 'narrower', widthMm: 235 });
    expect(plan.ends.count).toBe(48);
  });

  test('in inches in steps of a quarter', () => {
    const narrow = waysToFit(HILLS, { loom: { insideWidthMm: 280 } }, 'in').find(({ id }) => id === 'narrower');
    expect(narrow?.way).toEqual({ kind: 'narrower', widthMm: 9.25 * 25.4 });
  });

  test('is not helped by coarser ends, and says what is in the way', () => {
    expect(whyNot(HILLS, { loom: { insideWidthMm: 280 } }, 'doubled')).toContain('The loom is 28 cm inside.');
    expect(whyNot(HILLS, { loom: { insideWidthMm: 90 } }, 'narrower')).toContain('A wider loom is needed.');
  });
});

describe('scaled', () => {
  // 343 of 400 mm fit: 0.85 of everything.
  test('takes width, heights, shapes and pile by one factor', () => {
    const { way, piece, plan } = fittedBy(HILLS, { loom: { insideHeightMm: 450 } }, 'scaled');
    expect(way).toEqual({ kind: 'scaled', factor: 0.85 });
    expect(piece.size).toEqual({ widthMm: 255, heightMm: 340 });
    expect(piece.bands[2]).toMatchObject({ pileMm: 127.5, heightMm: 8.5, rows: 1, trimMm: 10 });
    expect(piece.bands[3]).toMatchObject({ heightMm: 76.5, shapes: [{ baseMm: 127.5, heightMm: 68 }] });
    // 255/0.98 · 0.2 = 52.04
    expect(plan.ends.count).toBe(52);
  });

  test('larger is offered on a larger loom, and what stays is told', () => {
    const mine: MyPiece = { loom: { insideHeightMm: 700, insideWidthMm: 600 } };
    const { way } = fittedBy(HILLS, mine, 'scaled');
    // Room (700 − 100) · 0.98 = 588 high, 1.47 of 400; wide enough for more.
    expect(way).toEqual({ kind: 'scaled', factor: 1.47 });
    const made = fittedBy(HILLS, mine, 'as-it-is');
    expect(tellRoom({ piece: HILLS, plan: planOf(HILLS) }, made, 'cm').map(plain)).toEqual([
      // (600 − 40)/10 + 1 = 57 nails, 112 ends: 112 · 5 · 0.98 = 548.8 mm.
      'At this spacing your loom holds a piece up to 54.8 cm wide and 58.8 cm high.',
      'As it is, yours stays 30 cm wide and 40 cm high.',
      'The warp spans the whole loom all the same: have 48 m of it in hand instead of 36 m.',
      'There is room for 18.8 cm more of the band that fills the rest (sky).',
    ]);
  });
});

describe('room that is left', () => {
  const told = (pattern: FrameLoomPiece, mine: MyPiece): string[] => tellRoom({ piece: pattern, plan: planOf(pattern) }, fittedBy(pattern, mine, 'as-it-is'), 'cm').map(plain);

  // 520 high: (520 − 100) · 0.98 = 411.6 mm of cloth.
  test('is told in height alone where the loom does not say its width', () => {
    expect(told(HILLS, {})[0]).toBe('At this spacing your loom holds a piece up to 41.1 cm high.');
  });

  // 510 high: 401.8 mm, of which 400 are woven. 548.8 mm of width hold more than 300.
  test('names no filling band where none fills, and no warp where it stays as it is', () => {
    const fixed: FrameLoomPiece = pieceWith({ bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 400 }] });
    expect(told(fixed, { loom: { insideWidthMm: 600 } })).toEqual([
      'At this spacing your loom holds a piece up to 54.8 cm wide and 41.1 cm high.',
      'As it is, yours stays 30 cm wide and 40 cm high.',
    ]);
  });

  // 508.2 high leave (508.163 − 100) · 0.98 = 400 mm for 400: nothing can grow.
  test('is nothing where the piece is as high as the loom holds', () => {
    expect(told(HILLS, { loom: { insideHeightMm: 400 / 0.98 + 100 } })).toEqual([]);
    // 350 inside are the very 32 nails it takes.
    expect(told(HILLS, { loom: { insideHeightMm: 400 / 0.98 + 100, insideWidthMm: 350 } }).length).toBeLessThanOrEqual(2);
  });
});

describe('coarser', () => {
  // r of the pattern 0.362670. Doubled: p 10, warp √2 · 0.8014131; (3.62670 − 1.133369)/1.011937 = 2.46392, squared 6.07.
  test('ends in pairs take as many strands as keep the cloth as tight', () => {
    const { way, plan } = fittedBy(HILLS, {}, 'doubled');
    expect(way).toEqual({ kind: 'coarser', endsTogether: 2, strands: { ground: 6 } });
    expect(plan.ends.spacingMm).toBe(10);
    expect(plan.weft.tightness).toBeCloseTo(0.3627, 2);
  });

  // (3.62670 − 0.8014131)/1.011937 = 2.79195, squared 7.79.
  test('so do fewer nails', () => {
    expect(fittedBy(HILLS, {}, 'fewer-nails').way).toEqual({ kind: 'coarser', everyNthNail: 2, strands: { ground: 8 } });
    expect(fittedBy(HILLS, {}, 'fewer-nails').changes).toContain('Take 8 strands of the ground yarn together instead of 1.');
  });

  test('lets a yarn close that jams between the pattern’s ends', () => {
    const thick: MyPiece = { yarns: { ground: { tex: 20_000 } } };
    expect(wayOf(HILLS, thick, 'as-it-is').outcome).toMatchObject({ ok: false, problems: [{ code: 'E_JAM' }] });
    expect(fittedBy(HILLS, thick, 'doubled').plan.weft.tightness).toBeLessThan(1);
  });
});

test('the ways are worth showing where the loom is smaller or larger, not where it is the pattern’s own', () => {
  const worth = (mine: MyPiece): boolean => isWorthChoosing(waysToFit(HILLS, mine), mine);
  expect(worth({})).toBe(false);
  expect(worth({ loom: { insideHeightMm: 525 } })).toBe(false);
  expect(worth({ loom: { insideHeightMm: 450 } })).toBe(true);
  expect(worth({ loom: { insideHeightMm: 800, insideWidthMm: 800 } })).toBe(true);
  expect(idsOf(HILLS, { widthMm: Number.NaN })).toEqual(['as-it-is']);
});

test('a kept way that is none is refused with its place', () => {
  const refusals = (way: unknown): string[] => {
    const outcome = fitPiece(HILLS, { way } as MyPiece);
    return outcome.ok ? [] : outcome.problems.map(({ code, path }) => `${code} ${path}`);
  };
  expect(refusals({ kind: 'wider' })).toEqual(['E_ENUM /way/kind']);
  expect(refusals({ kind: 'scaled', factor: 9 })).toEqual(['E_RANGE /way/factor']);
  expect(refusals({ kind: 'fewer-bands', leaveOut: 'all' })).toEqual(['E_ENUM /way/leaveOut']);
  expect(refusals({ kind: 'coarser', strands: { ground: 0 }, more: 1 })).toEqual(['E_RANGE /way/strands/ground', 'E_ENUM /way/more']);
});

describe('whatever the loom is', () => {
  const RUNS = { numRuns: cases(1000), seed: 20260901 };
  const looms = fc.record({
    insideWidthMm: fc.double({ min: 60, max: 900, noNaN: true }),
    insideHeightMm: fc.double({ min: 80, max: 1200, noNaN: true }),
    nailPitchMm: fc.constantFrom(4, 5, 6.35, 8, 10, 12.7, 16),
  });

  test('a way that fits never needs a larger loom than hers, and is the same when it is applied', () => {
    fc.assert(
      fc.property(looms, fc.constantFrom<'cm' | 'in'>('cm', 'in'), (loom, units) => {
        for (const { id, way, outcome } of waysToFit(HILLS, { loom }, units, ['hill'])) {
          if (!outcome.ok) continue;
          const { plan, piece } = outcome.value;
          expect(plan.loom.insideWidthNeededMm).toBeLessThanOrEqual(loom.insideWidthMm + 1e-6);
          expect(plan.loom.heightNeededMm).toBeLessThanOrEqual(loom.insideHeightMm + 1e-6);
          expect(piece.bands.filter(({ technique }) => technique === 'hem-stitch')).toHaveLength(2);
          expect(wayIdOf(way)).toBe(id);
          const again = fitPiece(HILLS, way === undefined ? { loom } : { loom, way }, units);
          expect(again.ok && again.value.plan).toEqual(plan);
        }
      }),
      RUNS,
    );
  }, 300_000);
});

test('the plain piece itself is not changed by being fitted', () => {
  const before = JSON.stringify(PLAIN_PIECE);
  waysToFit(PLAIN_PIECE, { loom: { insideHeightMm: 300, insideWidthMm: 200 } });
  expect(JSON.stringify(PLAIN_PIECE)).toBe(before);
});
