/** How high bands come out by themselves, before they must come to the height of a piece. */
import { dressWarp } from '#core/craft/frame-loom/dress-loom.ts';
import { layOn, settingsFrom } from '#core/craft/frame-loom/plan-frame-loom.ts';
import { readPieceParts } from '#core/craft/frame-loom/read-piece.ts';
import { collectRoles, isReady } from '#core/craft/frame-loom/stack-bands.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { techniqueOf } from '#core/craft/techniques/registry.ts';

export type OwnHeight = number | 'fill';

/** Finished heights in mm in the order of the bands; undefined where a yarn jams or something else is not sound. */
export function ownHeights(piece: FrameLoomPiece): readonly OwnHeight[] | undefined {
  const findings = Findings.in('cm');
  const parts = readPieceParts(Fields.of(piece, '', 'A piece', findings));
  const settings = settingsFrom(parts);
  const { size, loom, warp } = parts;
  if (findings.count > 0 || size === undefined || loom === undefined || warp === undefined || settings === undefined) return undefined;
  const used = collectRoles(parts.bands, new Set(parts.yarns.keys()), findings);
  const dressed = dressWarp(size, loom, warp, settings, findings);
  const laid = dressed && layOn(dressed, parts, settings, used, findings);
  if (laid === undefined) return undefined;
  const heights = parts.bands.map((band) => (band === undefined || !isReady(band, laid) ? undefined : techniqueOf(band).height(band, laid)));
  return heights.every((height): height is OwnHeight => height !== undefined) ? heights : undefined;
}
