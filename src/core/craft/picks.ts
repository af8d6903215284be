/** One pick of tabby: how close rows lie, and how much yarn crosses the cloth. */
import { TAKE_UP_UNKNOWN } from '#core/craft/defaults.ts';
import type { Beat } from '#core/craft/piece.ts';
import { waveOf, weftWaveRange, type WaveRange } from '#core/craft/crimp.ts';
import type { MeasuredWeave, Weave } from '#core/craft/weave.ts';
import { roundHalfUp } from '#core/craft/rounding.ts';

/** Picks in one compressed weft diameter: hanging 0.7, firm tapestry 1.1, rug 1.45. Round yarns reach at most 2. */
export const BEAT_RANGE = { min: 0.2, max: 2 } as const;

/** How close rows lie: beaten so firmly, counted, or as far apart as the ends. */
export type RowBeat = Beat | 'as-ends';

/** From row to row, mm. A count on a swatch replaces the rule. */
export function pickSpacing(beat: Beat, weftDiameterMm: number): number {
  return beat.picksPerCm === undefined ? weftDiameterMm / beat.picksPerWeftDiameter : 10 / beat.picksPerCm;
}

/** The same where a balanced cloth says no beat: its rows lie as far apart as its ends. */
export function spacingOfRows(beat: RowBeat, weftDiameterMm: number, endSpacingMm: number): number {
  return beat === 'as-ends' ? endSpacingMm : pickSpacing(beat, weftDiameterMm);
}

/** Picks in one weft diameter, from picks counted over a length. */
export function beatOfSwatch(picks: number, overMm: number, weftDiameterMm: number): number {
  return (picks * weftDiameterMm) / overMm;
}

export interface WeftBend {
  /** Height of the weft's wave. */
  readonly waveMm: number;
  /** Steepest angle of the weft, radians. */
  readonly angleRad: number;
}

export interface PickGeometry {
  /** D = d₁ + d₂ */
  readonly diameterSumMm: number;
  readonly pickSpacingMm: number;
  /** D/p */
  readonly tightness: number;
  /** Of the weft. */
  readonly crimp: number;
  readonly warpCrimp: number;
  /** The weft's wave; missing where its take-up was measured. */
  readonly bend?: WeftBend;
  /** Weft from one working end to the next. */
  readonly stepMm: number;
  /** Weft round the end at a selvedge. */
  readonly turnMm: number;
  /** Half the chosen wave did not fit, so the nearest that does was taken. */
  readonly clamped: boolean;
}

export type Crossing = Weave & {
  readonly spacingMm: number;
  readonly warpDiameterMm: number;
  readonly weftDiameterMm: number;
  readonly pickSpacingMm: number;
};

interface ChosenWave {
  readonly heightMm: number;
  /** The wave that was wished for did not fit; this is the nearest that does. */
  readonly clamped: boolean;
}

/** Whether the yarns leave room for a wave so high. */
export function isInRange(heightMm: number, { min, max }: WaveRange, D: number): boolean {
  const hair = 1e-9 * D;
  return heightMm >= min - hair && heightMm <= max + hair;
}

/**
 * Straight warp leaves the whole wave D to the weft, or jams; in balanced cloth both share
 * it as nearly as they can; a given wave stands, or jams.
 */
export function chooseWeftWave(range: WaveRange, D: number, weave: Exclude<Weave, MeasuredWeave>): ChosenWave | undefined {
  if (weave.mode === 'straight-warp') return range.max < D * (1 - 1e-9) ? undefined : { heightMm: D, clamped: false };
  if (weave.mode === 'given') return isInRange(weave.weftWaveMm, range, D) ? { heightMm: Math.min(D, weave.weftWaveMm), clamped: false } : undefined;
  const heightMm = Math.min(range.max, Math.max(range.min, D / 2));
  return { heightMm, clamped: heightMm !== D / 2 };
}

/** Turn round a selvedge end: half a circle of diameter D, one row further on. */
export function turnLength(diameterSumMm: number, pickSpacingMm: number): number {
  return Math.hypot((Math.PI * diameterSumMm) / 2, pickSpacingMm);
}

type Bending = Pick<PickGeometry, 'crimp' | 'warpCrimp' | 'bend' | 'stepMm' | 'clamped'>;

function bendingOf(crossing: Crossing, D: number): Bending | undefined {
  const { spacingMm, pickSpacingMm } = crossing;
  if (crossing.mode === 'measured') {
    const unknown = TAKE_UP_UNKNOWN.likely;
    const { takeUp: crimp = unknown, warpTakeUp: warpCrimp = crossing.takeUp === undefined ? unknown : 0 } = crossing;
    return { crimp, warpCrimp, stepMm: spacingMm * (1 + crimp), clamped: false };
  }
  const range = weftWaveRange(D, spacingMm, pickSpacingMm);
  const chosen = range && chooseWeftWave(range, D, crossing);
  const weft = chosen && waveOf(spacingMm, D, chosen.heightMm);
  const warp = chosen && waveOf(pickSpacingMm, D, D - chosen.heightMm);
  if (chosen === undefined || weft === undefined || warp === undefined) return undefined;
  const bend = { waveMm: chosen.heightMm, angleRad: weft.angleRad };
  return { crimp: weft.crimp, warpCrimp: warp.crimp, bend, stepMm: weft.lengthMm, clamped: chosen.clamped };
}

/** Undefined where the yarns jam; a measured take-up is taken at its word. */
export function pickGeometry(crossing: Crossing): PickGeometry | undefined {
  const D = crossing.warpDiameterMm + crossing.weftDiameterMm;
  const bending = bendingOf(crossing, D);
  return bending && {
    diameterSumMm: D,
    pickSpacingMm: crossing.pickSpacingMm,
    tightness: D / crossing.spacingMm,
    turnMm: turnLength(D, crossing.pickSpacingMm),
    ...bending,
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
