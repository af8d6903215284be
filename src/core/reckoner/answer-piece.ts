/** A whole small hanging: hem, fringe if wanted, one plain stretch, hem. */
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import { amountLine, workingsOf, yarnInHand } from '#core/reckoner/answer-cloth.ts';
import { loud, NO_ANSWER, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import { ryaBand, type TypedRya } from '#core/reckoner/answer-rya.ts';
import { RYA_KEYS } from '#core/reckoner/field-of-path.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import { ROW_FIELDS, SETT_FIELDS, YARN_FIELDS } from '#core/reckoner/read-fields.ts';
import { makePiece, type Cloth, type Made } from '#core/reckoner/small-piece.ts';

export interface PieceSection extends Section {
  /** The piece itself, for its picture. */
  readonly made?: { readonly piece: FrameLoomPiece; readonly plan: FrameLoomPlan };
}

const NEEDS = [...YARN_FIELDS, ...SETT_FIELDS, ...ROW_FIELDS, 'frame-height', 'frame-width', 'dowel'] as const;
const FRINGE_NEEDS = ['leg-ends', 'knot-strands', 'pile', 'trim', 'rya-rows'] as const;

/** In the order of the answer, with a name where the amount's own says too little here. */
const LINES: readonly (readonly [key: string, label: string])[] = [
  ['warp.mass', 'Warp, by weight'],
  ['band.cloth.rows', 'Rows'],
  ['rows-per-load', 'Rows one shuttle weaves'],
  ['band.fringe.knots', 'Knots of the fringe'],
  ['band.fringe.strands', 'Strands of the fringe'],
  ['band.fringe.cut', 'Cut length of the fringe'],
  ['loom.height', 'Frame, nail to nail, at least'],
  ['loom.width', 'Inside width, at least'],
  ['spacer.width', 'Spacer card, wide'],
  ['spacer.height', 'Spacer card, high'],
  ['dowel.length', 'Rod, long'],
  ['dowel.diameter', 'Rod, thick'],
  ['cord', 'Hanging cord'],
  ['mass', 'The piece weighs'],
];

function linesOf(made: Made): readonly AnswerLine[] {
  const [inHand, ...weightAndBalls] = yarnInHand(made, 'ground');
  return [
    ...amountLine(made, 'ends', 'Warp ends').map(loud),
    ...amountLine(made, 'warp', 'Warp to have in hand').map(loud),
    ...(inHand === undefined ? [] : [{ ...inHand, label: 'Weft to have in hand' }]),
    ...amountLine(made, 'hours', 'At the loom').map(loud),
    ...weightAndBalls.map(({ loud: _, ...line }) => ({ ...line, label: line.label === 'By weight' ? 'Weft, by weight' : 'Balls of weft' })),
    ...LINES.flatMap(([key, label]) => amountLine(made, key, label)),
  ];
}

export function answerPiece(cloth: Cloth | undefined, rya: TypedRya | undefined, reader: FormReader): PieceSection {
  const wantsFringe = reader.choice('fringe', ['none', 'rya']) === 'rya';
  const needs = wantsFringe ? [...NEEDS, ...FRINGE_NEEDS] : NEEDS;
  const none = { ...NO_ANSWER, needs };
  const heightMm = reader.length('frame-height', 'Height of the frame');
  const widthMm = reader.optionalLength('frame-width', 'Inside width of the frame');
  const diameterMm = reader.optionalLength('dowel', 'Thickness of the rod');
  if (cloth === undefined || heightMm === undefined || (wantsFringe && rya === undefined)) return none;
  const hem: Band = { technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 };
  const fringe = wantsFringe && rya !== undefined ? [ryaBand(rya)] : [];
  const made = makePiece(cloth, {
    bands: [hem, ...fringe, { technique: 'tabby', name: 'cloth', yarn: 'ground', fill: true }, hem],
    frame: { heightMm, ...(widthMm === undefined ? {} : { widthMm }) },
    ...(diameterMm === undefined ? {} : { dowel: { diameterMm } }),
  }, reader, RYA_KEYS);
  if (made === undefined || !reader.isSound(...needs)) return none;
  return { lines: linesOf(made), notes: made.notes, needs, made, ...workingsOf(made, reader.units) };
}
