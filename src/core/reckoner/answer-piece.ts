/** A whole small hanging: hem, fringe if wanted, one plain stretch, hem. */
import { amountOf } from '#core/craft/amounts.ts';
import type { Band, Beat, Piece, Yarn } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import type { Plan } from '#core/craft/plan-types.ts';
import { fieldOfPath } from '#core/reckoner/field-of-path.ts';
import { NO_ANSWER, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import { readTypedBeat, type FormReader, type TypedLoom } from '#core/reckoner/read-fields.ts';

export interface PieceSection extends Section {
  /** The piece itself, for its picture. */
  readonly made?: { readonly piece: Piece; readonly plan: Plan };
}

/** Rya lies closely; its row is taken to be this high. */
const FRINGE_ROW_MM = 6;
/** Colours of the picture only. */
const PICTURE = { warp: '#d8d2c1', ground: '#93a8a6' } as const;

/** In the order of the answer. */
const KEYS = [
  'ends', 'warp', 'warp.mass', 'yarn.ground', 'yarn.ground.mass', 'yarn.ground.balls', 'band.cloth.rows', 'pick', 'rows-per-load',
  'band.fringe.knots', 'band.fringe.strands', 'band.fringe.cut',
  'loom.height', 'loom.width', 'spacer.width', 'spacer.height', 'dowel.length', 'dowel.diameter', 'cord', 'mass', 'hours',
] as const;

function readFringe(reader: FormReader): readonly Band[] | undefined {
  if (reader.choice('fringe', ['none', 'rya']) === 'none') return [];
  const pileMm = reader.length('pile', 'Length of the fringe');
  const strands = reader.number('fringe-strands', 'Strands in a knot');
  if (pileMm === undefined || strands === undefined) return undefined;
  return [{ technique: 'rya', name: 'fringe', yarn: 'ground', strands, legEnds: 1, pileMm, trimMm: 10, rows: 1, heightMm: FRINGE_ROW_MM }];
}

/** Stand in for what cannot be read, so that everything else is checked all the same. */
const STAND_IN = { heightMm: 100, insideHeightMm: 20_000, yarn: { tex: 400 }, beat: { picksPerWeftDiameter: 1 }, fringe: [] } as const;

interface TypedMaking {
  readonly heightMm: number;
  readonly insideHeightMm: number;
  readonly diameterMm: number | undefined;
  readonly beat: Beat;
  readonly fringe: readonly Band[];
}

function readMaking(reader: FormReader): TypedMaking {
  return {
    heightMm: reader.length('height', 'Height') ?? STAND_IN.heightMm,
    insideHeightMm: reader.length('frame-height', 'Height of the frame') ?? STAND_IN.insideHeightMm,
    diameterMm: reader.optionalLength('dowel', 'Thickness of the dowel'),
    beat: readTypedBeat(reader) ?? STAND_IN.beat,
    fringe: readFringe(reader) ?? STAND_IN.fringe,
  };
}

function pieceOf({ heightMm, insideHeightMm, diameterMm, beat, fringe }: TypedMaking, typed: TypedLoom, yarn: Yarn = STAND_IN.yarn): Piece {
  const hem: Band = { technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 };
  return {
    craft: 'frame-loom',
    size: { widthMm: typed.widthMm, heightMm },
    loom: { ...typed.loom, insideHeightMm },
    warp: { ...typed.warp, yarn: { ...typed.warp.yarn, colour: PICTURE.warp } },
    beat,
    allowances: { drawIn: typed.drawIn },
    ...(diameterMm === undefined ? {} : { dowel: { diameterMm } }),
    yarns: { ground: { ...yarn, label: 'Weft yarn', colour: PICTURE.ground } },
    bands: [hem, ...fringe, { technique: 'tabby', name: 'cloth', yarn: 'ground', fill: true }, hem],
  };
}

function linesOf(piece: Piece, plan: Plan): readonly AnswerLine[] {
  return KEYS.flatMap((key): AnswerLine[] => {
    const amount = amountOf(key, piece, plan);
    if (!amount.ok) return [];
    const { howReckoned } = amount.value;
    const label = key.endsWith('.mass') ? `${amount.value.label}, by weight` : amount.value.label;
    return [{ label, value: amount.value, how: howReckoned.formula, trust: howReckoned.trust }];
  });
}

export function answerPiece(typed: TypedLoom | undefined, yarn: Yarn | undefined, reader: FormReader): PieceSection {
  const making = readMaking(reader);
  if (typed === undefined) return NO_ANSWER;
  const piece = pieceOf(making, typed, yarn);
  const planned = planPiece(piece, reader.units);
  if (!planned.ok) {
    for (const { path, message } of planned.problems) reader.refuse(fieldOfPath(path), message);
    return NO_ANSWER;
  }
  if (Object.keys(reader.errors).length > 0) return NO_ANSWER;
  const notes = planned.warnings.map(({ message }) => message);
  return { lines: linesOf(piece, planned.value), notes: [...new Set(notes)], made: { piece, plan: planned.value } };
}
