/** A piece made narrower or wider: shapes keep their share of the width, the dowel stands out as far as before. */
import type { Band, FrameLoomPiece, Shape } from '#core/craft/piece.ts';

export const isAboveZero = (x: unknown): x is number => typeof x === 'number' && Number.isFinite(x) && x > 0;

function widenMeasures(shape: Shape, scale: number): Shape {
  switch (shape.shape) {
    case 'circle':
      return { ...shape, radiusMm: shape.radiusMm * Math.min(1, scale) };
    case 'points':
      return { ...shape, points: shape.points.map(({ xMm, yMm }) => ({ xMm: xMm * scale, yMm })) };
    default:
      return { ...shape, baseMm: shape.baseMm * scale };
  }
}

/** Shapes keep their place and their share of the width; how high they stand stays, but a circle stays round. */
function widenShape(shape: Shape, scale: number): Shape {
  return {
    ...widenMeasures(shape, scale),
    ...(shape.centreMm === undefined ? {} : { centreMm: shape.centreMm * scale }),
    ...(shape.leanMm === undefined ? {} : { leanMm: shape.leanMm * scale }),
  };
}

function widenBand(band: Band, scale: number): Band {
  if (band.technique !== 'tabby' || band.shapes === undefined) return band;
  return { ...band, shapes: band.shapes.map((shape) => widenShape(shape, scale)) };
}

/** `piece` at another finished width. A width that is none goes in as it is; planning the piece tells so. */
export function widen(piece: FrameLoomPiece, widthMm: number): FrameLoomPiece {
  const before = piece.size.widthMm;
  const scale = isAboveZero(widthMm) && isAboveZero(before) ? widthMm / before : 1;
  const { dowel } = piece;
  const size = { ...piece.size, widthMm };
  if (scale === 1) return { ...piece, size };
  return {
    ...piece,
    size,
    ...(dowel?.lengthMm === undefined ? {} : { dowel: { ...dowel, lengthMm: dowel.lengthMm + (scale - 1) * before } }),
    bands: piece.bands.map((band) => widenBand(band, scale)),
  };
}
