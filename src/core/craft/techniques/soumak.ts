/**
 * Soumak: the weft is wrapped round the ends, over some and back under fewer, and lies
 * in a ridge on the cloth. One or two picks of tabby between rows hold it.
 */
import type { SoumakBand } from '#core/craft/piece.ts';
import type { Fields, NumberRule } from '#core/craft/reading/fields.ts';
import { readName, readRole, ROWS } from '#core/craft/techniques/read-rules.ts';
import {
  loftSum,
  pickKey,
  picksOn,
  pickSpacingOn,
  threadOn,
  rowsOf,
  type BandReport,
  type DressedLoom,
  type Technique,
  type TechniqueWords,
  type Woven,
} from '#core/craft/techniques/technique.ts';
import { pickLength } from '#core/craft/picks.ts';

export interface SoumakStitch {
  /** Ends passed over on the face, at least 2. */
  readonly over: number;
  /** Ends gone back under, from 1 to one less than `over`. */
  readonly back: number;
  readonly spacingMm: number;
  /** Warp and weft, the weft lying free. */
  readonly diameterSumMm: number;
}

/**
 * Weft of one stitch: its axis is a stadium round the ends, (over − 1) spacings forward on
 * the face, (back − 1) behind, and two half turns of diameter D.
 */
export function soumakStitch({ over, back, spacingMm, diameterSumMm }: SoumakStitch): number {
  return (over + back - 2) * spacingMm + Math.PI * diameterSumMm;
}

/** Weft over cloth covered. With D = 2p/π it is the simple (over + back)/(over − back). */
export function soumakRatio(stitch: SoumakStitch): number {
  return soumakStitch(stitch) / ((stitch.over - stitch.back) * stitch.spacingMm);
}

/** Whole stitches in a row; what is left takes a shorter last one. */
export function soumakStitchesPerRow(ends: number, over: number, back: number): number {
  return Math.floor((ends - over) / (over - back)) + 1;
}

/** Ends beyond the last whole stitch: they take one shorter stitch, over themselves and the ends it goes back under. */
export function soumakRest(ends: number, over: number, back: number): number {
  return (ends - over) % (over - back);
}

/** Weft of one row over this many ends, without its tails. Needs `ends` ≥ over. */
export function soumakRowLength(stitch: SoumakStitch, ends: number): number {
  const { over, back } = stitch;
  const rest = soumakRest(ends, over, back);
  const last = rest === 0 ? 0 : soumakStitch({ ...stitch, over: back + rest });
  return soumakStitchesPerRow(ends, over, back) * soumakStitch(stitch) + last;
}

const OVER: NumberRule = { name: 'Ends passed over', min: 2, max: 100, whole: true };
const BACK: NumberRule = { name: 'Ends gone back under', min: 1, max: 99, whole: true };
const TABBY_BETWEEN: NumberRule = { name: 'Picks of tabby between rows', min: 0, max: 100, whole: true };

/** Ends over and back, one fewer back than over at least. */
export function readOverAndBack(fields: Fields): { readonly over: number; readonly back: number } {
  const over = fields.number('over', OVER);
  const back = fields.number('back', BACK);
  if (over !== 0 && back >= over) {
    fields.reject('E_RANGE', 'back', `A soumak stitch goes back under fewer ends than it passed over: between 1 and ${String(over - 1)} works.`);
  }
  return { over, back };
}

function read(fields: Fields): SoumakBand {
  return {
    technique: 'soumak',
    ...readName(fields),
    yarn: readRole(fields),
    ...readOverAndBack(fields),
    rows: fields.number('rows', ROWS),
    tabbyBetween: fields.number('tabbyBetween', TABBY_BETWEEN),
    tabbyYarn: readRole(fields, 'tabbyYarn'),
  };
}

const tabbyPicks = (band: SoumakBand): number => (band.rows - 1) * band.tabbyBetween;

/** A row is as high as its yarn lies free; tabby fills the rooms between rows. */
function height(band: SoumakBand, loom: DressedLoom): number {
  return band.rows * threadOn(loom, band.yarn).loftMm + tabbyPicks(band) * pickSpacingOn(loom, band.tabbyYarn);
}

function check(band: SoumakBand, _heightMm: number, loom: DressedLoom, report: BandReport): void {
  if (band.over > loom.workingEnds) {
    report.reject('E_FIT', 'over', `The warp has ${String(loom.workingEnds)} ends to work with. Pass over fewer.`);
    return;
  }
  if (soumakRest(loom.workingEnds, band.over, band.back) > 0) {
    report.warn('W_SHORT_STITCH', 'over', 'The last stitch of each row comes out shorter than the others.');
  }
}

function weave(band: SoumakBand, _heightMm: number, loom: DressedLoom): Woven {
  const thread = threadOn(loom, band.yarn);
  const perRow = soumakStitchesPerRow(loom.workingEnds, band.over, band.back);
  const stitch = { over: band.over, back: band.back, spacingMm: loom.spacingMm, diameterSumMm: loftSum(loom, thread) };
  const soumak = rowsOf(band.yarn, 'by-the-row', band.rows, soumakRowLength(stitch, loom.workingEnds) + 2 * loom.tailMm, thread);
  const stitches = band.rows * perRow;
  const picks = tabbyPicks(band);
  if (picks === 0) return { counts: { stitches }, uses: [soumak], work: { stitches } };
  const ground = threadOn(loom, band.tabbyYarn);
  const pickMm = pickLength(loom.workingEnds, picksOn(loom, { role: band.tabbyYarn }));
  return {
    picks: { key: pickKey({ role: band.tabbyYarn }), rows: picks, rawRows: picks },
    counts: { picks, stitches },
    uses: [soumak, rowsOf(band.tabbyYarn, 'shuttle', picks, pickMm, ground)],
    work: { rows: picks, stitches },
  };
}

export const SOUMAK_WORDS: TechniqueWords = {
  label: 'Soumak',
  how: 'The weft goes over some ends and back under fewer, and so wraps its way along the row in a ridge.',
  tools: ['blunt needle', 'comb'],
  cautions: ['Wrapped tightly it draws the cloth in: let each stitch lie round its ends without pulling.', 'A row or two of tabby between ridges holds them.'],
};

export const soumak: Technique<'soumak'> = {
  read,
  roles: (band) => [
    { key: 'yarn', role: band.yarn },
    { key: 'tabbyYarn', role: band.tabbyYarn, ...(tabbyPicks(band) > 0 ? { picks: { role: band.tabbyYarn } } : {}) },
  ],
  height,
  check,
  weave,
};
