import { describe, expect, it } from 'vitest';
import type { ClothBand } from '#core/craft/cloth/cloth-piece.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { light, shade } from '#core/craft/cloth/colour.ts';
import { loopsPerRow } from '#core/craft/techniques/loop-pile.ts';
import { begins, linesOf, strokesIn } from './drawn.ts';
import { RYA, wovenPiece } from './pieces.ts';

/** An end is 10 px wide. */
const VIEW: ClothView = { id: 'a', as: 'swatch', width: 660, height: 120 };
const draw = (band: ClothBand, turned = false): string => drawCloth(wovenPiece({ bands: [band] }), { ...VIEW, begin: turned ? 'head' : 'foot' });

const RUST = '#a0664a';
const LOOPS: ClothBand = { technique: 'loop-pile', name: undefined, heightMm: 72, colour: RUST, yarn: 'Rust', rows: 2, loopMm: 12, groundColour: '#93a8a6' };

describe('loops', () => {
  const rows = strokesIn(draw(LOOPS), light(RUST, 0.3)).filter(({ dash }) => dash.length === 0);

  it('are as many in a row as the yarn is counted for: on every second end, none at the selvedges', () => {
    expect(rows.map(({ d }) => linesOf(d))).toEqual([loopsPerRow(66), loopsPerRow(66)]);
    for (const { d } of rows) {
      const xs = begins(d);
      expect(xs.slice(1).every((x, index) => Math.abs(x - (xs[index] ?? 0) - 20) < 0.2)).toBe(true);
      expect(Math.min(...xs)).toBeGreaterThan(5);
    }
  });

  it('reach to the edges of a picture whose ends each stand for several', () => {
    const strip = drawCloth(wovenPiece({ bands: [LOOPS] }), { id: 'a', as: 'strip', width: 36, height: 60 });
    const [first] = strokesIn(strip, light(RUST, 0.3)).filter(({ dash }) => dash.length === 0).map(({ d }) => linesOf(d));
    expect(first).toBe(3);
  });

  it('of the next row stand beside those below them', () => {
    const [upper, lower] = rows.map(({ d }) => begins(d)[0] ?? 0);
    expect(Math.abs((upper ?? 0) - (lower ?? 0))).toBeCloseTo(10, 0);
  });
});

describe('rya knots', () => {
  /** Knots are short level lines. */
  const knots = (edgeEnds: number, knotEnds: number, turned = false): number[] =>
    strokesIn(draw({ ...RYA, rows: 1, edgeEnds, knotEnds }, turned), RYA.colour).filter(({ d }) => d.includes(' 0h')).flatMap(({ d }) => begins(d));

  it('leave the ends at both edges plain that the plan leaves plain', () => {
    expect(knots(0, 2)).toHaveLength(33);
    const xs = knots(4, 2);
    expect(xs).toHaveLength(29);
    expect(Math.min(...xs)).toBeGreaterThan(40);
    expect(Math.max(...xs)).toBeLessThan(620);
  });

  it('leave what is left over at the right, and at the left of a turned piece', () => {
    expect(knots(0, 4)).toHaveLength(16);
    expect(Math.max(...knots(0, 4))).toBeLessThan(640 - 20);
    expect(Math.min(...knots(0, 4, true))).toBeGreaterThan(20);
  });
});

describe('hem-stitch', () => {
  const lines = (bundleEnds: number): string[] => {
    const bands: ClothBand[] = [
      { technique: 'hem-stitch', name: undefined, heightMm: 0, colour: RUST, yarn: 'Rust', bundleEnds, reachMm: 4 },
      { technique: 'tabby', name: undefined, heightMm: 80, colour: '#93a8a6', yarn: 'Slack Water', picks: 20, cover: 0.7, shapes: [] },
    ];
    return strokesIn(drawCloth(wovenPiece({ bands }), VIEW), shade(RUST, 0.04)).flatMap(({ d }) => d.match(/M[^M]+/g) ?? []);
  };

  it('goes round each bundle of the plan, sewn from the right, the smaller one last', () => {
    const round = (bundleEnds: number): number[] => lines(bundleEnds).filter((line) => line.includes('H')).flatMap(begins);
    expect(round(6)).toHaveLength(11);
    const eights = round(8);
    expect(eights).toHaveLength(9);
    expect(eights[0]).toBeGreaterThan(580);
    expect((eights[7] ?? 0) - (eights[8] ?? 0)).toBeCloseTo(20, 0);
  });
});
