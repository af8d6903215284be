/** A whole piece larger or smaller by one factor. Yarns and loom stay; rows are counted anew. */
import { withOwnHeight } from '#core/craft/fitting/leave-out.ts';
import { isAboveZero } from '#core/craft/fitting/widen.ts';
import type { Band, FrameLoomPiece, Shape } from '#core/craft/piece.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';

function scaleMeasures(shape: Shape, k: number): Shape {
  switch (shape.shape) {
    case 'circle':
      return { ...shape, radiusMm: shape.radiusMm * k };
    case 'points':
      return { ...shape, points: shape.points.map(({ xMm, yMm }) => ({ xMm: xMm * k, yMm: yMm * k })) };
    default:
      return { ...shape, baseMm: shape.baseMm * k, heightMm: shape.heightMm * k };
  }
}

function scaleShape(shape: Shape, k: number): Shape {
  return {
    ...scaleMeasures(shape, k),
    ...(shape.centreMm === undefined ? {} : { centreMm: shape.centreMm * k }),
    ...(shape.bottomMm === undefined ? {} : { bottomMm: shape.bottomMm * k }),
    ...(shape.leanMm === undefined ? {} : { leanMm: shape.leanMm * k }),
  };
}

const rowsOf = (rows: number, k: number): number => Math.max(1, roundHalfUp(rows * k));

function scaleBand(band: Band, k: number): Band {
  switch (band.technique) {
    case 'tabby': {
      const scaled = band.fill === true ? band : { ...band, heightMm: band.heightMm * k };
      return scaled.shapes === undefined ? scaled : { ...scaled, shapes: scaled.shapes.map((shape) => scaleShape(shape, k)) };
    }
    case 'soumak':
      return { ...band, rows: rowsOf(band.rows, k) };
    case 'rya':
      return { ...band, pileMm: band.pileMm * k, heightMm: band.heightMm * k, rows: rowsOf(band.rows, k) };
    case 'roving':
      return { ...band, bulgeMm: band.bulgeMm * k, heightMm: band.heightMm * k };
    case 'loop-pile': {
      // A rod is a tool she has; loops drawn by hand are as long as one likes.
      const rows = { rows: rowsOf(band.rows, k), heightMm: band.heightMm * k };
      return band.loopMm === undefined ? { ...band, ...rows } : { ...band, ...rows, loopMm: band.loopMm * k };
    }
    case 'hem-stitch':
    case 'twining':
      return band;
  }
}

/** Width, heights, shapes and pile of `piece` times `factor`; where no band fills, the height is what the bands come to. */
export function scalePiece(piece: FrameLoomPiece, factor: number): FrameLoomPiece {
  const { dowel, size, finish } = piece;
  // A width that is no number must be refused as it is, not made into one.
  if (!isAboveZero(size.widthMm)) return piece;
  return withOwnHeight({
    ...piece,
    size: { widthMm: size.widthMm * factor, heightMm: size.heightMm * factor },
    ...(dowel?.lengthMm === undefined ? {} : { dowel: { ...dowel, lengthMm: dowel.lengthMm + (factor - 1) * size.widthMm } }),
    ...(finish?.fringeMm === undefined ? {} : { finish: { ...finish, fringeMm: finish.fringeMm * factor } }),
    bands: piece.bands.map((band) => scaleBand(band, factor)),
  });
}
