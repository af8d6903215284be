/** Rya knots of the page's yarn on its ends: cut length, winding card, strands and yarn. */
import { countOf, lengthOf, massOf } from '#core/craft/amounts/amount-types.ts';
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import type { DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import type { RyaBand, Yarn } from '#core/craft/piece.ts';
import { ballsFor, withMargin } from '#core/craft/purchase.ts';
import { reckon } from '#core/craft/reckon.ts';
import type { RyaAnswer } from '#core/craft/reckoning/reckon-stitches.ts';
import { ceilSafe } from '#core/craft/rounding.ts';
import { explainRya } from '#core/craft/show-how/explain.ts';
import { massOf as massOfYarn, threadOf } from '#core/craft/yarn/thread.ts';
import { loud, NO_ANSWER, named, written, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import { RYA_KEYS } from '#core/reckoner/field-of-path.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import { SETT_FIELDS, YARN_FIELDS } from '#core/reckoner/read-fields.ts';

const NEEDS = [...YARN_FIELDS, ...SETT_FIELDS, 'leg-ends', 'knot-strands', 'pile', 'trim', 'rya-rows', 'edge-ends', 'card'] as const;

export interface TypedRya {
  readonly legEnds: number;
  readonly strands: number;
  readonly pileMm: number;
  readonly trimMm: number;
  readonly rows: number;
  readonly edgeEnds: number;
  readonly cardThicknessMm: number;
}

export function readTypedRya(reader: FormReader): TypedRya | undefined {
  const legEnds = reader.number('leg-ends', 'Ends in each leg');
  const strands = reader.number('knot-strands', 'Strands in a knot');
  const pileMm = reader.length('pile', 'Length of the pile');
  const trimMm = reader.length('trim', 'Length to trim away');
  const rows = reader.number('rya-rows', 'Rows of knots');
  const edgeEnds = reader.number('edge-ends', 'Plain ends at each edge');
  const cardThicknessMm = reader.length('card', 'Thickness of the card');
  if (legEnds === undefined || strands === undefined || pileMm === undefined || trimMm === undefined) return undefined;
  if (rows === undefined || edgeEnds === undefined || cardThicknessMm === undefined) return undefined;
  return { legEnds, strands, pileMm, trimMm, rows, edgeEnds, cardThicknessMm };
}

/** Rya lies closely; a row of it is taken to be this high. */
const ROW_MM = 6;

/** The knots as a band of a piece. */
export function ryaBand({ legEnds, strands, pileMm, trimMm, rows }: TypedRya): RyaBand {
  return { technique: 'rya', name: 'fringe', yarn: 'ground', strands, legEnds, pileMm, trimMm, rows, heightMm: ROW_MM * rows };
}

/** Strands are counted and cut to one length, so little can go astray: common practice, no source. */
const RESERVE = 0.05;

function yarnLines(rya: RyaAnswer, yarn: Yarn, tex: number): AnswerLine[] {
  const inHandMm = ceilSafe(withMargin(rya.strands, RESERVE)) * rya.cutMm;
  const balls = yarn.ball === undefined ? [] : [loud({ label: 'Balls', value: countOf(ballsFor(inHandMm, yarn.ball.metres).count, 'ball', 'balls'), how: 'length with reserve ÷ length of a ball, rounded up', trust: 'label' })];
  return [
    loud({ label: 'Yarn to have in hand', value: lengthOf(inHandMm, 'yarn'), how: 'strands and 5 % more, whole ones, × cut length', trust: 'formula' }),
    loud({ label: 'By weight', value: massOf(massOfYarn(inHandMm, tex)), how: 'length × tex', trust: 'label' }),
    ...balls,
  ];
}

function lines(rya: RyaAnswer, yarn: Yarn, typed: TypedRya): AnswerLine[] {
  const trust = yarn.wrapsPerInch === undefined ? 'formula' : 'measured';
  const { tex } = threadOf(yarn, ASHENHURST_K.weft);
  return [
    loud({ label: 'Cut each strand', value: lengthOf(rya.cutMm, 'cut'), how: '2 × (pile + trim) + what the knot takes', trust }),
    loud({ label: 'Strands', value: countOf(rya.strands, 'strand', 'strands'), how: 'knots × rows × strands in a knot', trust: 'formula' }),
    loud({ label: 'Winding card', value: lengthOf(rya.cardMm, 'least'), how: 'cut length ÷ 2 − thickness of the card, rounded up to 5 mm; wind it and cut along one edge', trust }),
    ...yarnLines(rya, yarn, tex),
    { label: 'Knots in a row', value: countOf(rya.knotsPerRow, 'knot', 'knots'), how: '(ends − plain ones at the edges) ÷ ends of a knot', trust: 'formula' },
    { label: 'Knots in all', value: countOf(rya.knotsPerRow * typed.rows, 'knot', 'knots'), how: 'knots in a row × rows', trust: 'formula' },
    { label: 'The knot itself takes', value: lengthOf(rya.wrapMm, 'fine'), how: 'once round both legs, and twice from behind to the face', trust },
    { label: 'Thickness of the bundle', value: lengthOf(rya.bundleMm, 'fine'), how: '√ strands × thickness lying free', trust },
  ];
}

const STEPS: Readonly<Record<string, string>> = {
  'Cut each strand': 'cutMm', Strands: 'strands', 'Winding card': 'cardMm', 'Knots in a row': 'knotsPerRow', 'The knot itself takes': 'wrapMm', 'Thickness of the bundle': 'bundleMm',
};

export function answerRya(typed: TypedRya | undefined, yarn: Yarn | undefined, dressed: DressedWarp | undefined, reader: FormReader): Section {
  const none = { ...NO_ANSWER, needs: NEEDS };
  if (typed === undefined || dressed === undefined || yarn === undefined || !reader.isSound(...NEEDS)) return none;
  const { strandLoftMm } = threadOf(yarn, ASHENHURST_K.weft);
  const question = { what: 'rya', ...typed, spacingMm: dressed.ends.spacingMm, warpDiameterMm: dressed.workingDiameterMm, strandLoftMm, ends: dressed.ends.working };
  const outcome = reckon(question, reader.units);
  if (!outcome.ok) {
    for (const { path, message } of outcome.problems) reader.refuse(RYA_KEYS[path.slice(1)] ?? 'leg-ends', message);
    return none;
  }
  if (!('cutMm' in outcome.value) || !reader.isSound(...NEEDS)) return none;
  return { lines: lines(outcome.value, yarn, typed).map((line) => named(line, STEPS)), notes: [], needs: NEEDS, asked: [question, reader.units], workings: () => written(explainRya(question, reader.units)) };
}
