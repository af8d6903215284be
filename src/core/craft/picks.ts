/** One pick of tabby: how close rows lie, and how much yarn crosses the cloth. */
import type { Beat, WeaveMode } from '#core/craft/piece.ts';
import { waveOf, weftWaveRange, type WaveRange } from '#core/craft/crimp.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';

/** Picks in one compressed weft diameter: hanging 0.7, firm tapestry 1.1, rug 1.45. Round yarns reach at most 2. */
export const BEAT_RANGE = { min: 0.2, max: 2 } as const;

/** From row to row, mm. A count on a swatch replaces the rule. */
export function pickSpacing(beat: Beat, weftDiameterMm: number): number {
  return beat.picksPerCm === undefined ? weftDiameterMm / beat.picksPerWeftDiameter : 10 / beat.picksPerCm;
}

/** Picks in one weft diameter, from picks counted over a length. */
export function beatOfSwatch(picks: number, overMm: number, weftDiameterMm: number): number {
  return (picks * weftDiameterMm) / overMm;
}

export interface PickGeometry {
  /** D = d₁ + d₂ */
  readonly diameterSumMm: number;
  readonly pickSpacingMm: number;
  /** D/p */
  readonly tightness: number;
  readonly crimp: number;
  /** Height of the weft's wave. */
  readonly waveMm: number;
  /** Steepest angle of the weft, radians. */
  readonly angleRad: number;
  /** Weft from one working end to the next. */
  readonly stepMm: number;
  /** Weft round the end at a selvedge. */
  readonly turnMm: number;
  /** Half the chosen wave did not fit, so the nearest that does was taken. */
  readonly clamped: boolean;
}

export interface Crossing {
  readonly spacingMm: number;
  readonly warpDiameterMm: number;
  readonly weftDiameterMm: number;
  readonly pickSpacingMm: number;
  readonly mode: WeaveMode;
}

interface ChosenWave {
  readonly heightMm: number;
  /** The wave that was wished for did not fit; this is the nearest that does. */
  readonly clamped: boolean;
}

/**
 * Straight warp leaves the whole wave D to the weft, or jams; in balanced cloth both share
 * it as nearly as they can.
 */
export function chooseWeftWave(range: WaveRange, D: number, mode: WeaveMode): ChosenWave | undefined {
  if (mode === 'straight-warp') return range.max < D * (1 - 1e-9) ? undefined : { heightMm: D, clamped: false };
  const heightMm = Math.min(range.max, Math.max(range.min, D / 2));
  return { heightMm, clamped: heightMm !== D / 2 };
}

/** Turn round a selvedge end: half a circle of diameter D, one row further on. */
export function turnLength(diameterSumMm: number, pickSpacingMm: number): number {
  return Math.hypot((Math.PI * diameterSumMm) / 2, pickSpacingMm);
}

/** Undefined where the yarns jam. */
export function pickGeometry(crossing: Crossing): PickGeometry | undefined {
  const D = crossing.warpDiameterMm + crossing.weftDiameterMm;
  const range = weftWaveRange(D, crossing.spacingMm, crossing.pickSpacingMm);
  const chosen = range && chooseWeftWave(range, D, crossing.mode);
  const wave = chosen && waveOf(crossing.spacingMm, D, chosen.heightMm);
  if (chosen === undefined || wave === undefined) return undefined;
  return {
    diameterSumMm: D,
    pickSpacingMm: crossing.pickSpacingMm,
    tightness: D / crossing.spacingMm,
    crimp: wave.crimp,
    waveMm: chosen.heightMm,
    angleRad: wave.angleRad,
    stepMm: wave.lengthMm,
    turnMm: turnLength(D, crossing.pickSpacingMm),
    clamped: chosen.clamped,
  };
}

/** Weft of one pick over this many working ends, its turn included. A single end is a turn only. */
export function pickLength(workingEnds: number, geometry: Pick<PickGeometry, 'stepMm' | 'turnMm'>): number {
  return (workingEnds - 1) * geometry.stepMm + geometry.turnMm;
}

/** Rows in a band of this height, counted in the relaxed cloth. */
export function picksInHeight(heightMm: number, pickSpacingMm: number): number {
  return roundHalfUp(heightMm / pickSpacingMm);
}

/** Rows one filled shuttle weaves. */
export function rowsPerLoad(loadMm: number, rowMm: number): number {
  return Math.floor(loadMm / rowMm);
}

/** Yarn on a butterfly: so many figure-eights over a hand of this span. */
export function butterflyLength(eights: number, spanMm: number): number {
  return 2 * eights * spanMm;
}

/** Yarn on a stick shuttle wound so many times round. */
export function stickShuttleLength(turns: number, notchDistanceMm: number, thicknessMm: number): number {
  return turns * 2 * (notchDistanceMm + thicknessMm);
}
