import { describe, expect, test } from 'vitest';
import { waveOf } from '#core/craft/crimp.ts';
import { planOf, PLAIN_PIECE, pieceWith, problemsOf, refusals, warningsOf } from './a-piece.ts';

const { beat: _, ...WITHOUT_BEAT } = PLAIN_PIECE;
const straight = planOf(PLAIN_PIECE);

describe('a balanced cloth', () => {
  test('that says no beat has its rows as far apart as its ends', () => {
    const { weft, ends } = planOf({ ...WITHOUT_BEAT, mode: 'balanced' });
    expect(weft.pickSpacingMm).toBe(ends.spacingMm);
  });

  test('bends its warp too, and so takes more of it', () => {
    const { weft, warp, ends, loom } = planOf({ ...WITHOUT_BEAT, mode: 'balanced' });
    const bent = waveOf(weft.pickSpacingMm, weft.diameterSumMm, weft.diameterSumMm / 2);
    const straightMm = planOf(pieceWith({ warp: { ...PLAIN_PIECE.warp, endCount: ends.count } })).warp.netMm;
    expect(warp.netMm - straightMm).toBeCloseTo(ends.count * loom.heightOnLoomMm * (bent?.crimp ?? 0), 6);
    expect(weft.crimp).toBeCloseTo(bent?.crimp ?? 0, 12);
  });
});

test('only a balanced cloth may leave the beat out', () => {
  for (const mode of ['straight-warp', undefined]) expect(refusals({ ...WITHOUT_BEAT, ...(mode === undefined ? {} : { mode }) })).toEqual(['E_ENUM /beat']);
});

describe('a given wave', () => {
  const bent = (weftWaveMm: number) => ({ ...WITHOUT_BEAT, beat: { picksPerCm: 4 }, mode: 'given', weftWaveMm });
  const D = straight.weft.diameterSumMm;

  test('is what the weft bends, and the rest of both yarns is what the warp bends', () => {
    const { weft } = planOf(bent(1.2));
    expect(weft.crimp).toBeCloseTo(waveOf(5, D, 1.2)?.crimp ?? 0, 12);
    expect(planOf(bent(1.2)).warp.netMm).toBeGreaterThan(planOf(bent(1.6)).warp.netMm);
  });

  test('as high as both yarns together leaves the warp straight', () => {
    expect(planOf(bent(D)).warp.netMm).toBeCloseTo(straight.warp.netMm, 9);
    expect(planOf(bent(D)).weft.crimp).toBeCloseTo(straight.weft.crimp, 12);
  });

  test('is refused above both yarns together, and where the yarns leave it no room', () => {
    expect(problemsOf(bent(D + 0.1))).toEqual([{ code: 'E_RANGE', path: '/weftWaveMm', message: 'A wave is at most as high as both yarns together: up to 1.8 mm works.' }]);
    expect(refusals({ ...bent(0.1), beat: PLAIN_PIECE.beat })).toEqual(['E_JAM /weftWaveMm']);
    expect(refusals({ ...PLAIN_PIECE, mode: 'given' })).toEqual(['E_NUM /weftWaveMm']);
  });
});

describe('a measured take-up', () => {
  test('is taken at its word, and leaves the warp straight unless that was measured too', () => {
    const measured = planOf({ ...PLAIN_PIECE, mode: 'measured', takeUp: 0.07 });
    expect(measured.weft.crimp).toBe(0.07);
    expect(measured.weft.stepMm).toBeCloseTo(5 * 1.07, 12);
    expect(measured.warp.netMm).toBe(straight.warp.netMm);
    const both = planOf({ ...PLAIN_PIECE, mode: 'measured', takeUp: 0.07, warpTakeUp: 0.02 });
    expect(both.warp.netMm - straight.warp.netMm).toBeCloseTo(62 * straight.loom.heightOnLoomMm * 0.02, 6);
  });

  test('that nobody took is a tenth of both yarns, and the bracket is told', () => {
    const unknown = { ...PLAIN_PIECE, mode: 'measured' } as const;
    expect(planOf(unknown).weft.crimp).toBe(0.1);
    expect(planOf(unknown).warp.netMm - straight.warp.netMm).toBeCloseTo(62 * straight.loom.heightOnLoomMm * 0.1, 6);
    expect(warningsOf(unknown)).toContain('W_TAKE_UP /takeUp');
    expect(planOf(unknown).warnings[0]?.message).toContain('between 6.5 and 14.5 %');
  });

  test('reckons even yarns that jam by the model, whose owner has woven them', () => {
    const thick = { ...PLAIN_PIECE, yarns: { ground: { metresPer100g: 4 } } };
    expect(refusals(thick)).toEqual(['E_JAM /yarns/ground']);
    expect(planOf({ ...thick, mode: 'measured', takeUp: 0.3 }).weft.crimp).toBe(0.3);
  });
});

test.each([
  [{ mode: 'balanced', takeUp: 0.1 }, 'E_ENUM /takeUp'],
  [{ weftWaveMm: 1 }, 'E_ENUM /weftWaveMm'],
  [{ mode: 'given', weftWaveMm: 1.7, warpTakeUp: 0.1 }, 'E_ENUM /warpTakeUp'],
  [{ mode: 'measured', takeUp: 0.61 }, 'E_RANGE /takeUp'],
  [{ mode: 'measured', takeUp: '0.1' }, 'E_NUM /takeUp'],
])('%j is refused once', (keys, refusal) => {
  expect(refusals({ ...PLAIN_PIECE, ...keys })).toEqual([refusal]);
});
