/** From what a piece takes to what to buy. */
import { TIGHT_SHARE_OF_BALL } from '#core/craft/defaults.ts';
import { ceilSafe } from '#core/craft/rounding.ts';

/** Relative standard uncertainties of what the length of a tabby band is made of. */
export interface Uncertainties {
  readonly width: number;
  readonly height: number;
  readonly picks: number;
  readonly crimp: number;
  readonly tex: number;
}

/** D, the parts estimated. Picks guessed from the yarn's thickness, or counted on a swatch. */
export const UNCERTAINTIES = {
  unmeasured: { width: 0.01, height: 0.01, picks: 0.08, crimp: 0.02, tex: 0.025 },
  swatch: { width: 0.01, height: 0.01, picks: 0.03, crimp: 0.02, tex: 0.025 },
  /** Of yarn in rows whose number is given: neither height nor picks count. */
  rowsGiven: { width: 0.01, height: 0, picks: 0, crimp: 0.02, tex: 0.025 },
} as const satisfies Record<string, Uncertainties>;

/** P: strands that are cut one by one. */
export const CUT_STRANDS_MARGIN = 0.05;

/** One-sided 95 %. */
const COVERAGE = 1.645;

/** Combined relative uncertainty: independent parts add in squares. */
export function combinedUncertainty(parts: Uncertainties): number {
  return Math.hypot(parts.width, parts.height, parts.picks, parts.crimp, parts.tex);
}

/** Share to buy on top so that the yarn suffices in 95 of 100 pieces. */
export function marginFor(parts: Uncertainties): number {
  return COVERAGE * combinedUncertainty(parts);
}

export function withMargin(netMm: number, margin: number): number {
  return netMm * (1 + margin);
}

/** A plan weighs the net length; what one has in hand has its margin. */
export const gramsInHand = ({ netMm, withMarginMm, massG }: { readonly netMm: number; readonly withMarginMm: number; readonly massG: number }): number =>
  netMm === 0 ? 0 : massG * (withMarginMm / netMm);

export interface Balls {
  readonly count: number;
  readonly leftOverMm: number;
  /** So little is left over that one ball more is wise. */
  readonly tight: boolean;
}

/** Whole balls for a length that already holds its margin. Buy them of one dye lot. */
export function ballsFor(neededMm: number, ballMetres: number): Balls {
  const ballMm = ballMetres * 1000;
  const count = ceilSafe(neededMm / ballMm);
  const leftOverMm = count * ballMm - neededMm;
  return { count, leftOverMm, tight: count > 0 && leftOverMm < TIGHT_SHARE_OF_BALL * ballMm };
}

/**
 * Grams by which a prepacked ball may be lighter than its label (Directive 76/211/EEC,
 * Annex I 2.4), for a nominal 5 to 1000 g. The mean of a lot may not be lighter.
 */
export function tolerableShortage(nominalGrams: number): number {
  if (nominalGrams <= 50) return nominalGrams * 0.09;
  if (nominalGrams <= 100) return 4.5;
  if (nominalGrams <= 200) return nominalGrams * 0.045;
  if (nominalGrams <= 300) return 9;
  if (nominalGrams <= 500) return nominalGrams * 0.03;
  return 15;
}
