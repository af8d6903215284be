/**
 * Crimp against printed values, against the implicit equations solved by bisection, and
 * against the yarn's path drawn as arc, line, arc and measured along.
 */
import integrate from 'integrate-adaptive-simpson';
import { describe, expect, test } from 'vitest';
import { jammingSum, waveOf, weftFacedCrimp, weftWaveRange, type Wave } from '#core/craft/crimp.ts';
import { pickGeometry, pickLength } from '#core/craft/picks.ts';
import { squareMaximum } from '#core/craft/sett.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';
import { texFromYardsPerPound } from '#core/craft/yarn/count.ts';
import { expectClose, expectPrinted } from './close.ts';

const PEIRCE = 'Peirce 1937 as given by N. Balasubramanian';

/** Peirce's h for a steepest angle, with the length that gives the right p; solved for h by bisection. */
function bisect(p: number, D: number, h: number): Wave {
  const straightOf = (theta: number): number => (p - D * Math.sin(theta)) / Math.cos(theta);
  const heightOf = (theta: number): number => straightOf(theta) * Math.sin(theta) + D * (1 - Math.cos(theta));
  let low = 0;
  let high = Math.PI / 2 - 1e-12;
  for (let step = 0; step < 200; step += 1) {
    const middle = (low + high) / 2;
    if (heightOf(middle) < h) low = middle;
    else high = middle;
  }
  const lengthMm = straightOf(low) + D * low;
  return { lengthMm, angleRad: low, crimp: lengthMm / p - 1 };
}

/** Length of the path itself: an arc of diameter D, a line, an arc, walked in small steps. */
function walk(D: number, { lengthMm, angleRad }: Wave): { readonly length: number; readonly p: number; readonly h: number } {
  const straight = lengthMm - D * angleRad;
  const at = (s: number): { readonly x: number; readonly y: number } => {
    const arc = (D / 2) * angleRad;
    const slope = s < arc ? s / (D / 2) : s < arc + straight ? angleRad : angleRad - (s - arc - straight) / (D / 2);
    return { x: Math.cos(slope), y: Math.sin(slope) };
  };
  const steps = 20_000;
  let p = 0;
  let h = 0;
  for (let step = 0; step < steps; step += 1) {
    const { x, y } = at(((step + 0.5) / steps) * lengthMm);
    p += (x * lengthMm) / steps;
    h += (y * lengthMm) / steps;
  }
  return { length: lengthMm, p, h };
}

function wave(p: number, D: number, h: number): Wave {
  const found = waveOf(p, D, h);
  if (found === undefined) throw new Error('jammed');
  return found;
}

describe('a yarn between two crossings', () => {
  test(`26: square cloth jams at p = D sin 60° with 0.2092 crimp and 60° (${PEIRCE}; exam answer 21 %)`, () => {
    const jammed = wave(Math.sin(Math.PI / 3), 1, 0.5);
    expectClose(jammed.crimp, 0.209199576, 1e-8);
    expectPrinted(jammed.crimp, '0.2092');
    expectPrinted(jammed.crimp * 100, '21');
    expectClose(jammed.angleRad, Math.PI / 3, 1e-6);
    expectClose(squareMaximum(1) / 1, 1 / (2 * Math.sin(Math.PI / 3)), 1e-15);
  });

  test.each([
    ['27: p = D, h = D/2', 1, 1, 0.5, { crimp: 0.143501109, angleRad: 0.643501109 }],
    ['28: h = D, r = 0.4', 2.5, 1, 1, { crimp: 0.0811218774 }],
    ['30: p 4.2, h 1.8, D 2.4', 4.2, 2.4, 1.8, { lengthMm: 4.60105233, angleRad: 0.459367162, crimp: 0.095488649 }],
    ['31: p 1.8, h 0.6, D 2.4', 1.8, 2.4, 0.6, { lengthMm: 1.91787515, angleRad: 0.445561254, crimp: 0.0654861927 }],
    ['29: h = D = p', 1, 1, 1, { crimp: Math.PI / 2 - 1 }],
  ] as const)('%s (closed form, bisection and the walked path agree)', (_, p, D, h, expected) => {
    const found = wave(p, D, h);
    for (const [key, value] of Object.entries(expected)) expectClose(found[key as keyof Wave], value, 1e-8);
    if (h < p) expectClose(found.lengthMm, bisect(p, D, h).lengthMm, 1e-9);
    const walked = walk(D, found);
    expectClose(walked.p, p, 1e-6);
    expectClose(walked.h, h, 1e-6);
  });

  test.each([[0.2, 0.020067481], [0.3, 0.045346998], [0.4, 0.0811218774], [0.5, 0.12782479], [0.6, 0.18610067], [0.8, 0.34183617], [1, 0.57079633]])(
    'weft over straight warp at tightness %f takes up %f (closed form of its own, and the usual approximations)',
    (r, crimp) => {
      expectClose(weftFacedCrimp(r), crimp, 1e-7);
      expectClose(wave(1, r, r).crimp, crimp, 1e-7);
      expectClose(weftFacedCrimp(r), r ** 2 / 2, 0.16);
      expect(weftFacedCrimp(r)).toBeGreaterThanOrEqual(r ** 2 / 2);
    },
  );

  test('a sinusoid of the same height is another curve: Simpson gives 0.0924 where arcs and line give 0.0811', () => {
    const sinusoid = integrate((x) => Math.sqrt(1 + (0.2 * Math.PI * Math.sin(Math.PI * x)) ** 2), 0, 1, 1e-12, 20) - 1;
    expectClose(sinusoid, 0.09238355, 1e-6);
    expectClose(integrate((x) => Math.sqrt(1 + (1.5 * (Math.PI / 6) * Math.cos((Math.PI * x) / 6)) ** 2), 0, 6, 1e-12, 20), 6.839031986, 1e-8);
  });
});

