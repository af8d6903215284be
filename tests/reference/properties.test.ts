/** What must hold whatever the numbers are, tried a thousand times and more. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { areaLength } from '#core/craft/colour-areas.ts';
import { jammingSum, waveOf, weftFacedCrimp, weftWaveRange } from '#core/craft/crimp.ts';
import { endsFor, endsSuit } from '#core/craft/ends.ts';
import { endsOnNails, nailsUsed } from '#core/craft/nails.ts';
import { pickLength, turnLength } from '#core/craft/picks.ts';
import { planPiece } from '#core/craft/plan.ts';
import { ceilSafe, roundHalfUp } from '#core/craft/rounding.ts';
import { stepShape, trueArea } from '#core/craft/shapes.ts';
import { COUNT_SYSTEMS, countFromTex, texFromCount } from '#core/craft/yarn/count.ts';
import type { CountSystem, FrameLoomPiece } from '#core/craft/piece.ts';
import { cases } from '../support/random-cases.ts';
import { isWoven, pieces } from './random-pieces.ts';
import { planOf, typedInInches } from './worked-piece.ts';

const RUNS = { numRuns: cases(1500), seed: 20260821 };
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const systems = fc.constantFrom(...(Object.keys(COUNT_SYSTEMS) as CountSystem[]));
const near = (actual: number, expected: number, relative: number): boolean => Math.abs(actual - expected) <= relative * Math.abs(expected) + 1e-300;

test('a count goes to tex and back unchanged', () => {
  fc.assert(fc.property(between(0.01, 1e4), systems, (count, system) => near(countFromTex(texFromCount(count, system), system), count, 1e-12)), RUNS);
});

test('any two counts agree through a third', () => {
  fc.assert(
    fc.property(between(1, 2e5), systems, systems, (tex, a, b) => near(texFromCount(countFromTex(texFromCount(countFromTex(tex, a), a), b), b), tex, 1e-12)),
    RUNS,
  );
});

describe('crimp', () => {
  test('over straight warp it lies between the two usual approximations', () => {
    fc.assert(
      fc.property(between(1e-3, 1), (r) => {
        const crimp = weftFacedCrimp(r);
        return crimp >= r ** 2 / 2 - 1e-12 && (r > 0.95 || crimp <= (9 * r ** 2) / 16);
      }),
      RUNS,
    );
  });

  test('grows with the wave and with thickness, and falls with spacing', () => {
    fc.assert(
      fc.property(between(1, 10), between(0.1, 0.8), between(0.05, 0.95), between(1.001, 1.2), (p, d, share, more) => {
        const D = d * p;
        const h = share * D;
        const crimp = waveOf(p, D, h)?.crimp ?? Number.NaN;
        const higher = waveOf(p, D, Math.min(D, h * more))?.crimp ?? Number.NaN;
        const thicker = waveOf(p, D * more, h)?.crimp ?? Number.NaN;
        const wider = waveOf(p * more, D, h)?.crimp ?? Number.NaN;
        return higher >= crimp - 1e-12 && thicker >= crimp - 1e-12 && wider <= crimp + 1e-12;
      }),
      RUNS,
    );
  });

  test('a wave can be chosen exactly where the jamming sum is at most one', () => {
    fc.assert(
      fc.property(between(0.2, 2), between(0.2, 2), (p1, p2) => {
        const sum = jammingSum(1, p1, p2);
        fc.pre(Math.abs(sum - 1) > 1e-6);
        return (weftWaveRange(1, p1, p2) !== undefined) === sum <= 1;
      }),
      RUNS,
    );
  });

  test('a yarn is never shorter than the way it covers', () => {
    fc.assert(
      fc.property(between(0.5, 10), between(0.1, 1), between(0, 1), (p, d, share) => {
        const wave = waveOf(p, d * p, share * d * p);
        return wave === undefined || wave.lengthMm >= p * (1 - 1e-12);
      }),
      RUNS,
    );
  });

  test('is a ratio: everything larger by the same factor lengthens the yarn by it and bends it no more', () => {
    fc.assert(
      fc.property(between(1, 10), between(0.1, 1), between(0, 1), between(0.1, 40), (p, d, share, k) => {
        const [one, scaled] = [waveOf(p, d * p, share * d * p), waveOf(k * p, k * d * p, k * share * d * p)];
        if (one === undefined || scaled === undefined) return one === scaled;
        return near(scaled.lengthMm, k * one.lengthMm, 1e-9) && Math.abs(scaled.crimp - one.crimp) < 1e-9;
      }),
      RUNS,
    );
  });

  test('a pick is longer than its cloth is wide', () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 2000 }), between(1, 12), between(0.05, 0.95), between(0.1, 5), (ends, p, r, pickSpacing) => {
        const stepMm = p * (1 + weftFacedCrimp(r));
        return pickLength(ends, { stepMm, turnMm: turnLength(r * p, pickSpacing) }) > (ends - 1) * p;
      }),
      RUNS,
    );
  });
});

describe('ends and nails', () => {
  test('zigzag uses one nail more than there are ends, and the nails carry no more', () => {
    fc.assert(
      fc.property(fc.integer({ min: 4, max: 2000 }), (ends) => {
        const { top, bottom } = nailsUsed(ends, 'zigzag');
        return top + bottom === ends + 1 && endsOnNails(top, 'zigzag') >= ends && endsOnNails(top - 1, 'zigzag') < ends;
      }),
      RUNS,
    );
  });

  test('ends are raised by at most three, until they suit', () => {
    fc.assert(
      fc.property(between(4, 2000), fc.constantFrom(1 as const, 2 as const), fc.constantFrom('any' as const, 'even' as const, 'odd' as const), (raw, together, parity) => {
        const { count, raisedBy } = endsFor(raw, together, parity);
        return endsSuit(count, together, parity) && raisedBy >= 0 && raisedBy <= 3 && count === roundHalfUp(raw) + raisedBy;
      }),
      RUNS,
    );
  });

  test('rounding keeps ties on one side, however they are computed', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 100_000 }), between(0.1, 50), (count, part) => {
        const tie = ((count + 0.5) * part) / part;
        return roundHalfUp(tie) === count + 1 && ceilSafe((count * part) / part) === count;
      }),
      RUNS,
    );
  });
});

describe('shapes', () => {
  const grid = fc.record({
    spacingMm: between(2, 12),
    pickSpacingMm: between(0.5, 5),
    ends: fc.integer({ min: 20, max: 400 }),
    symmetric: fc.boolean(),
  });

  test('a stepped triangle differs from the true one by at most half an end a row, one when symmetric', () => {
    fc.assert(
      fc.property(grid, between(20, 400), between(20, 400), (on, baseMm, heightMm) => {
        const shape = { shape: 'triangle', baseMm, heightMm } as const;
        const { rows, widths } = stepShape(shape, on);
        const ends = widths.reduce((sum, width) => sum + width, 0);
        const ideal = ((baseMm / on.spacingMm) * rows) / 2;
        return Math.abs(ends - ideal) <= rows * (on.symmetric ? 1 : 0.5) + 1e-6;
      }),
      RUNS,
    );
  });

  test('a symmetric shape keeps the parity of the warp in every row that has ends', () => {
    fc.assert(
      fc.property(grid, between(20, 200), (on, radiusMm) => {
        const { widths } = stepShape({ shape: 'circle', radiusMm }, { ...on, symmetric: true });
        return widths.every((width) => width === 0 || width % 2 === on.ends % 2);
      }),
      RUNS,
    );
  });

  test('areas of a row with slits take (E − q)·l + q·t in all', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 1, max: 40 }), { minLength: 1, maxLength: 8 }), between(1, 12), between(0.5, 9), (parts, stepMm, turnMm) => {
        const ends = parts.reduce((sum, part) => sum + part, 0);
        const total = parts.reduce((sum, part) => sum + areaLength({ ends: part, left: 'slit', right: 'slit' }, { stepMm, turnMm }, 1), 0);
        return near(total, (ends - parts.length) * stepMm + parts.length * turnMm, 1e-9);
      }),
      RUNS,
    );
  });

  test('true areas are the schoolbook’s', () => {
    expect(trueArea({ shape: 'rectangle', baseMm: 30, heightMm: 20 })).toBe(600);
    expect(trueArea({ shape: 'circle', radiusMm: 10 })).toBeCloseTo(100 * Math.PI, 9);
  });
});

/** All numbers of a plan, in order. */
const numbersIn = (value: unknown): number[] =>
  typeof value === 'number' ? [value] : typeof value === 'object' && value !== null ? Object.values(value).flatMap(numbersIn) : [];

