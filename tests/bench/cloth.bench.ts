// How long a cloth takes to draw. The budget is 5 ms, warm, for the largest picture that stands in a page.
import { bench, describe } from 'vitest';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { wovenPiece } from '../unit/core/craft/cloth/pieces.ts';

const piece = wovenPiece();

describe('drawing a cloth', () => {
  bench('strip, 36 px', () => void drawCloth(piece, { id: 'a', as: 'strip', width: 36, height: 560, woven: 0.4 }));
  bench('card, 136 px', () => void drawCloth(piece, { id: 'a', as: 'hanging', width: 136 }));
  bench('loom, 400 px', () => void drawCloth(piece, { id: 'a', as: 'loom', width: 400, woven: 0.6 }));
  bench('page, 456 px', () => void drawCloth(piece, { id: 'a', as: 'hanging', width: 456 }));
  bench('large, 720 px', () => void drawCloth(piece, { id: 'a', as: 'hanging', width: 720 }));
  bench('near, 920 px', () => void drawCloth(piece, { id: 'a', as: 'swatch', width: 920, height: 640, range: 'near', pxPerMm: 4 }));
});
