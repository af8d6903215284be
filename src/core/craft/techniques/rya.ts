/** Rya: cut strands knotted round two legs of ends, hanging as a fringe or pile. */
import type { Ends } from '#core/craft/interlacement/lay.ts';
import type { RyaBand } from '#core/craft/piece.ts';
import type { Fields, NumberRule } from '#core/craft/reading/fields.ts';
import { present } from '#core/craft/reading/present.ts';
import { roundUpTo } from '#core/craft/rounding.ts';
import { BAND_HEIGHT, LONGEST_MM, readName, readRole, ROWS } from '#core/craft/techniques/read-rules.ts';
import { threadOn, type BandReport, type DressedLoom, type Technique, type TechniqueWords, type Woven } from '#core/craft/techniques/technique.ts';
import { diameterTogether } from '#core/craft/yarn/diameter.ts';

export interface RyaKnot {
  /** Ends in each of the two legs. */
  readonly legEnds: number;
  readonly strands: number;
  readonly spacingMm: number;
  readonly warpDiameterMm: number;
  /** One strand lying free. */
  readonly strandLoftMm: number;
  readonly pileMm: number;
  readonly trimMm: number;
}

/** The strands of a knot lying together. */
export function ryaBundle(knot: RyaKnot): number {
  return diameterTogether(knot.strandLoftMm, knot.strands);
}

/** Strand the knot itself takes: a belt round both legs, and twice the way from behind to the face. */
export function ryaWrap(knot: RyaKnot): number {
  const D = knot.warpDiameterMm + ryaBundle(knot);
  return 2 * (2 * knot.legEnds - 1) * knot.spacingMm + (Math.PI + 2) * D;
}

/** Length to cut each strand. */
export function ryaCutLength(knot: RyaKnot): number {
  return 2 * (knot.pileMm + knot.trimMm) + ryaWrap(knot);
}

/** Knots in a row, with so many plain ends left at each selvedge. */
export function ryaKnotsPerRow(ends: number, edgeEnds: number, legEnds: number): number {
  return Math.floor((ends - 2 * edgeEnds) / (2 * legEnds));
}

/** The ends of each knot in a row, from the left; what is left over stays plain at the right. */
export function ryaKnotEnds(ends: number, edgeEnds: number, legEnds: number): readonly Ends[] {
  return Array.from({ length: Math.max(0, ryaKnotsPerRow(ends, edgeEnds, legEnds)) }, (_, knot): Ends => {
    const first = edgeEnds + knot * 2 * legEnds;
    return { first, last: first + 2 * legEnds - 1 };
  });
}

/** Strands come in multiples of 5 mm on a card; wider is safe, narrower is not. */
export const CARD_STEP_MM = 5;

/** A card that is wound and cut along one edge. Cut along both it is as wide as the strand is long. */
export function windingCard(cutMm: number, thicknessMm: number): { readonly exactMm: number; readonly widthMm: number } {
  const exactMm = cutMm / 2 - thicknessMm;
  return { exactMm, widthMm: roundUpTo(exactMm, CARD_STEP_MM) };
}

export const STRANDS_IN_KNOT: NumberRule = { name: 'Strands in a knot', min: 1, max: 100, whole: true };
export const LEG_ENDS: NumberRule = { name: 'Ends in each leg', min: 1, max: 100, whole: true };
export const EDGE_ENDS: NumberRule = { name: 'Plain ends at each selvedge', min: 0, max: 100, whole: true };
export const PILE: NumberRule = { name: 'Length of the pile', min: 'over-zero', max: LONGEST_MM, unit: 'mm' };
export const TRIM: NumberRule = { name: 'Length to trim away', min: 0, max: 1000, unit: 'mm' };

function read(fields: Fields): RyaBand {
  return {
    technique: 'rya',
    ...readName(fields),
    yarn: readRole(fields),
    strands: fields.number('strands', STRANDS_IN_KNOT),
    legEnds: fields.number('legEnds', LEG_ENDS),
    ...present({ edgeEnds: fields.optionalNumber('edgeEnds', EDGE_ENDS) }),
    pileMm: fields.number('pileMm', PILE),
    trimMm: fields.number('trimMm', TRIM),
    rows: fields.number('rows', ROWS),
    heightMm: fields.number('heightMm', BAND_HEIGHT),
  };
}

function check(band: RyaBand, _heightMm: number, loom: DressedLoom, report: BandReport): void {
  const knotEnds = 2 * band.legEnds;
  const ends = loom.workingEnds - 2 * (band.edgeEnds ?? 0);
  if (knotEnds <= loom.workingEnds && knotEnds > ends) {
    report.reject('E_FIT', 'edgeEnds', `One knot needs ${String(knotEnds)} ends, and ${String(Math.max(0, ends))} are left between the plain ones. Leave fewer plain.`);
    return;
  }
  if (knotEnds > loom.workingEnds) {
    report.reject('E_FIT', 'legEnds', `One knot needs ${String(knotEnds)} ends, and the warp has ${String(loom.workingEnds)}. Take fewer in each leg.`);
    return;
  }
  const plain = ends % knotEnds;
  if (plain > 0) {
    const left = plain === 1 ? 'One end stays' : `${String(plain)} ends stay`;
    report.warn('W_PLAIN_END', 'legEnds', `${left} without a knot in each row. Share that between both selvedges, or ask for an even number of ends.`);
  }
}

function weave(band: RyaBand, _heightMm: number, loom: DressedLoom): Woven {
  const knots = band.rows * ryaKnotsPerRow(loom.workingEnds, band.edgeEnds ?? 0, band.legEnds);
  const strands = knots * band.strands;
  const cutMm = ryaCutLength({
    ...band,
    spacingMm: loom.spacingMm,
    warpDiameterMm: loom.warpDiameterMm,
    strandLoftMm: threadOn(loom, band.yarn).strandLoftMm,
  });
  return {
    counts: { knots, strands, cutMm },
    uses: [{ role: band.yarn, carry: 'cut', threadMm: strands * cutMm, yarnMm: strands * cutMm }],
    work: { knots },
  };
}

export const RYA_WORDS: TechniqueWords = {
  label: 'Rya fringe',
  how: 'Cut strands are laid over two ends, drawn out between them from behind, and pulled down to the row.',
  tools: ['card to wind the strands on', 'scissors', 'comb'],
  cautions: ['Pull both ends of a knot down together, or it sits askew.', 'Weave a row or two of tabby after each row of knots: they hold nothing by themselves.', 'Long fringe is a danger to small children: hang it out of their reach.'],
};

/** The band counts its own strands, so the number the yarn is otherwise taken together in does not matter here. */
export const rya: Technique<'rya'> = {
  read,
  roles: (band) => [{ key: 'yarn', role: band.yarn }],
  height: (band) => band.heightMm,
  check,
  weave,
};
