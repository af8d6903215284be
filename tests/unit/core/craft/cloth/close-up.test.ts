import { describe, expect, it } from 'vitest';
import { closeUpOf } from '#core/craft/cloth/close-up.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { wovenPiece } from './pieces.ts';

describe('a piece seen from very near', () => {
  const near = closeUpOf(wovenPiece());

  it('keeps its bands in order, without edges and pile', () => {
    expect(near.bands.map((band) => band.technique)).toEqual(['tabby', 'tabby', 'soumak', 'roving', 'loop-pile', 'twining', 'tabby']);
  });

  it('shows the plies of its yarns', () => {
    const svg = drawCloth(near, { id: 'a', as: 'swatch', range: 'near', width: 900, height: 600, begin: 'foot' });
    expect(svg).toContain('<pattern id="a-ply');
    expect(svg.length).toBeLessThan(60 * 1024);
  });
});
