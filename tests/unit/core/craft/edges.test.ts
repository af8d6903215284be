import { describe, expect, test } from 'vitest';
import { fitPiece } from '#core/craft/fit.ts';
import { lashingWraps } from '#core/craft/hanging.ts';
import type { Finish, Fixing } from '#core/craft/piece.ts';
import { pieceWith, planOf, PLAIN_PIECE, problemsOf, refusals, warningsOf } from './a-piece.ts';

const finished = (finish: Finish, frameMm = 700) => pieceWith({ finish, loom: { ...PLAIN_PIECE.loom, insideHeightMm: frameMm } });
const hung = (fixing: Fixing, diameterMm = 12) => pieceWith({ dowel: { diameterMm, fixing }, loom: { ...PLAIN_PIECE.loom, insideHeightMm: 600 } });

describe('the lower ends', () => {
  test('need warp for fringe, knot and hand when they are knotted', () => {
    const bundleMm = Math.sqrt(4) * 0.8014131 * 1.43;
    expect(planOf(finished({ bottom: 'knotted', fringeMm: 100 })).loom.bottomMm).toBeCloseTo(100 + 10 * bundleMm + 30, 5);
    expect(planOf(finished({ bottom: 'knotted', fringeMm: 100, bundleEnds: 2 })).loom.bottomMm).toBeCloseTo(100 + (10 * bundleMm) / Math.SQRT2 + 30, 5);
  });

  test('need a quarter more than their length when they are twisted, no more than their length when they are left plain', () => {
    expect(planOf(finished({ bottom: 'twisted', fringeMm: 120 })).loom.bottomMm).toBe(150);
    expect(planOf(finished({ bottom: 'plain', fringeMm: 120 })).loom.bottomMm).toBe(120);
    expect(planOf(finished({ bottom: 'plain' })).loom.bottomMm).toBe(60);
    expect(planOf(finished({ bottom: 'tucked' })).loom.bottomMm).toBe(60);
  });

  test('set the height of the spacer card', () => {
    expect(planOf(finished({ bottom: 'twisted', fringeMm: 120 })).cut.spacerCard.heightMm).toBe(150);
  });

  test('get what they need where less was asked, and say so', () => {
    const short = { ...finished({ bottom: 'twisted', fringeMm: 120 }), allowances: { bottomMm: 80 } };
    expect(planOf(short).loom.bottomMm).toBe(150);
    expect(planOf(short).warnings).toContainEqual({
      code: 'W_FRINGE', path: '/allowances/bottomMm', message: 'The finish needs 15 cm of warp below the cloth; that is left, instead of 80 mm.',
    });
    expect(warningsOf({ ...short, allowances: { bottomMm: 150 } })).not.toContain('W_FRINGE /allowances/bottomMm');
  });

  test('that need more than the frame has do not fit', () => {
    expect(refusals(finished({ bottom: 'knotted', fringeMm: 150 }, 520))).toEqual(['E_FIT /loom/insideHeightMm']);
  });

  test.each<[object, string]>([
    [{ bottom: 'braided' }, 'E_ENUM /finish/bottom'],
    [{ bottom: 'tucked', fringeMm: 50 }, 'E_ENUM /finish/fringeMm'],
    [{ bottom: 'plain', bundleEnds: 4 }, 'E_ENUM /finish/bundleEnds'],
    [{ bottom: 'knotted', fringeMm: -1 }, 'E_RANGE /finish/fringeMm'],
    [{ bottom: 'knotted', bundleEnds: 1.5 }, 'E_COUNT /finish/bundleEnds'],
  ])('%j is refused once', (finish, refusal) => {
    expect(refusals(pieceWith({ finish: finish as Finish }))).toEqual([refusal]);
  });
});

describe('the upper edge', () => {
  test('keeps warp for loops to be tied, less for them to slip on, none for a lashing', () => {
    expect(planOf(hung('tied')).loom.topMm).toBe(63.5);
    expect(planOf(hung('slipped')).loom.topMm).toBe(40);
    expect(planOf(hung('lashed', 30)).loom.topMm).toBe(40);
    expect(planOf(hung('slipped', 30)).loom.topMm).toBeCloseTo(15 * Math.PI + 5, 12);
  });

  test('takes yarn for a lashing, and a fixing in the wall that holds four times the piece', () => {
    const { cut, massG } = planOf(hung('lashed'));
    expect(lashingWraps(300)).toBe(21);
    expect(cut.lashingMm).toBeCloseTo(21 * Math.hypot(Math.PI * (12 + 0.8014131 * 1.43), 15) + 300, 4);
    expect(cut.fixingHoldsG).toBeCloseTo(4 * massG, 9);
    expect(planOf(hung('tied')).cut).not.toHaveProperty('lashingMm');
    expect(planOf(PLAIN_PIECE).cut.fixingHoldsG).toBeGreaterThan(0);
  });

  test('is held in a way that is known', () => {
    expect(problemsOf(hung('glued' as Fixing))).toMatchObject([{ code: 'E_ENUM', path: '/dowel/fixing' }]);
  });
});

test('a student’s loom keeps the finish, and is told when it has no room for it', () => {
  const outcome = fitPiece(finished({ bottom: 'twisted', fringeMm: 200 }), { loom: { insideHeightMm: 640 } });
  expect(outcome).toMatchObject({ ok: false, problems: [{ code: 'E_FIT', path: '/loom/insideHeightMm' }] });
});
