import { describe, expect, it } from 'vitest';
import { NEUTRAL } from '#core/craft/cloth/colour.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { swatchOfBand, swatchOfYarn } from '#core/craft/cloth/swatch-of.ts';
import { ALL_TECHNIQUES, FOAM, wovenPiece } from './pieces.ts';

describe('a patch of one band', () => {
  it.each(ALL_TECHNIQUES.map((band, index) => [band.technique, index] as const))('of %s is drawn in its colour', (_, index) => {
    const patch = swatchOfBand(wovenPiece(), index);
    expect(patch.bands[0]?.colour).toBe(ALL_TECHNIQUES[index]?.colour);
    const svg = drawCloth(patch, { id: 'a', as: 'swatch', width: 80, height: 80 });
    expect(svg).not.toMatch(/NaN|Infinity/);
    expect(svg.length).toBeLessThan(30_000);
  });

  it('keeps a shape where it lies across the cloth', () => {
    const [band] = swatchOfBand(wovenPiece(), 3).bands;
    if (band?.technique !== 'tabby') throw new Error('the dunes are tabby');
    expect(band.shapes[0]?.spans[0]).toEqual({ row: 0, from: 0, to: (40 * 10) / 66 });
  });

  it('shows hem-stitch on the edge of what lies beside it', () => {
    expect(swatchOfBand(wovenPiece(), 0).bands.map(({ technique, colour }) => [technique, colour])[1]).toEqual(['tabby', FOAM]);
    const last = wovenPiece({ bands: [...ALL_TECHNIQUES].reverse() });
    expect(swatchOfBand(last, 8).bands[1]?.colour).toBe(FOAM);
    const alone = wovenPiece({ bands: ALL_TECHNIQUES.slice(0, 1) });
    expect(swatchOfBand(alone, 0).bands[1]?.colour).toBe(ALL_TECHNIQUES[0]?.colour);
  });

  it('is bare warp where there is no such band', () => {
    expect(swatchOfBand(wovenPiece(), 99).bands).toEqual([]);
  });

  it('of work that is not yet cloth shows a few spaced picks', () => {
    const heading = wovenPiece({ bands: [{ technique: 'heading', name: undefined, heightMm: 60, colour: '#b0ab9d', yarn: 'warp' }] });
    expect(drawCloth(swatchOfBand(heading, 0), { id: 'a', as: 'swatch', width: 80, height: 80 })).toContain('#b0ab9d');
  });
});

describe('a patch of one yarn', () => {
  it('is in its colour, or undyed where that is none', () => {
    expect(swatchOfYarn('#2f5366', '#d8d2c1', 7).bands[0]?.colour).toBe('#2f5366');
    for (const none of ['red', undefined, 7]) expect(swatchOfYarn(none, '#d8d2c1', 7).bands[0]?.colour).toBe(NEUTRAL);
  });
});

describe('doubled ends', () => {
  const near = (endsTogether: 1 | 2): string => drawCloth(wovenPiece({ endsTogether, ends: 20 }), { id: 'a', as: 'swatch', width: 400, height: 300, range: 'near' });

  it('are drawn as two where they are wide enough to be seen', () => {
    expect(near(2)).not.toBe(near(1));
    const far = (endsTogether: 1 | 2): string => drawCloth(wovenPiece({ endsTogether, ends: 200 }), { id: 'a', as: 'strip', width: 36, height: 300 });
    expect(far(2)).toBe(far(1));
  });
});
