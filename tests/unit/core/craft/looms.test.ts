import { describe, expect, test } from 'vitest';
import { fitPiece } from '#core/craft/fit.ts';
import { LOOM_WORDS } from '#core/craft/looms/loom-words.ts';
import { LOOM_KIND_NAMES, LOOM_KINDS } from '#core/craft/looms/looms.ts';
import { evenShare, spacingRows, unevenness } from '#core/craft/nails.ts';
import { bestSpacing, offeredSpacings } from '#core/craft/offered-spacings.ts';
import type { Loom } from '#core/craft/piece.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';
import { pieceWith, planOf, PLAIN_PIECE, problemsOf, refusals } from './a-piece.ts';

const on = (loom: Partial<Loom>) => pieceWith({ loom: { ...PLAIN_PIECE.loom, ...loom } });

describe('kinds of loom', () => {
  test.each(LOOM_KIND_NAMES)('a %s says how it is dressed, what goes wrong on it, and why a way of winding does not go', (name) => {
    const { dressing, cautions } = LOOM_WORDS[name];
    const { warpings, otherWarping, leastBareMm } = LOOM_KINDS[name];
    for (const sentence of [dressing, ...cautions]) expect(sentence).toMatch(/^[A-Z].*\.$/u);
    expect(cautions.length).toBeGreaterThan(0);
    expect(warpings.length === 2).toBe(otherWarping === undefined);
    expect(planOf(on({ kind: name, warping: warpings[0] })).loom.topMm).toBeGreaterThanOrEqual(leastBareMm.top);
  });

  test('a loom that does not say what it is has a row of nails', () => {
    expect(planOf(on({ kind: 'nailed-frame' }))).toEqual(planOf(PLAIN_PIECE));
  });

  test('notches hold one end each, and refuse a zigzag in words', () => {
    expect(problemsOf(on({ kind: 'notched-frame' }))).toEqual([{
      code: 'E_ENUM',
      path: '/loom/warping',
      message: 'In notches one end lies in each: the warp steps along from notch to notch, and a zigzag finds no hold. This works: two-nail.',
    }]);
    expect(planOf(on({ kind: 'notched-frame', warping: 'two-nail', nailPitchMm: 5 })).ends).toMatchObject({ count: 62, spacingMm: 5, nailsTop: 62, nailsBottom: 62 });
  });

  test('two rows of nails stand half their pitch apart, and the inner one alone at the whole', () => {
    const both = planOf(on({ kind: 'two-row-frame', nailPitchMm: 20 })).ends;
    expect(both).toMatchObject({ count: 62, spacingMm: 5 });
    expect(planOf(on({ kind: 'two-row-frame', nailPitchMm: 20, nailRows: 'both' })).ends).toEqual(both);
    expect(planOf(on({ kind: 'two-row-frame', nailPitchMm: 20, nailRows: 'inner' })).ends).toMatchObject({ spacingMm: 10 });
  });

  test('only a loom with two rows is asked which', () => {
    expect(refusals(on({ nailRows: 'inner' }))).toEqual(['E_ENUM /loom/nailRows']);
    expect(refusals(on({ kind: 'two-row-frame', nailRows: 'outer' as 'inner' }))).toEqual(['E_ENUM /loom/nailRows']);
    expect(refusals(on({ kind: 'inkle' as 'nailed-frame' }))).toEqual(['E_ENUM /loom/kind']);
  });
});

describe('a student’s own kind of loom', () => {
  const fitted = (loom: NonNullable<Parameters<typeof fitPiece>[1]['loom']>) => {
    const outcome = fitPiece(PLAIN_PIECE, { loom });
    if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
    return outcome.value;
  };

  test('takes the warp its own way, at the pattern’s spacing as nearly as it can', () => {
    const { piece, changes } = fitted({ kind: 'notched-frame', nailPitchMm: 5 });
    expect(piece.loom).toMatchObject({ kind: 'notched-frame', warping: 'two-nail', everyNthNail: 2 });
    expect(changes[0]).toMatch(/^The warp comes up out of one notch/u);
    expect(changes).toContain('The warp goes round every second notch.');
  });

  test('with two rows of nails offers both of them or the inner one', () => {
    expect(fitted({ kind: 'two-row-frame', nailPitchMm: 20 }).plan.ends.spacingMm).toBe(5);
    const inner = fitted({ kind: 'two-row-frame', nailPitchMm: 10, nailRows: 'inner' });
    expect(inner.plan.ends.spacingMm).toBe(5);
    expect(inner.changes).toContain('The warp goes round every inner nail.');
  });

  test('forgets the pattern’s rows of nails where it has one', () => {
    const pattern = on({ kind: 'two-row-frame', nailPitchMm: 20, nailRows: 'both' });
    const outcome = fitPiece(pattern, { loom: { kind: 'nailed-frame', nailPitchMm: 10 } });
    expect(outcome).toMatchObject({ ok: true, value: { plan: { ends: { spacingMm: 5 } } } });
  });
});

