/** A small hanging of one column: what a figure shows beside a piece of another craft. */
import type { MacramePiece } from '#core/craft/macrame/piece.ts';

export const EXAMPLE: MacramePiece = {
  craft: 'macrame',
  rod: { kind: 'rod', diameterMm: 16 },
  yarns: { main: { label: 'Cotton cord, 4 mm', colour: '#ddd3bb', diameterMm: 4 } },
  columns: [
    {
      name: 'body',
      yarn: 'main',
      cords: 6,
      sections: [
        { technique: 'half-hitches', name: 'head', rows: 1 },
        { technique: 'alternating', name: 'net', rows: 5, gapMm: 12 },
        { technique: 'square-knots', name: 'braids', knots: 8 },
        { technique: 'fringe', name: 'tips', heightMm: 120 },
      ],
    },
  ],
};
