/**
 * The plan of a frame-loom piece, step by step in the order in which one number needs
 * the other: dress the loom, lay the weft, stack the bands, then add everything up.
 * Each step runs as far as what it needs is sound, so that a person hears of everything
 * that is wrong at once.
 */
import { addUp, type PieceOnLoom } from '#core/craft/frame-loom/add-up.ts';
import { dressWarp, fitHeight, type DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import { layWeft, threadsOf } from '#core/craft/frame-loom/lay-weft.ts';
import { readPieceParts, type PieceParts } from '#core/craft/frame-loom/read-piece.ts';
import { settingsOf, type Settings } from '#core/craft/frame-loom/settings.ts';
import { collectRoles, stackBands, type UsedRoles } from '#core/craft/frame-loom/stack-bands.ts';
import { finishRoom, type Edges } from '#core/craft/frame-loom/room.ts';
import type { Warp } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { below, type Findings } from '#core/craft/reading/findings.ts';
import { techniqueOf } from '#core/craft/techniques/registry.ts';
import { pickKey, type DressedLoom, type PickOf } from '#core/craft/techniques/technique.ts';

function warnOfUnused(parts: PieceParts, { named }: UsedRoles, findings: Findings): void {
  for (const role of parts.yarns.keys()) {
    if (!named.has(role)) findings.warn('W_UNUSED', below('/yarns', role), `No band is woven with “${role}”.`);
  }
}

/** Bands without a single pick still need the plan's weft numbers: those of their first yarn. */
function picksToLay({ inPicks, named }: UsedRoles): ReadonlyMap<string, PickOf> {
  return inPicks.size > 0 ? inPicks : new Map([...named].slice(0, 1).map((role) => [pickKey({ role }), { role }]));
}

export function layOn(warp: DressedWarp, parts: PieceParts, settings: Settings, used: UsedRoles, findings: Findings): DressedLoom | undefined {
  const { size, beat, weave } = parts;
  if (size === undefined || beat === undefined || weave === undefined) return undefined;
  const threads = threadsOf(parts.yarns);
  return {
    workingEnds: warp.ends.working,
    spacingMm: warp.ends.spacingMm,
    warpDiameterMm: warp.workingDiameterMm,
    widthMm: size.widthMm,
    beat,
    tailMm: settings.tailMm,
    threads,
    picks: layWeft(picksToLay(used), threads, warp, { beat, weave }, findings),
  };
}

/** What the bands demand of the number of working ends comes on top of what the pattern asks. */
function withBandsParity(warp: Warp, bands: PieceParts['bands'], findings: Findings): Warp {
  const index = bands.findIndex((band) => band !== undefined && techniqueOf(band).needsEvenEnds?.(band) === true);
  if (index < 0 || warp.parity === 'even') return warp;
  if (warp.parity === 'odd') {
    findings.reject('E_PARITY', '/warp/parity', `Band ${String(index + 1)} takes the ends in pairs, so their number must be even. Ask for an even one, or for any.`);
  }
  return { ...warp, parity: 'even' };
}

/** Asked for too little, the finish takes what it needs; that is worth a word. */
function warnOfShortEnds({ allowances, warp }: PieceParts, { finish }: Edges, findings: Findings): void {
  const askedMm = allowances?.bottomMm;
  const neededMm = finishRoom(warp, finish);
  if (askedMm === undefined || askedMm >= neededMm) return;
  findings.warn('W_FRINGE', '/allowances/bottomMm', `The finish needs ${findings.length(neededMm, 'up')} of warp below the cloth; that is left, instead of ${findings.length(askedMm)}.`);
}

export function settingsFrom({ allowances, mode, beat }: PieceParts): Settings | undefined {
  // A refused beat only leaves the margin's default open, which checking fit does not need.
  return allowances === undefined ? undefined : settingsOf(allowances, mode, beat);
}

/** Reads a piece, dresses its loom and lays and stacks its weft; undefined, with a problem among the findings, if it cannot be woven. */
export function putOnLoom(fields: Fields): PieceOnLoom | undefined {
  const { findings } = fields;
  const parts = readPieceParts(fields);
  const { size, loom, edges } = parts;
  const warp = parts.warp && withBandsParity(parts.warp, parts.bands, findings);
  const used = collectRoles(parts.bands, new Set(parts.yarns.keys()), findings);
  warnOfUnused(parts, used, findings);
  const settings = settingsFrom(parts);
  if (settings === undefined || size === undefined || loom === undefined) return undefined;
  const height = edges && fitHeight(size, loom, warp, edges, settings, findings);
  if (edges !== undefined) warnOfShortEnds(parts, edges, findings);
  const dressed = warp && dressWarp(size, loom, warp, settings, findings);
  const laid = dressed && layOn(dressed, parts, settings, used, findings);
  const stacked = laid && stackBands(parts.bands, size.heightMm, laid, findings);
  if (findings.count > 0 || !edges || !height || !warp || !dressed || !laid || !stacked) return undefined;
  return { parts, size, loom, warp, edges, yarns: parts.yarns, settings, height, dressed, laid, stacked };
}

/** Reads a piece and reckons it; undefined, with a problem among the findings, if it cannot be woven. */
export function planFrameLoom(fields: Fields): Omit<FrameLoomPlan, 'warnings'> | undefined {
  const piece = putOnLoom(fields);
  return piece && addUp(piece, fields.findings);
}
