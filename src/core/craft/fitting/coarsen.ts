/** Ends further apart on the same loom, and what weft keeps the cloth as tight. */
import { ASHENHURST_K, TIGHTNESS } from '#core/craft/defaults.ts';
import { layoutOf } from '#core/craft/frame-loom/room.ts';
import { rolesOf } from '#core/craft/frame-loom/stack-bands.ts';
import type { FitWay } from '#core/craft/fitting/way.ts';
import { workingSpacing } from '#core/craft/nails.ts';
import type { FrameLoomPiece, Yarn } from '#core/craft/piece.ts';
import { strandsFor, tightness } from '#core/craft/sett.ts';
import { diameterTogether } from '#core/craft/yarn/diameter.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';

type Coarser = Extract<FitWay, { kind: 'coarser' }>;

const MOST_STRANDS = 100;

export const spacingOf = (piece: FrameLoomPiece): number => workingSpacing(layoutOf(piece.loom), piece.warp.endsTogether ?? 1);
const warpDiameterOf = ({ warp }: FrameLoomPiece): number => diameterTogether(threadOf(warp.yarn, ASHENHURST_K.warp).compressedMm, warp.endsTogether ?? 1);
const strandMm = (yarn: Yarn): number => threadOf({ ...yarn, strands: 1 }, ASHENHURST_K.weft).compressedMm;

/** Roles whose picks must close between the ends. */
function pickRoles(piece: FrameLoomPiece): readonly string[] {
  const roles = piece.bands.flatMap((band) => rolesOf(band).filter(({ picks }) => picks !== undefined).map(({ role }) => role));
  return [...new Set(roles)].filter((role) => Object.hasOwn(piece.yarns, role));
}

/**
 * Strands of each weft that make `piece` as tight between its ends as `pattern` is between its own; only those that
 * differ from what they are. Both pieces must be sound in their yarns.
 */
export function strandsAsTight(pattern: FrameLoomPiece, piece: FrameLoomPiece): Readonly<Record<string, number>> {
  const [wasWarp, isWarp] = [warpDiameterOf(pattern), warpDiameterOf(piece)];
  const [was, is] = [spacingOf(pattern), spacingOf(piece)];
  const entries = pickRoles(piece).flatMap((role): (readonly [string, number])[] => {
    const [patternYarn, yarn] = [pattern.yarns[role], piece.yarns[role]];
    if (patternYarn === undefined || yarn === undefined) return [];
    const wished = tightness(wasWarp, threadOf(patternYarn, ASHENHURST_K.weft).compressedMm, was);
    const strands = strandsFor(is, isWarp, strandMm(yarn), Math.min(TIGHTNESS.jam, Math.max(TIGHTNESS.loose, wished)));
    return strands === undefined || strands > MOST_STRANDS || strands === (yarn.strands ?? 1) ? [] : [[role, strands]];
  });
  return Object.fromEntries(entries);
}

/** `piece` with its ends as far apart as the way says, and so many strands of each yarn. Roles it does not know do nothing. */
export function coarsen(piece: FrameLoomPiece, { everyNthNail, endsTogether, strands }: Coarser): FrameLoomPiece {
  const yarns = Object.entries(piece.yarns).map(([role, yarn]): [string, Yarn] => {
    const together = Object.hasOwn(strands, role) ? strands[role] : undefined;
    return [role, together === undefined ? yarn : { ...yarn, strands: together }];
  });
  return {
    ...piece,
    loom: { ...piece.loom, ...(everyNthNail === undefined ? {} : { everyNthNail }) },
    warp: { ...piece.warp, ...(endsTogether === undefined ? {} : { endsTogether }) },
    yarns: Object.fromEntries(yarns),
  };
}
