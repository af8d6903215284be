/** The pattern with a student's own loom, width and yarns put in. Nothing is reckoned yet. */
import { coarsen } from '#core/craft/fitting/coarsen.ts';
import { leaveOut } from '#core/craft/fitting/leave-out.ts';
import type { MyPiece } from '#core/craft/fitting/my-piece.ts';
import { layoutOf } from '#core/craft/frame-loom/room.ts';
import { holderStep, loomKind } from '#core/craft/looms/looms.ts';
import { scalePiece } from '#core/craft/fitting/scale-piece.ts';
import type { FitWay } from '#core/craft/fitting/way.ts';
import { isAboveZero, widen } from '#core/craft/fitting/widen.ts';
import { present } from '#core/craft/reading/present.ts';
import type { Loom, FrameLoomPiece, Warp, Yarn } from '#core/craft/piece.ts';

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

/** Leaving out bands alone needs no other ends. */
const keepsEnds = (way: FitWay | undefined): boolean => way === undefined || (way.kind === 'fewer-bands' && way.widthMm === undefined);

/** The pattern pins its ends for its own loom; on another one they are reckoned anew. */
function changeWarp({ endCount, ...warp }: Warp, mine: MyPiece): Warp {
  const own = { ...warp, ...present({ yarn: mine.warpYarn && inColourOf(warp.yarn, mine.warpYarn), endsTogether: mine.endsTogether }) };
  const { kind, nailRows, nailPitchMm, warping } = mine.loom ?? {};
  const asPinned = [mine.widthMm, mine.endsTogether, kind, nailRows, nailPitchMm, warping].every((own) => own === undefined);
  return endCount !== undefined && asPinned && keepsEnds(mine.way) ? { ...own, endCount } : own;
}

/** Her yarn takes the pattern's colour where she has not said her own, so that the picture stays readable. */
const inColourOf = ({ colour }: Yarn, own: Yarn): Yarn => (colour === undefined ? own : { colour, ...own });

function changeYarns(pattern: FrameLoomPiece['yarns'], mine: NonNullable<MyPiece['yarns']>): FrameLoomPiece['yarns'] {
  const entries = Object.entries(pattern).map(([role, patternYarn]): [string, Yarn] => {
    const own = Object.hasOwn(mine, role) ? mine[role] : undefined;
    return [role, own === undefined ? patternYarn : inColourOf(patternYarn, own)];
  });
  return Object.fromEntries(entries);
}

function fitInWay(piece: FrameLoomPiece, way: FitWay): FrameLoomPiece {
  switch (way.kind) {
    case 'narrower':
      return widen(piece, way.widthMm);
    case 'fewer-bands':
      return leaveOut(way.widthMm === undefined ? piece : widen(piece, way.widthMm), way.leaveOut, way.heightMm);
    case 'coarser':
      return coarsen(piece, way);
    case 'scaled':
      return scalePiece(piece, way.factor);
  }
}

/**
 * `pattern` must have been read. Whatever a student typed goes in as it is, her way of fitting it last; planning the
 * piece tells what is wrong with it.
 */
export function changePiece(pattern: FrameLoomPiece, mine: MyPiece): FrameLoomPiece {
  const changed: FrameLoomPiece = {
    ...pattern,
    loom: changeLoom(pattern.loom, mine.loom),
    warp: changeWarp(pattern.warp, mine),
    yarns: changeYarns(pattern.yarns, mine.yarns ?? {}),
  };
  const wide = mine.widthMm === undefined ? changed : widen(changed, mine.widthMm);
  return mine.way === undefined ? wide : fitInWay(wide, mine.way);
}
