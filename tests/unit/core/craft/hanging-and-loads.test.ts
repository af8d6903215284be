import { describe, expect, test } from 'vitest';
import { bundleDiameter, cordLength, dowelLength, endsForFringe, endsForTwistedFringe, lashingLength, leastDowelDiameter, overhandKnot } from '#core/craft/hanging.ts';
import { nailsOnRail, nailsUsed, railNeeded } from '#core/craft/nails.ts';
import { butterflyLength, rowsPerLoad } from '#core/craft/picks.ts';
import { marginFor, UNCERTAINTIES, ballsFor } from '#core/craft/purchase.ts';
import { slopeAngle } from '#core/craft/shapes.ts';
import { hoursOf, NO_WORK } from '#core/craft/time.ts';

describe('taking off and hanging', () => {
  test('a knot in a bundle of four swallows ten of its thicknesses', () => {
    expect(overhandKnot(bundleDiameter(4, 1.2))).toBeCloseTo(24, 12);
    expect(endsForFringe(100, 2.4)).toBeCloseTo(154, 12);
    expect(endsForTwistedFringe(100)).toBe(125);
  });

  test('lashing goes round dowel and yarn, a little on at each wrap', () => {
    expect(lashingLength(10, 0, 12, 2)).toBeCloseTo(10 * Math.PI * 14, 9);
    expect(lashingLength(10, 20, 12, 2)).toBeGreaterThan(lashingLength(10, 0, 12, 2));
  });

  test('a dowel stands out on both sides, and is thicker for a heavier or a wider piece and for softer wood', () => {
    expect(dowelLength(300)).toBe(380);
    const least = leastDowelDiameter(200, 400);
    expect(leastDowelDiameter(400, 400)).toBeGreaterThan(least);
    expect(leastDowelDiameter(200, 800)).toBeGreaterThan(least);
    expect(leastDowelDiameter(200, 400, 12e9)).toBeLessThan(least);
    expect(leastDowelDiameter(0, 400)).toBe(0);
  });

  test('a flat cord is as long as its span and two knots', () => {
    expect(cordLength(340, 0)).toBe(640);
  });
});

describe('filling a shuttle', () => {
  test('25 figure-eights over a hand of 16 cm hold 8 m, 24 rows of 328 mm', () => {
    expect(butterflyLength(25, 160)).toBe(8000);
    expect(rowsPerLoad(8000, 328.4816)).toBe(24);
  });
});

describe('nails', () => {
  test('a rail takes as many as fit between its margins', () => {
    expect(nailsOnRail(350, 10)).toBe(32);
    expect(railNeeded(32, 10)).toBe(350);
    expect(nailsOnRail(349, 10)).toBe(31);
    expect(nailsOnRail(30, 10)).toBe(0);
    expect(nailsUsed(20, 'two-nail')).toEqual({ top: 20, bottom: 20 });
  });
});

test('balls are whole, and say when the last is nearly used up', () => {
  expect(ballsFor(180_000, 90)).toEqual({ count: 2, leftOverMm: 0, tight: true });
  expect(ballsFor(150_000, 90)).toMatchObject({ count: 2, leftOverMm: 30_000, tight: false });
  expect(ballsFor(0, 90)).toEqual({ count: 0, leftOverMm: 0, tight: false });
});

test('a tenth of a ball left over is enough, less is tight', () => {
  expect(ballsFor(90_000, 100)).toMatchObject({ count: 1, tight: false });
  expect(ballsFor(90_001, 100)).toMatchObject({ count: 1, tight: true });
});

test('a margin covers what is not known', () => {
  expect(marginFor(UNCERTAINTIES.swatch)).toBeLessThan(marginFor(UNCERTAINTIES.unmeasured));
});

test('an edge that steps one end every row leans as end and row are to each other', () => {
  expect(slopeAngle(1, 1, { spacingMm: 5, pickSpacingMm: 5 })).toBeCloseTo(Math.PI / 4, 12);
  expect(slopeAngle(0, 1, { spacingMm: 5, pickSpacingMm: 5 })).toBe(0);
});

test.each([
  ['60 rows of 50 ends, at 50 seconds each', { rows: 60, workingEnds: 50 }, 50 / 60],
  ['360 changes of colour, at 10 seconds each', { colourChanges: 360 }, 1],
  ['75 rya knots, of which an hour takes 150', { knots: 75 }, 0.5],
  ['900 stitches, of which an hour takes 300', { stitches: 900 }, 3],
  ['60 bundles of hem, of which an hour takes 120', { hemBundles: 60 }, 0.5],
  ['240 ends to warp, of which an hour takes 120', { warpEnds: 240 }, 2],
])('%s, take their time and no other', (_, work, hours) => {
  expect(hoursOf({ ...NO_WORK, ...work }).likely - hoursOf(NO_WORK).likely).toBeCloseTo(hours, 12);
});

test('a piece with nothing to weave is still finished', () => {
  expect(hoursOf(NO_WORK)).toEqual({ likely: 0.75, low: 0.75 * 0.6, high: 0.75 * 1.8 });
});
