/** A yarn as it goes into the cloth: its strands together, with both diameters. */
import type { Yarn } from '#core/craft/piece.ts';
import { classOf } from '#core/craft/yarn/classes.ts';
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
 * always overrides a count and a class.
 * @throws if the count cannot be read, which reading the yarn has ruled out
 */
export function gristOf(yarn: Yarn): { readonly tex: number; readonly plies: number } {
  if (yarn.tex !== undefined) return { tex: yarn.tex, plies: 1 };
  if (yarn.metresPer100g !== undefined) return { tex: texFromMetresPer100g(yarn.metresPer100g), plies: 1 };
  if (yarn.class !== undefined) {
    const { middle } = classOf(yarn.class);
    return { tex: yarn.ball === undefined ? texFromMetresPer100g(middle.metresPer100g) : texFromBall(yarn.ball), plies: 1 };
  }
  const read = readCount(yarn.count.text, yarn.count.system, yarn.fibre);
  if (read === undefined) throw new Error(`not a count: ${yarn.count.text}`);
  return { tex: yarn.ball === undefined ? read.tex : texFromBall(yarn.ball), plies: read.plies };
}

/** Whether nothing is known of the yarn but its class. */
export function isKnownByClass(yarn: Yarn): boolean {
  return yarn.class !== undefined && yarn.ball === undefined;
}

/** Of one strand: measured, else what goes with its class if that is all there is, else from its compressed diameter. */
function strandLoft(yarn: Yarn, compressedMm: number): number {
  if (yarn.freeDiameterMm !== undefined) return yarn.freeDiameterMm;
  if (yarn.wrapsPerInch !== undefined) return loftFromWraps(yarn.wrapsPerInch);
  if (yarn.class !== undefined && isKnownByClass(yarn)) return loftFromWraps(classOf(yarn.class).middle.wrapsPerInch);
  return loftFromCompressed(compressedMm);
}

/** `defaultK` stands in where the yarn does not say its own K. */
export function threadOf(yarn: Yarn, defaultK: number): Thread {
  const { tex, plies } = gristOf(yarn);
  const strands = yarn.strands ?? 1;
  const strandMm = compressedDiameter(tex, yarn.ashenhurstK ?? defaultK);
  const strandLoftMm = strandLoft(yarn, strandMm);
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