describe('ends of a zigzag', () => {
  test('are even at half height only, and worst at the rails', () => {
    expect(unevenness(0.5, 'zigzag')).toBe(0);
    expect(unevenness(0, 'zigzag')).toBe(1);
    expect(unevenness(0.1, 'zigzag')).toBeCloseTo(0.8, 12);
    expect(unevenness(0.1, 'two-nail')).toBe(0);
  });

  test('differ by less than a tenth in no more than a tenth of the height, so rows at both edges set them even', () => {
    const edge = 0.5 - evenShare(0.1, 'zigzag') / 2;
    expect(unevenness(edge, 'zigzag')).toBeCloseTo(0.1, 12);
    expect(evenShare(0.1, 'two-nail')).toBe(1);
    expect(spacingRows('zigzag')).toEqual({ fewest: 3, most: 4 });
    expect(spacingRows('two-nail')).toEqual({ fewest: 0, most: 0 });
  });

  test('stand 1.2 and 8.8 mm apart where the first row comes to lie, on a frame of 52 cm with 6 cm left bare', () => {
    const { narrow, wide } = planOf(PLAIN_PIECE).loom.firstGapsMm;
    expect(narrow).toBeCloseTo(10 * (60 / 520), 12);
    expect(narrow + wide).toBeCloseTo(10, 12);
    expect(planOf(on({ warping: 'two-nail' })).loom).toMatchObject({ firstGapsMm: { narrow: 10, wide: 10 }, spacingRows: { most: 0 } });
  });
});

describe('the spacings a loom offers', () => {
  const warp = threadOf({ tex: 400 }, 0.9);
  const frame = { nailPitchMm: 10, warping: 'zigzag' } as const;

  test('are those of every nail, every second, every third, and no others', () => {
    expect(offeredSpacings(frame, warp, threadOf({ tex: 400 }, 0.84)).map(({ everyNthNail, spacingMm }) => [everyNthNail, spacingMm])).toEqual([
      [1, 5], [2, 10], [3, 15], [4, 20], [5, 25],
    ]);
    expect(offeredSpacings({ nailPitchMm: 60, warping: 'two-nail' }, warp, warp)).toHaveLength(1);
  });

  test('each say what the yarn does there, and how many strands of it would come out well', () => {
    const [every, second] = offeredSpacings(frame, warp, threadOf({ metresPer100g: 300 }, 0.84));
    expect(every).toMatchObject({ advice: 'suits', strands: 2 });
    expect(second).toMatchObject({ advice: 'too-thin', strands: 17 });
    // However many she takes together now.
    expect(offeredSpacings(frame, warp, threadOf({ metresPer100g: 300, strands: 4 }, 0.84))[0]).toMatchObject({ strands: 2 });
    expect(offeredSpacings({ nailPitchMm: 4, warping: 'zigzag' }, threadOf({ tex: 1200 }, 0.9), warp)[0]).not.toHaveProperty('strands');
  });

  test('hold one that suits the yarn best', () => {
    expect(bestSpacing(frame, warp, threadOf({ metresPer100g: 180 }, 0.84))?.spacingMm).toBe(5);
    expect(bestSpacing(frame, warp, threadOf({ metresPer100g: 180, strands: 12 }, 0.84))?.spacingMm).toBe(10);
    expect(bestSpacing({ ...frame, nailPitchMm: 5 }, warp, threadOf({ metresPer100g: 180 }, 0.84))).toMatchObject({ everyNthNail: 2, spacingMm: 5 });
  });
});