describe('whole pieces', () => {
  test('typed in inches they have the same counts and, to twelve figures, the same lengths', () => {
    fc.assert(
      fc.property(pieces, (piece) => {
        fc.pre(isWoven(piece));
        const { warnings: _a, ...metric } = planOf(piece);
        const { warnings: _b, ...imperial } = planOf(typedInInches(piece));
        const inches = numbersIn(imperial);
        expect({ ...imperial.ends, raw: 0, spacingMm: 0, woundWidthMm: 0, loomWidthMm: 0 }).toEqual({ ...metric.ends, raw: 0, spacingMm: 0, woundWidthMm: 0, loomWidthMm: 0 });
        return numbersIn(metric).every((number, index) => near(inches[index] ?? Number.NaN, number, 1e-12));
      }),
      { ...RUNS, numRuns: cases(1000) },
    );
  }, 60_000);

  test('on a scale k everything long is k times as long, counts and shares stay, and yarn is k² as heavy for its length', () => {
    fc.assert(
      fc.property(pieces, between(1.05, 2), (piece, k) => {
        const roomy = (scale: number) => ({
          ...piece,
          size: { widthMm: piece.size.widthMm * scale, heightMm: piece.size.heightMm * scale },
          loom: { ...piece.loom, nailPitchMm: piece.loom.nailPitchMm * scale, nailDiameterMm: 1.6 * scale, insideHeightMm: piece.loom.insideHeightMm * scale },
          warp: { ...piece.warp, yarn: { tex: piece.warp.yarn.tex * scale ** 2 }, tieMm: 150 * scale },
          allowances: { ...piece.allowances, topMm: 70 * scale, bottomMm: 90 * scale, tailMm: 50 * scale, loadMm: 8000 * scale },
          yarns: Object.fromEntries(Object.entries(piece.yarns).map(([role, { tex }]) => [role, { tex: tex * scale ** 2 }])),
          bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 60 * scale }, { technique: 'tabby', yarn: 'ground', fill: true }],
        });
        const [one, scaled] = [planPiece(roomy(1) as FrameLoomPiece), planPiece(roomy(k) as FrameLoomPiece)];
        fc.pre(one.ok && scaled.ok);
        const [a, b] = [one.value, scaled.value];
        const yarns = Object.keys(a.yarns).every((role) => near(b.yarns[role]?.netMm ?? 0, k * (a.yarns[role]?.netMm ?? 0), 1e-9));
        return yarns && near(b.warp.netMm, k * a.warp.netMm, 1e-9) && near(b.massG, k ** 3 * a.massG, 1e-9) && near(b.weft.pickMm, k * a.weft.pickMm, 1e-9)
          && near(b.weft.crimp, a.weft.crimp, 1e-7) && b.ends.count === a.ends.count && near(b.loom.heightNeededMm, k * a.loom.heightNeededMm, 1e-9)
          && b.bands.every(({ picks }, index) => picks === a.bands[index]?.picks);
      }),
      { ...RUNS, numRuns: cases(1000) },
    );
  }, 60_000);

  test('every number is finite and none is below zero', () => {
    fc.assert(
      fc.property(pieces, (piece) => {
        fc.pre(isWoven(piece));
        return numbersIn(planOf(piece)).every((number) => Number.isFinite(number) && number >= 0);
      }),
      { ...RUNS, numRuns: cases(1000) },
    );
  }, 60_000);

  test('more margin, more height and more width never need less yarn', () => {
    fc.assert(
      fc.property(pieces, between(1, 1.5), (piece, more) => {
        fc.pre(isWoven(piece));
        const yarnOf = (changed: object): number => {
          const planned = planPiece({ ...piece, ...changed } as FrameLoomPiece);
          return planned.ok ? Object.values(planned.value.yarns).reduce((sum, { withMarginMm }) => sum + withMarginMm, planned.value.warp.withMarginMm) : Number.POSITIVE_INFINITY;
        };
        const before = yarnOf({});
        const margin = yarnOf({ allowances: { ...piece.allowances, marginWeft: Math.min(1, piece.allowances.marginWeft * more) } });
        const higher = yarnOf({
          size: { ...piece.size, heightMm: piece.size.heightMm * more },
          loom: { ...piece.loom, insideHeightMm: piece.loom.insideHeightMm * more },
        });
        const wider = yarnOf({ size: { ...piece.size, widthMm: piece.size.widthMm * more } });
        return margin >= before && higher >= before && wider >= before - 1e-6;
      }),
      { ...RUNS, numRuns: cases(1000) },
    );
  }, 60_000);
});
