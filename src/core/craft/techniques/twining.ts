/** Weft twining: two strands that cross between every two ends and hold them apart. */
import type { TwiningBand } from '#core/craft/piece.ts';
import { readName, readRole, ROWS } from '#core/craft/techniques/read-rules.ts';
import { loftSum, rowsOf, threadOn, type DressedLoom, type Technique, type Woven } from '#core/craft/techniques/technique.ts';

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

/**
 * Strand over spacing: its axis swings D/2 out of the cloth and d₂/2 along it, once each
 * way between two ends, which is an ellipse stretched along the row.
 */
export function twiningRatio(spacingMm: number, diameterSumMm: number, weftMm: number): number {
  const a = (Math.PI / (2 * spacingMm)) ** 2;
  const m = (a * (diameterSumMm ** 2 - weftMm ** 2)) / (1 + a * diameterSumMm ** 2);
  return (2 / Math.PI) * Math.sqrt(1 + a * diameterSumMm ** 2) * ellipticE(m);
}

export interface TwinedRow {
  readonly ends: number;
  readonly spacingMm: number;
  readonly diameterSumMm: number;
  readonly weftMm: number;
  readonly tailMm: number;
}

/** Both strands of one row, folded round the first end, with two tails. */
export function twinedRow(row: TwinedRow): number {
  const strandMm = (row.ends - 1) * row.spacingMm * twiningRatio(row.spacingMm, row.diameterSumMm, row.weftMm);
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
  });
  const stitches = band.rows * loom.workingEnds;
  return { counts: { stitches }, uses: [rowsOf(band.yarn, 'by-the-row', band.rows, rowMm, thread)], work: { stitches } };
}

/** A row is taken to be as high as its yarn lies free, as in soumak. */
export const twining: Technique<'twining'> = {
  read: (fields) => ({ technique: 'twining', ...readName(fields), yarn: readRole(fields), rows: fields.number('rows', ROWS) }),
  roles: (band) => [{ key: 'yarn', role: band.yarn, inPicks: false }],
  height: (band, loom) => band.rows * threadOn(loom, band.yarn).loftMm,
  check: () => undefined,
  weave,
};
