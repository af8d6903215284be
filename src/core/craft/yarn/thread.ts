/** A yarn as it goes into the cloth: its strands together, with both diameters. */
import type { Yarn } from '#core/craft/piece.ts';
import { leastTrust, type Trust } from '#core/craft/trust.ts';
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
  readonly trust: ThreadTrust;
}

/** Where a yarn's numbers came from: what was measured, else the label, else a formula, else its class. */
export interface ThreadTrust {
  readonly tex: Trust;
  readonly compressed: Trust;
  readonly loft: Trust;
}

export interface Grist {
  readonly tex: number;
  readonly plies: number;
  /** `practice` where sellers write such a count either way round, and it was read by the trade's custom. */
  readonly trust: Trust;
}

/**
 * Linear density and plies of a yarn that has been read. A length on the label
 * always overrides a count and a class.
 * @throws if the count cannot be read, which reading the yarn has ruled out
 */
export function gristOf(yarn: Yarn): Grist {
  if (yarn.tex !== undefined) return { tex: yarn.tex, plies: 1, trust: 'label' };
  if (yarn.metresPer100g !== undefined) return { tex: texFromMetresPer100g(yarn.metresPer100g), plies: 1, trust: 'label' };
  if (yarn.class !== undefined) {
    if (yarn.ball !== undefined) return { tex: texFromBall(yarn.ball), plies: 1, trust: 'label' };
    return { tex: texFromMetresPer100g(classOf(yarn.class).middle.metresPer100g), plies: 1, trust: 'class' };
  }
  const read = readCount(yarn.count.text, yarn.count.system, yarn.fibre);
  if (read === undefined) throw new Error(`not a count: ${yarn.count.text}`);
  if (yarn.ball !== undefined) return { tex: texFromBall(yarn.ball), plies: read.plies, trust: 'label' };
  return { tex: read.tex, plies: read.plies, trust: read.doubt === undefined ? 'label' : 'practice' };
}

/** Whether nothing is known of the yarn but its class. */
export function isKnownByClass(yarn: Yarn): boolean {
  return yarn.class !== undefined && yarn.ball === undefined;
}

interface Thickness {
  readonly mm: number;
  readonly trust: Trust;
}

/** Of one strand: measured, else what goes with its class if that is all there is, else from its compressed diameter. */
function strandLoft(yarn: Yarn, compressed: Thickness): Thickness {
  if (yarn.freeDiameterMm !== undefined) return { mm: yarn.freeDiameterMm, trust: 'measured' };
  if (yarn.wrapsPerInch !== undefined) return { mm: loftFromWraps(yarn.wrapsPerInch), trust: 'measured' };
  if (yarn.class !== undefined && isKnownByClass(yarn)) return { mm: loftFromWraps(classOf(yarn.class).middle.wrapsPerInch), trust: 'class' };
  return { mm: loftFromCompressed(compressed.mm), trust: compressed.trust };
}

/** `defaultK` stands in where the yarn does not say its own K. */
export function threadOf(yarn: Yarn, defaultK: number): Thread {
  const { tex, plies, trust } = gristOf(yarn);
  const strands = yarn.strands ?? 1;
  const compressed = { mm: compressedDiameter(tex, yarn.ashenhurstK ?? defaultK), trust: leastTrust('formula', trust) };
  const loft = strandLoft(yarn, compressed);
  return {
    tex,
    plies,
    strands,
    compressedMm: diameterTogether(compressed.mm, strands),
    loftMm: diameterTogether(loft.mm, strands),
    strandLoftMm: loft.mm,
    trust: { tex: trust, compressed: compressed.trust, loft: loft.trust },
  };
}

/** The same yarn with another number of strands together. */
export function withStrands(thread: Thread, strands: number): Thread {
  const one = Math.sqrt(strands / thread.strands);
  return { ...thread, strands, compressedMm: thread.compressedMm * one, loftMm: thread.loftMm * one };
}

/** Mass in grams of this length of one strand. */
export function massOf(lengthMm: number, tex: number): number {
  return (lengthMm / 1e6) * tex;
}
