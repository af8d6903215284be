/** Soumak and rya by themselves, without a piece round them. */
import type { Fields } from '#core/craft/reading/fields.ts';
import { fineLength, SPACING, WARP_DIAMETER, WORKING_ENDS } from '#core/craft/reckoning/rules.ts';
import { ROWS } from '#core/craft/techniques/read-rules.ts';
import {
  LEG_ENDS,
  PILE,
  ryaBundle,
  ryaCutLength,
  ryaKnotsPerRow,
  ryaWrap,
  type RyaKnot,
  STRANDS_IN_KNOT,
  TRIM,
  windingCard,
} from '#core/craft/techniques/rya.ts';
import { readOverAndBack, soumakRatio, soumakRowLength, soumakStitch, soumakStitchesPerRow, type SoumakStitch } from '#core/craft/techniques/soumak.ts';

/** The row is with its shorter last stitch, if it has one, and without its two tails; the stitches are the whole ones. */
export interface SoumakAnswer {
  readonly stitchMm: number;
  readonly ratio: number;
  readonly stitches: number;
  readonly rowMm: number;
}

export interface SoumakQuestion extends SoumakStitch {
  readonly ends: number;
}

export function readSoumak(fields: Fields): SoumakQuestion | undefined {
  const read = fields.findings.soundly(() => ({
    ...readOverAndBack(fields),
    spacingMm: fields.number('spacingMm', SPACING),
    diameterSumMm: fields.number('diameterSumMm', fineLength('Warp and weft together')),
    ends: fields.number('ends', WORKING_ENDS),
  }));
  fields.end();
  return read;
}

export function answerSoumak(read: SoumakQuestion, fields: Fields): SoumakAnswer | undefined {
  if (read.over > read.ends) {
    fields.reject('E_FIT', 'ends', `A stitch over ${String(read.over)} ends needs at least as many.`);
    return undefined;
  }
  const stitchMm = soumakStitch(read);
  const stitches = soumakStitchesPerRow(read.ends, read.over, read.back);
  return { stitchMm, ratio: soumakRatio(read), stitches, rowMm: soumakRowLength(read, read.ends) };
}

export function reckonSoumak(fields: Fields): SoumakAnswer | undefined {
  const read = readSoumak(fields);
  return read && answerSoumak(read, fields);
}

export interface RyaAnswer {
  readonly bundleMm: number;
  readonly wrapMm: number;
  readonly cutMm: number;
  readonly knotsPerRow: number;
  readonly strands: number;
  readonly yarnMm: number;
  /** Width of a card that is cut along one edge, rounded up to 5 mm, and before rounding. */
  readonly cardMm: number;
  readonly cardExactMm: number;
}

export interface RyaQuestion extends RyaKnot {
  readonly ends: number;
  readonly edgeEnds: number;
  readonly rows: number;
  readonly cardThicknessMm: number;
}

export function readRya(fields: Fields): RyaQuestion | undefined {
  const read = fields.findings.soundly(() => ({
    legEnds: fields.number('legEnds', LEG_ENDS),
    strands: fields.number('strands', STRANDS_IN_KNOT),
    spacingMm: fields.number('spacingMm', SPACING),
    warpDiameterMm: fields.number('warpDiameterMm', WARP_DIAMETER),
    strandLoftMm: fields.number('strandLoftMm', fineLength('Thickness of a strand')),
    pileMm: fields.number('pileMm', PILE),
    trimMm: fields.number('trimMm', TRIM),
    ends: fields.number('ends', WORKING_ENDS),
    edgeEnds: fields.number('edgeEnds', { name: 'Plain ends at each edge', min: 0, max: 1000, whole: true }),
    rows: fields.number('rows', ROWS),
    cardThicknessMm: fields.number('cardThicknessMm', { name: 'Thickness of the card', min: 'over-zero', max: 100, unit: 'mm' }),
  }));
  fields.end();
  return read;
}

export function answerRya(read: RyaQuestion, fields: Fields): RyaAnswer | undefined {
  const knotsPerRow = ryaKnotsPerRow(read.ends, read.edgeEnds, read.legEnds);
  if (knotsPerRow < 1) {
    fields.reject('E_FIT', 'ends', `One knot needs ${String(2 * read.legEnds)} ends beside the plain ones at the edges.`);
    return undefined;
  }
  const cutMm = ryaCutLength(read);
  const card = windingCard(cutMm, read.cardThicknessMm);
  if (card.exactMm <= 0) {
    fields.reject('E_FIT', 'cardThicknessMm', 'The card is too thick for strands so short.');
    return undefined;
  }
  const strands = knotsPerRow * read.rows * read.strands;
  return {
    bundleMm: ryaBundle(read),
    wrapMm: ryaWrap(read),
    cutMm,
    knotsPerRow,
    strands,
    yarnMm: strands * cutMm,
    cardMm: card.widthMm,
    cardExactMm: card.exactMm,
  };
}

export function reckonRya(fields: Fields): RyaAnswer | undefined {
  const read = readRya(fields);
  return read && answerRya(read, fields);
}
