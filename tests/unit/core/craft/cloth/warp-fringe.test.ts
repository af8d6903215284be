import { describe, expect, it } from 'vitest';
import { light } from '#core/craft/cloth/colour.ts';
import type { WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { begins, linesOf, strokesIn } from './drawn.ts';
import { RYA, WEDGES, wovenPiece } from './pieces.ts';

const VIEW: ClothView = { id: 'a', as: 'hanging', width: 660 / 0.94 };
const WARP = '#d8d2c1';
const PX_PER_MM = 660 / 400;
const SKY = { ...WEDGES, shapes: [] };

type Finish = NonNullable<WovenPiece['finish']>;

const drawn = (finish: Finish | undefined, more: Partial<WovenPiece> = {}): string =>
  drawCloth(wovenPiece({ bands: [SKY], ...(finish !== undefined && { finish }), ...more }), VIEW);
const height = (svg: string): number => Number(/viewBox="0 0 [\d.]+ ([\d.]+)"/.exec(svg)?.[1]);

/** Knots are short lines in the warp's lightest colour. */
const knots = (svg: string): number[] => strokesIn(svg, light(WARP, 0.15)).flatMap(({ d }) => begins(d));
/** Slanted plies show the warp's own colour. */
const plies = (svg: string): number => strokesIn(svg, light(WARP, 0.5)).reduce((sum, { d }) => sum + linesOf(d), 0);

describe('the ends of the warp below a finished cloth', () => {
  const tucked = drawn({ bottom: 'tucked', fringeMm: 0, bundleEnds: 4 });

  it('are knotted in as many ends as were chosen, the last bundle with what is left', () => {
    expect(knots(drawn({ bottom: 'knotted', fringeMm: 60, bundleEnds: 6 }))).toHaveLength(11);
    expect(knots(drawn({ bottom: 'knotted', fringeMm: 60, bundleEnds: 8 }))).toHaveLength(9);
    expect(knots(drawn(undefined))).toHaveLength(17);
  });

  it('count single ends in a bundle, where two are worked as one', () => {
    expect(knots(drawn({ bottom: 'knotted', fringeMm: 60, bundleEnds: 8 }, { endsTogether: 2 }))).toHaveLength(17);
  });

  it('hang as far as the fringe is long', () => {
    const short = drawn({ bottom: 'knotted', fringeMm: 40, bundleEnds: 4 });
    const long = drawn({ bottom: 'knotted', fringeMm: 100, bundleEnds: 4 });
    expect(height(long) - height(short)).toBeCloseTo(60 * PX_PER_MM, 0);
    const twisted = drawn({ bottom: 'twisted', fringeMm: 90, bundleEnds: 8 });
    expect(height(twisted) - height(tucked)).toBeCloseTo(90 * PX_PER_MM, 0);
  });

  it('are twisted into cords of two plies, knotted at the tips', () => {
    const svg = drawn({ bottom: 'twisted', fringeMm: 90, bundleEnds: 8 });
    expect(knots(svg)).toHaveLength(9);
    expect(plies(svg)).toBeGreaterThan(9 * 5);
    expect(plies(drawn({ bottom: 'knotted', fringeMm: 90, bundleEnds: 8 }))).toBe(0);
  });

  it('are not seen when they are tucked in, or cut at the edge', () => {
    expect(knots(tucked)).toEqual([]);
    expect(height(drawn({ bottom: 'plain', fringeMm: 0, bundleEnds: 4 }))).toBe(height(tucked));
    expect(height(drawn(undefined))).toBeGreaterThan(height(tucked));
  });

  it('hang loose, each by itself, where they are left as they are', () => {
    const svg = drawn({ bottom: 'plain', fringeMm: 30, bundleEnds: 4 });
    expect(knots(svg)).toEqual([]);
    expect(height(svg) - height(tucked)).toBeCloseTo(30 * PX_PER_MM, 0);
    expect(strokesIn(svg, WARP).some(({ d }) => linesOf(d) === 66)).toBe(true);
  });

  it('are seen under short pile only where somebody has said what becomes of them', () => {
    const bands = [{ ...RYA, pileMm: 30 }, SKY];
    expect(knots(drawn(undefined, { bands }))).toEqual([]);
    expect(knots(drawn({ bottom: 'knotted', fringeMm: 80, bundleEnds: 6 }, { bands }))).toHaveLength(11);
  });
});

describe('what holds a cloth to its dowel', () => {
  it('is nothing when its loops are slipped on, a knot at every second loop when tied, and yarn of the edge when lashed', () => {
    const finish: Finish = { bottom: 'tucked', fringeMm: 0, bundleEnds: 4 };
    const slipped = drawn(finish, { fixing: 'slipped' });
    expect(slipped).toBe(drawn(finish));
    expect(strokesIn(drawn(finish, { fixing: 'tied' }), light(WARP, 0.15)).map(({ dash: [, off = 0] }) => Math.round(off))).toEqual([20]);
    const wraps = (svg: string): number => strokesIn(svg, light(SKY.colour, 0.1)).reduce((sum, { d }) => sum + linesOf(d), 0);
    /* 400 mm, a wrap every 15 mm and one at each selvedge. */
    expect(wraps(drawn(finish, { fixing: 'lashed' }))).toBe(28);
    expect(wraps(slipped)).toBe(0);
  });
});
