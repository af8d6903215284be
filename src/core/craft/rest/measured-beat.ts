/** How close the rows of a piece on the loom truly lie: counted rows over a measured height. */
import type { PieceOnLoom } from '#core/craft/frame-loom/add-up.ts';
import type { StackedBand } from '#core/craft/frame-loom/stack-bands.ts';
import type { Beat } from '#core/craft/piece.ts';
import { BEAT_RANGE, picksInHeight, type RowBeat } from '#core/craft/picks.ts';
import type { Findings } from '#core/craft/reading/findings.ts';
import { pickSpacingOn } from '#core/craft/techniques/technique.ts';
import type { WovenSoFar } from '#core/craft/rest/woven-so-far.ts';

/** Less tabby than this says nothing yet of how close its rows lie. */
export const LEAST_MEASURED_MM = 20;
const MOST_PICKS_PER_CM = 200;

export const shrinkOf = ({ settings }: PieceOnLoom): number => (1 - settings.relaxation) * (1 - settings.wetShrinkage);

export interface Part {
  /** Height of the rows of tabby, as the plan has it. */
  readonly tabbyMm: number;
  /** Of everything else. */
  readonly otherMm: number;
}

function partOf({ band, heightMm }: StackedBand, workings: PieceOnLoom, rows: number | undefined): Part {
  if (band.technique === 'tabby') {
    const spacingMm = pickSpacingOn(workings.laid, band.yarn);
    return { tabbyMm: (rows ?? picksInHeight(heightMm, spacingMm)) * spacingMm, otherMm: 0 };
  }
  const share = rows === undefined ? 1 : 'rows' in band ? rows / band.rows : 0;
  return { tabbyMm: 0, otherMm: heightMm * share };
}

/** Finished heights of what is woven, by the plan. */
export function plannedSoFar(workings: PieceOnLoom, { bandsDone, rows = 0 }: WovenSoFar): Part {
  const parts = workings.stacked.slice(0, bandsDone + 1).map((band, index) => partOf(band, workings, index < bandsDone ? undefined : rows));
  return { tabbyMm: parts.reduce((sum, part) => sum + part.tabbyMm, 0), otherMm: parts.reduce((sum, part) => sum + part.otherMm, 0) };
}

function quicker(beat: RowBeat, times: number, endSpacingMm: number): Beat {
  if (beat === 'as-ends') return { picksPerCm: (10 / endSpacingMm) * times };
  return beat.picksPerCm === undefined ? { picksPerWeftDiameter: beat.picksPerWeftDiameter * times } : { picksPerCm: beat.picksPerCm * times };
}

/** No hand beats closer or wider; a count is of rows that were seen, so nothing is too wide. */
function canBe(beat: Beat): boolean {
  if (beat.picksPerCm !== undefined) return beat.picksPerCm <= MOST_PICKS_PER_CM;
  return beat.picksPerWeftDiameter >= BEAT_RANGE.min && beat.picksPerWeftDiameter <= BEAT_RANGE.max;
}

/**
 * The beat that the woven part shows: as many times closer or wider than the plan's as the tabby came out lower or
 * higher. Undefined where nothing was measured, too little is woven, or what was measured cannot be; the last is told.
 */
export function measuredBeat(workings: PieceOnLoom, woven: WovenSoFar, findings: Findings): Beat | undefined {
  if (woven.heightMm === undefined) return undefined;
  const { tabbyMm, otherMm } = plannedSoFar(workings, woven);
  if (tabbyMm < LEAST_MEASURED_MM) return undefined;
  const measuredMm = woven.heightMm * shrinkOf(workings) - otherMm;
  const beat = measuredMm > 0 ? quicker(workings.laid.beat, tabbyMm / measuredMm, workings.laid.spacingMm) : undefined;
  if (beat !== undefined && canBe(beat)) return beat;
  const planned = findings.length((tabbyMm + otherMm) / shrinkOf(workings));
  findings.reject('E_RANGE', '/heightMm', `So many rows cannot be so high: by the plan they come to ${planned} on the loom. Count the rows and measure from the first one to the fell again.`);
  return undefined;
}
