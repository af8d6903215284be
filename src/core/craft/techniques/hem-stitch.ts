/** Hem-stitch: the edge is sewn round bundles of ends, so that no row can slip. */
import type { Ends } from '#core/craft/interlacement/lay.ts';
import type { HemStitchBand } from '#core/craft/piece.ts';
import type { Fields, NumberRule } from '#core/craft/reading/fields.ts';
import { readName, readRole } from '#core/craft/techniques/read-rules.ts';
import {
  loftSum,
  pickSpacingOn,
  threadOn,
  rowsOf,
  type BandReport,
  type DressedLoom,
  type Technique,
  type TechniqueWords,
  type Woven,
} from '#core/craft/techniques/technique.ts';

export interface HemStitch {
  readonly bundleEnds: number;
  readonly reachPicks: number;
  readonly spacingMm: number;
  readonly pickSpacingMm: number;
  /** Warp and weft, the weft lying free. */
  readonly diameterSumMm: number;
}

/** Yarn round one bundle, in three moves: behind it, round it, behind again and up into the cloth. */
export function hemStitchLength({ bundleEnds: k, reachPicks: r, spacingMm: p, pickSpacingMm: p2, diameterSumMm: D }: HemStitch): number {
  return 2 * (k - 1) * p + Math.PI * D + Math.hypot(k * p, r * p2) + r * p2;
}

export interface Bundles {
  readonly whole: number;
  /** Ends in a last, smaller bundle; 0 when there is none. */
  readonly lastEnds: number;
}

export function bundlesOf(ends: number, bundleEnds: number): Bundles {
  return { whole: Math.floor(ends / bundleEnds), lastEnds: ends % bundleEnds };
}

/** The ends of each bundle in the order they are sewn, from right to left. */
export function bundleEndsFrom(ends: number, bundleEnds: number): readonly Ends[] {
  const { whole, lastEnds } = bundlesOf(ends, bundleEnds);
  const right = (bundle: number): number => ends - 1 - bundle * bundleEnds;
  const bundles = Array.from({ length: whole }, (_, bundle): Ends => ({ first: right(bundle) - bundleEnds + 1, last: right(bundle) }));
  return lastEnds === 0 ? bundles : [...bundles, { first: 0, last: lastEnds - 1 }];
}

const BUNDLE_ENDS: NumberRule = { name: 'Ends in a bundle', min: 1, max: 100, whole: true };
const REACH: NumberRule = { name: 'Rows the stitch reaches up', min: 1, max: 100, whole: true };

function read(fields: Fields): HemStitchBand {
  return {
    technique: 'hem-stitch',
    ...readName(fields),
    yarn: readRole(fields),
    bundleEnds: fields.number('bundleEnds', BUNDLE_ENDS),
    reachPicks: fields.number('reachPicks', REACH),
  };
}

function check(band: HemStitchBand, _heightMm: number, loom: DressedLoom, report: BandReport): void {
  if (band.bundleEnds > loom.workingEnds) {
    report.reject('E_FIT', 'bundleEnds', `The warp has ${String(loom.workingEnds)} ends to work with. Take fewer in a bundle.`);
  }
}

function weave(band: HemStitchBand, _heightMm: number, loom: DressedLoom): Woven {
  const thread = threadOn(loom, band.yarn);
  const around = (bundleEnds: number): number =>
    hemStitchLength({
      bundleEnds,
      reachPicks: band.reachPicks,
      spacingMm: loom.spacingMm,
      pickSpacingMm: pickSpacingOn(loom, band.yarn),
      diameterSumMm: loftSum(loom, thread),
    });
  const { whole, lastEnds } = bundlesOf(loom.workingEnds, band.bundleEnds);
  const stitches = whole + (lastEnds > 0 ? 1 : 0);
  const threadMm = whole * around(band.bundleEnds) + (lastEnds > 0 ? around(lastEnds) : 0);
  return { counts: { stitches }, uses: [rowsOf(band.yarn, 'shuttle', 1, threadMm, thread)], work: { hemBundles: stitches } };
}

export const HEM_STITCH_WORDS: TechniqueWords = {
  label: 'Hem-stitch',
  how: 'The needle goes behind a bundle of ends, round it, behind it again and up into the cloth.',
  tools: ['blunt needle'],
  cautions: ['Leave a tail four times the width before you begin: it cannot be lengthened.', 'Sew while the warp is still tight on the loom.'],
};

/** Sewn into the cloth's edge, it adds no height. */
export const hemStitch: Technique<'hem-stitch'> = {
  read,
  roles: (band) => [{ key: 'yarn', role: band.yarn }],
  height: () => 0,
  check,
  weave,
};
