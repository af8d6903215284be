import { describe, expect, it } from 'vitest';
import { shade } from '#core/craft/cloth/colour.ts';
import type { ClothShape, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { begins, linesOf, strokesIn } from './drawn.ts';
import { SLACK, WEDGES, wovenPiece } from './pieces.ts';

const SAND = '#cdbb94';
/** So that an end is 10 px wide: a picture of 66 ends, without what stands beside the cloth. */
const WIDTH = 660 / 0.94;
const HANGING: ClothView = { id: 'a', as: 'hanging', width: WIDTH };

type Join = NonNullable<ClothShape['join']>;

/** A box over ends 20 to 39, eight rows high. */
function box(join?: Join, turned = false): WovenPiece {
  const spans = Array.from({ length: 8 }, (_, row) => ({ row, from: 20, to: 40 }));
  return wovenPiece({ turned, bands: [{ ...WEDGES, picks: 8, heightMm: 40, shapes: [{ colour: SAND, yarn: 'Dry Sand', spans, ...(join !== undefined && { join }) }] }] });
}

const slits = (svg: string): string => strokesIn(svg, shade(SLACK, 0.72)).map(({ d }) => d).join('');
const stretches = (svg: string): string => strokesIn(svg, shade(SAND, 0.6)).map(({ d }) => d).join('');

describe('where two colours meet', () => {
  it('a slit is a fine gap at both sides, as high as the area', () => {
    const svg = drawCloth(box('slit'), HANGING);
    expect(begins(slits(svg))).toEqual([200, 400]);
    const [, top, bottom] = /M200 ([\d.]+)V([\d.]+)/.exec(slits(svg)) ?? [];
    expect(Number(bottom) - Number(top)).toBeCloseTo(66, 0);
    expect(drawCloth(box(), HANGING)).toBe(svg);
  });

  it('dovetailed colours have no gap, and take the end they share in turns, there and back', () => {
    const svg = drawCloth(box('dovetail'), HANGING);
    expect(slits(svg)).toBe('');
    const lines = [...stretches(svg).matchAll(/M([\d.]+) [\d.]+H([\d.]+)/g)].map(([, x0, x1]) => `${String(x0)}-${String(x1)}`);
    expect(lines).toHaveLength(8);
    expect(new Set(lines)).toEqual(new Set(['210-410', '200-400']));
    expect(lines.map((line, row) => line === lines[row - 1]).filter(Boolean)).toHaveLength(4);
  });

  it('interlocked wefts reach over the gap, each in every second row', () => {
    const svg = drawCloth(box('interlock'), HANGING);
    expect(slits(svg)).toBe('');
    const pitch = 66 / 8;
    for (const colour of [SAND, SLACK]) {
      const hooks = strokesIn(svg, colour).filter(({ d, dash }) => /^M200 [\d.]+V/.test(d) && dash.length > 0);
      expect(hooks).toHaveLength(1);
      expect(hooks.flatMap(({ d }) => begins(d))).toEqual([200, 400]);
      expect(hooks[0]?.dash.reduce((sum, part) => sum + part, 0)).toBeCloseTo(2 * pitch, 0);
    }
  });

  it('hooks into the colour that really lies beside it, be it ground or another area', () => {
    const over = Array.from({ length: 8 }, (_, row) => ({ row, from: 30, to: 50 }));
    const [band] = box('slit').bands;
    if (band?.technique !== 'tabby') throw new Error('no tabby');
    const svg = drawCloth(wovenPiece({ bands: [{ ...band, shapes: [...band.shapes, { colour: '#7d854f', yarn: 'Samphire', spans: over, join: 'interlock' }] }] }), HANGING);
    const hooked = (colour: string): number[] => strokesIn(svg, colour).filter(({ d, dash }) => d.includes('V') && dash.length > 0).flatMap(({ d }) => begins(d));
    expect(hooked(SAND)).toEqual([300]);
    expect(hooked(SLACK)).toEqual([500]);
  });

  it('lies at the other hand in a turned piece', () => {
    expect(begins(slits(drawCloth(box('slit', true), HANGING))).sort((a, b) => a - b)).toEqual([260, 460]);
  });

  it('has no seam at a selvedge, nor where the gap is open for one row only', () => {
    const steps = Array.from({ length: 8 }, (_, row) => ({ row, from: 0, to: 20 + 2 * row }));
    const piece = wovenPiece({ bands: [{ ...WEDGES, picks: 8, heightMm: 40, shapes: [{ colour: SAND, yarn: 'Dry Sand', spans: steps }] }] });
    expect(slits(drawCloth(piece, HANGING))).toBe('');
    expect(linesOf(stretches(drawCloth(piece, HANGING)))).toBe(8);
  });

  it.each<ClothView>([
    { id: 'a', as: 'strip', width: 36, height: 400 },
    { id: 'a', as: 'swatch', width: 120, height: 90 },
    { id: 'a', as: 'hanging', width: 120 },
  ])('is plain in a small picture ($as, $width px)', (view) => {
    expect(drawCloth(box('dovetail'), view)).toBe(drawCloth(box('slit'), view));
    expect(drawCloth(box('interlock'), view)).toBe(drawCloth(box('slit'), view));
  });

  it('is seen near', () => {
    const near: ClothView = { id: 'a', as: 'swatch', width: 1320, height: 264, range: 'near' };
    expect(new Set((['slit', 'dovetail', 'interlock'] as const).map((join) => drawCloth(box(join), near))).size).toBe(3);
  });
});