describe('jamming', () => {
  test.each([[0.85, 1.0535654, false], [0.87, 0.98610344, true]])(`32: equal yarns at p = %f D sum to %f (${PEIRCE})`, (p, sum, feasible) => {
    expectClose(jammingSum(1, p, p), sum, 1e-7);
    expect(weftWaveRange(1, p, p) !== undefined).toBe(feasible);
  });

  test.each([1e-3, 0.37, 1, 12.3, 1e4])('square cloth of D = %f jams at p = D sin 60°, neither sooner nor later, whatever rounding does (Peirce’s limit is a ratio)', (D) => {
    const p = D * Math.sin(Math.PI / 3);
    expectClose(wave(p, D, D / 2).crimp, 0.209199576, 1e-7);
    expect(waveOf(p * 0.9999, D, D / 2)).toBeUndefined();
    expectClose(weftWaveRange(D, p, p)?.min ?? Number.NaN, D / 2, 1e-7);
    expect(weftWaveRange(D, p * 0.9999, p * 0.9999)).toBeUndefined();
    expectClose(jammingSum(D, p, p), 1, 1e-12);
  });

  test('warp closer than D leaves the weft less than the whole wave (put back into Peirce’s equation, no straight part is left)', () => {
    const max = weftWaveRange(2, 1.8, 3)?.max ?? Number.NaN;
    expectClose(max, 1.1282202, 1e-7);
    expectClose(wave(1.8, 2, max).lengthMm, 2 * wave(1.8, 2, max).angleRad, 1e-6);
  });

  test('33: ends closer than both yarns together jam on a straight warp (by definition)', () => {
    expect(pickGeometry({ spacingMm: 2, warpDiameterMm: 0.9, weftDiameterMm: 1.5, pickSpacingMm: 1.8, mode: 'straight-warp' })).toBeUndefined();
  });

  test('the worked cloth leaves the weft a wave between 1.587451 and 2.4 mm (both limits)', () => {
    const range = weftWaveRange(2.4, 4.2, 1.8);
    expectClose(range?.min ?? 0, 1.587451, 1e-6);
    expectClose(range?.max ?? 0, 2.4, 1e-12);
  });
});

describe('picks', () => {
  const lay = (weftDiameterMm: number) => {
    const geometry = pickGeometry({ spacingMm: 5, warpDiameterMm: 0.8, weftDiameterMm, pickSpacingMm: 1.45, mode: 'straight-warp' });
    if (geometry === undefined) throw new Error('jammed');
    return pickLength(60, geometry);
  };

  test('34: 60 ends at 5 mm take 317.5085 mm a pick, and 328.1977 of two strands together (second way: arcs and lines added)', () => {
    expectClose(lay(1), 317.5085, 1e-6);
    expectClose(lay(Math.SQRT2), 328.1977, 1e-6);
  });

  const rug = () => {
    const warp = threadOf({ tex: texFromYardsPerPound(1600) }, 0.9);
    const weft = threadOf({ tex: texFromYardsPerPound(260) }, 0.84);
    const geometry = pickGeometry({
      spacingMm: 25.4 / 4,
      warpDiameterMm: warp.compressedMm,
      weftDiameterMm: weft.compressedMm,
      pickSpacingMm: 25.4 / 21,
      mode: 'straight-warp',
    });
    if (geometry === undefined) throw new Error('jammed');
    return { weft, geometry };
  };

  test('35: a rug of 714 picks takes 449.3 yards, a tenth less than its book lists with reserve and tails (rigid-heddle project book)', () => {
    const { geometry } = rug();
    expectClose(geometry.diameterSumMm, 2.5808426, 1e-7);
    expectClose(geometry.tightness, 0.40643191, 1e-7);
    expectClose(geometry.crimp, 0.083791308, 1e-7);
    expectClose(pickLength(84, geometry), 575.44277, 1e-7);
    const yards = (714 * pickLength(84, geometry)) / 914.4;
    expectClose(yards, 449.3287, 1e-6);
    expect(495 / yards).toBeGreaterThan(1);
    expect(495 / yards).toBeLessThan(1.2);
  });

  test('36: the weft of that rug weighs 1709.57 g a square metre, of the order of half a pound in a square foot (P. Collingwood, second-hand)', () => {
    const { weft, geometry } = rug();
    const gramsPerMetre = weft.tex / 1000;
    expectClose((gramsPerMetre * (1 + geometry.crimp)) / (geometry.pickSpacingMm / 1000), 1709.57, 1e-5);
    expectClose((0.5 * 453.59237) / 0.3048 ** 2, 2441.2138, 1e-7);
  });
});
