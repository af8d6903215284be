/** Weft twining: two strands that cross between every two ends and hold them apart. */
import type { TwiningBand } from '#core/craft/piece.ts';
import type { NumberRule } from '#core/craft/reading/fields.ts';
import { present } from '#core/craft/reading/present.ts';
import { ceilSafe } from '#core/craft/rounding.ts';
import { readName, readRole, ROWS } from '#core/craft/techniques/read-rules.ts';
import { loftSum, rowsOf, threadOn, type DressedLoom, type Technique, type TechniqueWords, type Woven } from '#core/craft/techniques/technique.ts';

const ENDS_PER_TWIST: NumberRule = { name: 'Ends between two crossings', min: 1, max: 100, whole: true };

/**
 * Complete elliptic integral of the second kind, E(m), for 0 ≤ m ≤ 1, by the
 * arithmetic-geometric mean (Abramowitz and Stegun 17.6).
 */
export function ellipticE(m: number): number {
  if (m === 1) return 1;
  let a = 1;
  let b = Math.sqrt(1 - m);
  let sum = m / 2;
  for (let weight = 1; a - b > 4 * Number.EPSILON; weight *= 2) {
    const c = (a - b) / 2;
    [a, b] = [(a + b) / 2, Math.sqrt(a * b)];
    sum += weight * c * c;
  }
  return (Math.PI / (2 * a)) * (1 - sum);
}

/** The ellipse of a twined strand: how far it is stretched, squared, and its parameter m. */
export function twinedEllipse(spacingMm: number, diameterSumMm: number, weftMm: number): { readonly stretch: number; readonly m: number } {
  const a = (Math.PI / (2 * spacingMm)) ** 2;
  const stretch = 1 + a * diameterSumMm ** 2;
  return { stretch, m: (a * (diameterSumMm ** 2 - weftMm ** 2)) / stretch };
}

/**
 * Strand over spacing: its axis swings D/2 out of the cloth and d₂/2 along it, once each
 * way between two ends, which is an ellipse stretched along the row.
 */
export function twiningRatio(spacingMm: number, diameterSumMm: number, weftMm: number): number {
  const { stretch, m } = twinedEllipse(spacingMm, diameterSumMm, weftMm);
  return (2 / Math.PI) * Math.sqrt(stretch) * ellipticE(m);
}

export interface TwinedRow {
  readonly ends: number;
  readonly spacingMm: number;
  readonly diameterSumMm: number;
  readonly weftMm: number;
  readonly tailMm: number;
  /** Ends between two crossings. */
  readonly endsPerTwist: number;
}

/** Both strands of one row, folded round the first end, with two tails. */
export function twinedRow(row: TwinedRow): number {
  const twistMm = row.endsPerTwist * row.spacingMm;
  const strandMm = (row.ends - 1) * row.spacingMm * twiningRatio(twistMm, row.diameterSumMm, row.weftMm);
  const foldMm = (Math.PI * row.diameterSumMm) / 2;
  return 2 * strandMm + foldMm + 2 * row.tailMm;
}

function weave(band: TwiningBand, _heightMm: number, loom: DressedLoom): Woven {
  const thread = threadOn(loom, band.yarn);
  const rowMm = twinedRow({
    ends: loom.workingEnds,
    spacingMm: loom.spacingMm,
    diameterSumMm: loftSum(loom, thread),
    weftMm: thread.loftMm,
    tailMm: loom.tailMm,
    endsPerTwist: band.endsPerTwist ?? 1,
  });
  const stitches = band.rows * ceilSafe(loom.workingEnds / (band.endsPerTwist ?? 1));
  return { counts: { stitches }, uses: [rowsOf(band.yarn, 'by-the-row', band.rows, rowMm, thread)], work: { stitches } };
}

export const TWINING_WORDS: TechniqueWords = {
  label: 'Twining',
  how: 'Two strands cross between the ends, so that one lies before each end and one behind it.',
  tools: ['blunt needle'],
  cautions: ['Twist always the same way, or the row opens where it turns.', 'Its first row sets the ends: measure their spacing before you go on.'],
};

/** A row is taken to be as high as its yarn lies free, as in soumak. */
export const twining: Technique<'twining'> = {
  read: (fields) => ({
    technique: 'twining',
    ...readName(fields),
    yarn: readRole(fields),
    rows: fields.number('rows', ROWS),
    ...present({ endsPerTwist: fields.optionalNumber('endsPerTwist', ENDS_PER_TWIST) }),
  }),
  roles: (band) => [{ key: 'yarn', role: band.yarn }],
  height: (band, loom) => band.rows * threadOn(loom, band.yarn).loftMm,
  check: (band, _heightMm, loom, report) => {
    if ((band.endsPerTwist ?? 1) > loom.workingEnds) {
      report.reject('E_FIT', 'endsPerTwist', `The warp has ${String(loom.workingEnds)} ends to work with. Cross the strands more often.`);
    }
  },
  weave,
};
