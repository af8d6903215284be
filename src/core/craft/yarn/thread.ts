/** A yarn as it goes into the cloth: its strands together, with both diameters. */
import type { Yarn } from '#core/craft/piece.ts';
import { texFromBall, texFromMetresPer100g } from '#core/craft/yarn/count.ts';
import { readCount } from '#core/craft/yarn/count-text.ts';
import { compressedDiameter, diameterTogether, loftFromCompressed, loftFromWraps } from '#core/craft/yarn/diameter.ts';

export interface Thread {
  /** Of one strand as it is bought. */
  readonly tex: number;
  readonly plies: number;
  /** Strands taken together. */
  readonly strands: number;
  /** All strands together, beaten or under tension. */
  readonly compressedMm: number;
  /** All strands together, lying free. */
  readonly loftMm: number;
  /** One strand lying free. */
  readonly strandLoftMm: number;
}

/**
 * Linear density and plies of a yarn that has been read. A length on the label
 * always overrides a count.
 * @throws if the count cannot be read, which reading the yarn has ruled out
 */
export function gristOf(yarn: Yarn): { readonly tex: number; readonly plies: number } {
  if (yarn.tex !== undefined) return { tex: yarn.tex, plies: 1 };
  if (yarn.metresPer100g !== undefined) return { tex: texFromMetresPer100g(yarn.metresPer100g), plies: 1 };
  const read = readCount(yarn.count.text, yarn.count.system, yarn.fibre);
  if (read === undefined) throw new Error(`not a count: ${yarn.count.text}`);
  return { tex: yarn.ball === undefined ? read.tex : texFromBall(yarn.ball), plies: read.plies };
}

/** `defaultK` stands in where the yarn does not say its own K. */
export function threadOf(yarn: Yarn, defaultK: number): Thread {
  const { tex, plies } = gristOf(yarn);
  const strands = yarn.strands ?? 1;
  const strandMm = compressedDiameter(tex, yarn.ashenhurstK ?? defaultK);
  const strandLoftMm = yarn.wrapsPerInch === undefined ? loftFromCompressed(strandMm) : loftFromWraps(yarn.wrapsPerInch);
  return {
    tex,
    plies,
    strands,
    compressedMm: diameterTogether(strandMm, strands),
    loftMm: diameterTogether(strandLoftMm, strands),
    strandLoftMm,
  };
}

/** Mass in grams of this length of one strand. */
export function massOf(lengthMm: number, tex: number): number {
  return (lengthMm / 1e6) * tex;
}
