/** The pattern with a student's own loom, width and yarns put in. Nothing is reckoned yet. */
import type { MyPiece } from '#core/craft/fitting/my-piece.ts';
import { layoutOf } from '#core/craft/frame-loom/room.ts';
import { holderStep, loomKind } from '#core/craft/looms/looms.ts';
import type { Band, Loom, Piece, Shape, Warp, Yarn } from '#core/craft/piece.ts';

const isAboveZero = (x: number | undefined): x is number => x !== undefined && Number.isFinite(x) && x > 0;

/**
 * Which nails of her own loom come closest to the pattern's spacing: a loom with nails
 * twice as close is warped on every second one.
 */
export function nthNailFor(patternPitchMm: number, ownPitchMm: number): number {
  return isAboveZero(ownPitchMm) ? Math.min(50, Math.max(1, Math.round(patternPitchMm / ownPitchMm))) : 1;
}

/** Her own kind of loom may take the pattern's way of winding or not, and has its own rows of nails. */
function changeKind(pattern: Loom, mine: NonNullable<MyPiece['loom']>): Loom {
  const own = { ...pattern, ...mine };
  const { warpings, rows } = loomKind(own);
  const warping = mine.warping ?? (warpings.includes(own.warping) ? own.warping : warpings[0]);
  const { nailRows, ...loom } = own;
  return { ...loom, warping, ...(nailRows === undefined || rows === 1 ? {} : { nailRows }) };
}

function changeLoom(pattern: Loom, mine: MyPiece['loom']): Loom {
  if (mine === undefined) return pattern;
  const own = changeKind(pattern, mine);
  if (mine.nailPitchMm === undefined && mine.kind === undefined && mine.nailRows === undefined) return own;
  const nth = nthNailFor(layoutOf(pattern).pitchMm, holderStep(own));
  const { everyNthNail: _, ...allNails } = own;
  return nth === 1 ? allNails : { ...allNails, everyNthNail: nth };
}

/** The pattern pins its ends for its own loom; on another one they are reckoned anew. */
function changeWarp({ endCount, ...warp }: Warp, mine: MyPiece): Warp {
  const own = { ...warp, ...(mine.endsTogether === undefined ? {} : { endsTogether: mine.endsTogether }) };
  const { kind, nailRows, nailPitchMm, warping } = mine.loom ?? {};
  const asPinned = [mine.widthMm, mine.endsTogether, kind, nailRows, nailPitchMm, warping].every((own) => own === undefined);
  return endCount !== undefined && asPinned ? { ...own, endCount } : own;
}

function narrowMeasures(shape: Shape, scale: number): Shape {
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
function narrowShape(shape: Shape, scale: number): Shape {
  return {
    ...narrowMeasures(shape, scale),
    ...(shape.centreMm === undefined ? {} : { centreMm: shape.centreMm * scale }),
    ...(shape.leanMm === undefined ? {} : { leanMm: shape.leanMm * scale }),
  };
}

function narrowBand(band: Band, scale: number): Band {
  if (band.technique !== 'tabby' || band.shapes === undefined) return band;
  return { ...band, shapes: band.shapes.map((shape) => narrowShape(shape, scale)) };
}

/** Her yarn takes the pattern's colour where she has not said her own, so that the picture stays readable. */
function changeYarns(pattern: Piece['yarns'], mine: NonNullable<MyPiece['yarns']>): Piece['yarns'] {
  const entries = Object.entries(pattern).map(([role, patternYarn]): [string, Yarn] => {
    const own = Object.hasOwn(mine, role) ? mine[role] : undefined;
    if (own === undefined) return [role, patternYarn];
    return [role, patternYarn.colour === undefined ? own : { colour: patternYarn.colour, ...own }];
  });
  return Object.fromEntries(entries);
}

/** Roles she has a yarn for that the pattern does not know. */
export function unknownRoles(pattern: Piece, mine: MyPiece): readonly string[] {
  return Object.keys(mine.yarns ?? {}).filter((role) => !Object.hasOwn(pattern.yarns, role));
}

/** Whatever a student typed goes in as it is; planning the piece tells what is wrong with it. */
export function changePiece(pattern: Piece, mine: MyPiece): Piece {
  const widthMm = mine.widthMm ?? pattern.size.widthMm;
  const scale = isAboveZero(mine.widthMm) ? mine.widthMm / pattern.size.widthMm : 1;
  const { dowel } = pattern;
  const lengthMm = dowel?.lengthMm === undefined ? undefined : dowel.lengthMm + (scale - 1) * pattern.size.widthMm;
  return {
    ...pattern,
    size: { ...pattern.size, widthMm },
    loom: changeLoom(pattern.loom, mine.loom),
    warp: changeWarp(pattern.warp, mine),
    ...(dowel === undefined ? {} : { dowel: lengthMm === undefined ? dowel : { ...dowel, lengthMm } }),
    yarns: changeYarns(pattern.yarns, mine.yarns ?? {}),
    bands: scale === 1 ? pattern.bands : pattern.bands.map((band) => narrowBand(band, scale)),
  };
}
