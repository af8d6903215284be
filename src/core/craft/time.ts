/** Hours of work. Rates are common practice and differ widely between hands: always shown as a range. */
import { PACE } from '#core/craft/defaults.ts';

/** What there is to do in a whole piece. */
export interface Work {
  readonly workingEnds: number;
  readonly warpEnds: number;
  readonly rows: number;
  /** Places in all rows where one colour ends and another begins. */
  readonly colourChanges: number;
  readonly knots: number;
  /** Of soumak, loop pile and twining. */
  readonly stitches: number;
  readonly hemBundles: number;
}

export const NO_WORK: Work = { workingEnds: 0, warpEnds: 0, rows: 0, colourChanges: 0, knots: 0, stitches: 0, hemBundles: 0 };

export function secondsPerRow(workingEnds: number): number {
  return workingEnds * PACE.secondsPerEnd + PACE.secondsPerRow;
}

/** Hours for each kind of work. */
export function hoursByWork(work: Work) {
  return {
    rows: (work.rows * secondsPerRow(work.workingEnds)) / 3600,
    colourChanges: (work.colourChanges * PACE.secondsPerColourChange) / 3600,
    knots: work.knots / PACE.ryaKnotsPerHour,
    stitches: work.stitches / PACE.stitchesPerHour,
    hemBundles: work.hemBundles / PACE.hemBundlesPerHour,
    warping: work.warpEnds / PACE.warpEndsPerHour,
    finishing: PACE.finishingHours,
  };
}

export function hoursOf(work: Work): { readonly likely: number; readonly low: number; readonly high: number } {
  const likely = Object.values(hoursByWork(work)).reduce((sum, hours) => sum + hours, 0);
  return { likely, low: likely * PACE.lowFactor, high: likely * PACE.highFactor };
}

const SQUARE_CM_PER_SQUARE_FOOT = 30.48 ** 2;

/** Pictorial tapestry by a professional, cm² an hour, from square feet in a 40-hour week: an upper cross-check. */
export function tapestryRate(squareFeetPerWeek: number): number {
  return (squareFeetPerWeek * SQUARE_CM_PER_SQUARE_FOOT) / 40;
}
