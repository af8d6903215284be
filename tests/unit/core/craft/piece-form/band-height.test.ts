import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { heightAt, holdBand, withHeight, withinHold, type HeldBand } from '#core/craft/piece-form/band-height.ts';
import { judgeTyped } from '#core/craft/piece-form/judge-typed.ts';
import { typePiece } from '#core/craft/piece-form/type-piece.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import type { Units } from '#core/units/units.ts';
import { pieceOf, pieceWith, planOf } from '../a-piece.ts';

// One thickness of this weft is 0.7 rows: the rows lie 1.5 to 2 mm apart, whatever the band.
const piece = pieceOf(
  { technique: 'tabby', name: 'foot', yarn: 'ground', heightMm: 30 },
  { technique: 'soumak', yarn: 'ground', over: 4, back: 2, rows: 4, tabbyBetween: 2, tabbyYarn: 'ground' },
  { technique: 'rya', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 80, trimMm: 5, rows: 2, heightMm: 12 },
  { technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 },
);
const tall = pieceWith({ size: { widthMm: 300, heightMm: 60 }, bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 20 }, { technique: 'tabby', yarn: 'ground', heightMm: 40 }] });

function hold(of: FrameLoomPiece, band: number): HeldBand {
  return holdBand(of, planOf(of), band) ?? expect.fail('it cannot be pulled');
}

function pulled(of: FrameLoomPiece, band: number, steps: number, units: Units = 'cm'): { readonly piece: FrameLoomPiece; readonly plan: FrameLoomPlan } {
  const judged = judgeTyped(withHeight(typePiece(of, units), hold(of, band), steps));
  return judged.ok ? judged : expect.fail(JSON.stringify(judged.problems));
}

describe('pulling at a band', () => {
  test.each(['cm', 'in'] as const)('of tabby sets whole rows, also measured in %s', (units) => {
    fc.assert(fc.property(fc.integer({ min: 1, max: hold(piece, 0).most }), (rows) => { expect(pulled(piece, 0, rows, units).plan.bands[0]?.picks).toBe(rows); }), { numRuns: 60 });
  });

  test('of soumak sets its rows, and its height follows', () => {
    const held = hold(piece, 1);
    const { plan, piece: after } = pulled(piece, 1, 7);
    expect(after.bands[1]).toMatchObject({ rows: 7 });
    expect(plan.bands[1]?.heightMm).toBeCloseTo(heightAt(held, 7), 6);
  });

  test('of knots keeps its rows and sets a whole millimetre', () => {
    expect(hold(piece, 2)).toMatchObject({ by: 'mm', steps: 12 });
    expect(pulled(piece, 2, 17).piece.bands[2]).toMatchObject({ rows: 2, heightMm: 17 });
  });

  test('the filling band gives way, and to nothing at the most', () => {
    const held = hold(piece, 0);
    const { plan } = pulled(piece, 0, held.most);
    const last = plan.bands.at(-1)?.heightMm ?? -1;
    expect(last).toBeGreaterThanOrEqual(0);
    expect(last).toBeLessThan(held.stepMm + 0.1);
    expect([withinHold(held, -5), withinHold(held, 1e9), withinHold(held, 3.4)]).toEqual([1, held.most, 3]);
  });

  test('without a filling band the piece grows as much', () => {
    const held = hold(tall, 0);
    const { piece: after, plan } = pulled(tall, 0, held.steps + 5);
    expect(plan.bands[0]?.picks).toBe(held.steps + 5);
    const [first, second] = after.bands.map((band) => ('heightMm' in band ? (band.heightMm ?? 0) : 0));
    expect(after.size.heightMm).toBeCloseTo((first ?? 0) + (second ?? 0), 6);
  });

  test('a filling band, a hem-stitch and a band that is not there cannot be pulled', () => {
    expect([4, 3, 9, -1].map((band) => holdBand(piece, planOf(piece), band))).toEqual([null, null, null, null]);
  });
});
