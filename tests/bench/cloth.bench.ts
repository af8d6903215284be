// How long a cloth takes to draw, and how large the drawing is. The budget is for the largest picture that stands in a page.
import { bench, describe } from 'vitest';
import { clothPieceOf } from '#core/craft/cloth/cloth-piece-of.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import workedPiece from '../reference/worked-piece.json' with { type: 'json' };
import { planOf } from '../reference/worked-piece.ts';
import { wovenPiece } from '../unit/core/craft/cloth/pieces.ts';

const VIEWS: readonly (readonly [string, ClothView])[] = [
  ['strip, 36 px', { id: 'a', as: 'strip', width: 36, height: 560, woven: 0.4 }],
  ['card, 136 px', { id: 'a', as: 'hanging', width: 136 }],
  ['loom, 400 px', { id: 'a', as: 'loom', width: 400, woven: 0.6 }],
  ['page, 456 px', { id: 'a', as: 'hanging', width: 456 }],
  ['large, 720 px', { id: 'a', as: 'hanging', width: 720 }],
  ['near, 920 px', { id: 'a', as: 'swatch', width: 920, height: 640, range: 'near', pxPerMm: 4 }],
];
const MOST_BYTES = 60_000;

const pieces = {
  'the worked piece': clothPieceOf(workedPiece as FrameLoomPiece, planOf(workedPiece), 'Worked piece'),
  'a piece of every technique': wovenPiece(),
};

describe.each(Object.entries(pieces))('drawing %s', (_, piece) => {
  for (const [name, view] of VIEWS) {
    const { length } = drawCloth(piece, view);
    if (length >= MOST_BYTES) throw new Error(`${name} is ${String(length)} bytes large; under ${String(MOST_BYTES)} may stand in a page`);
    bench(`${name} and ${(length / 1000).toFixed(1)} kB, under 5 ms`, () => void drawCloth(piece, view));
  }
});
