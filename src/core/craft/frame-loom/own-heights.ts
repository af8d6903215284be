/** How high bands come out by themselves, before they must come to the height of a piece, and how they grow row by row. */
import { dressWarp } from '#core/craft/frame-loom/dress-loom.ts';
import { layOn, settingsFrom } from '#core/craft/frame-loom/plan-frame-loom.ts';
import { readPieceParts } from '#core/craft/frame-loom/read-piece.ts';
import { collectRoles, isReady } from '#core/craft/frame-loom/stack-bands.ts';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { techniqueOf } from '#core/craft/techniques/registry.ts';
import { pickIn } from '#core/craft/techniques/tabby.ts';
import { picksOn, type DressedLoom } from '#core/craft/techniques/technique.ts';

export type OwnHeight = number | 'fill';

/** What `of` says of every band; undefined where a yarn jams or something else is not sound. */
function ofEach<T>(piece: FrameLoomPiece, of: (band: Band, loom: DressedLoom) => T): readonly T[] | undefined {
  const findings = Findings.in('cm');
  const parts = readPieceParts(Fields.of(piece, '', 'A piece', findings));
  const settings = settingsFrom(parts);
  const { size, loom, warp } = parts;
  if (findings.count > 0 || size === undefined || loom === undefined || warp === undefined || settings === undefined) return undefined;
  const used = collectRoles(parts.bands, new Set(parts.yarns.keys()), findings);
  const dressed = dressWarp(size, loom, warp, settings, findings);
  const laid = dressed && layOn(dressed, parts, settings, used, findings);
  if (laid === undefined) return undefined;
  const bands = parts.bands.filter((band): band is Band => band !== undefined && isReady(band, laid));
  return bands.length === parts.bands.length ? bands.map((band) => of(band, laid)) : undefined;
}

/** Finished heights in mm in the order of the bands. */
export function ownHeights(piece: FrameLoomPiece): readonly OwnHeight[] | undefined {
  return ofEach(piece, (band, loom) => techniqueOf(band).height(band, loom));
}

/** Finished height in mm of one row more of each band; 0 where a band has no rows that make it higher. */
export function rowHeights(piece: FrameLoomPiece): readonly number[] | undefined {
  return ofEach(piece, rowHeight);
}

function rowHeight(band: Band, loom: DressedLoom): number {
  switch (band.technique) {
    case 'tabby':
      return picksOn(loom, pickIn(band, band.yarn)).pickSpacingMm;
    case 'soumak':
    case 'twining':
      return Number(techniqueOf(band).height({ ...band, rows: band.rows + 1 }, loom)) - Number(techniqueOf(band).height(band, loom));
    default:
      return 0;
  }
}
