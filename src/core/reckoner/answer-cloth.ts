/** How much yarn a plain stretch takes: how rows lie, how far the weft bends, and what to have in hand. */
import { amountOf } from '#core/craft/amounts.ts';
import type { DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import { settingsOf } from '#core/craft/frame-loom/settings.ts';
import { lengthOf, type Amount } from '#core/craft/amounts/amount-types.ts';
import { loud, NO_ANSWER, stepped, written, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import { ROW_FIELDS, SETT_FIELDS, YARN_FIELDS } from '#core/reckoner/read-fields.ts';
import { makePiece, type Cloth, type Made } from '#core/reckoner/small-piece.ts';
import { explainPiece } from '#core/craft/show-how/explain.ts';
import { reckon } from '#core/craft/reckon.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import type { Units } from '#core/units/units.ts';

const NEEDS = [...YARN_FIELDS, ...SETT_FIELDS, ...ROW_FIELDS] as const;

const FIXED_STEPS: Readonly<Record<string, string>> = {
  ends: 'ends.count', warp: 'warp.withMarginMm', pick: 'weft.pickMm', 'loom.height': 'loom.heightNeededMm', 'loom.width': 'loom.insideWidthNeededMm',
  'spacer.width': 'cut.spacerCard.widthMm', 'spacer.height': 'cut.spacerCard.heightMm', 'dowel.length': 'cut.dowel.lengthMm',
  cord: 'cut.cordMm', 'warp.mass': 'warp.withMarginG', 'rows-per-load': 'yarns.ground.rowsPerLoad', mass: 'massG', hours: 'hours.likely',
};
const YARN_STEPS: Readonly<Record<string, string>> = { mass: 'withMarginG', balls: 'balls' };
const BAND_STEPS: Readonly<Record<string, string>> = { rows: 'picks', knots: 'knots', strands: 'strands', cut: 'cutMm' };

/** Id of the working that gives an amount of the plan. */
function stepOf(key: string, { piece }: Made): string | undefined {
  const [subject, name, what] = key.split('.');
  if (subject === 'yarn') return `yarns.${name ?? ''}.${YARN_STEPS[what ?? ''] ?? 'withMarginMm'}`;
  const ofBand = subject === 'band' && BAND_STEPS[what ?? ''];
  return typeof ofBand === 'string' ? `bands.${String(piece.bands.findIndex((band) => band.name === name))}.${ofBand}` : FIXED_STEPS[key];
}

/** An amount of the plan by its key, under a name of this page. */
export function amountLine(made: Made, key: string, label: string): AnswerLine[] {
  const amount = amountOf(key, made.piece, made.plan);
  if (!amount.ok) return [];
  const { howReckoned, ...value }: Amount = amount.value;
  const step = stepOf(key, made);
  return [{ label, value, how: howReckoned.formula, trust: howReckoned.trust, ...(step === undefined ? {} : { step }) }];
}

/** Every step of a piece's reckoning, when somebody asks. */
export const workingsOf = ({ piece }: Made, units: Units) => ({ asked: [piece, units], workings: () => written(explainPiece(piece, units)) });

/** Length, weight and balls of a yarn, with its reserve: what to have in hand. */
export function yarnInHand(made: Made, role: string): AnswerLine[] {
  return [
    ...amountLine(made, `yarn.${role}`, 'Yarn to have in hand').map(loud),
    ...amountLine(made, `yarn.${role}.mass`, 'By weight').map(loud),
    ...amountLine(made, `yarn.${role}.balls`, 'Balls').map(loud),
  ];
}

/** How much the warp bends; undefined where that cannot be told. */
function warpCrimp({ piece, plan: { weft, ends } }: Made, dressed: DressedWarp): number | undefined {
  const weftDiameterMm = weft.diameterSumMm - dressed.workingDiameterMm;
  const question = { what: 'take-up', warpDiameterMm: dressed.workingDiameterMm, weftDiameterMm, warpSpacingMm: ends.spacingMm, weftSpacingMm: weft.pickSpacingMm, mode: piece.mode };
  const outcome = reckon(question);
  return outcome.ok && 'waveMm' in outcome.value ? outcome.value.warp.crimp : undefined;
}

function rowLines(made: Made, dressed: DressedWarp, units: Units): AnswerLine[] {
  const { piece, plan: { weft, ends } } = made;
  const trust = piece.beat?.picksPerCm === undefined ? 'formula' : 'measured';
  const ofWarp = warpCrimp(made, dressed);
  const perUnit = units === 'in' ? { value: MM_PER_INCH / weft.pickSpacingMm, unit: 'to the inch' } : { value: 10 / weft.pickSpacingMm, unit: 'to the cm' };
  return [
    { label: 'Rows lie', value: { kind: 'number', ...perUnit }, how: trust === 'measured' ? 'as you counted on the swatch' : 'rows in one thickness of the yarn ÷ its thickness beaten down', trust },
    ...amountLine(made, 'pick', 'Weft of one row'),
    stepped('weft.crimp', { label: 'Take-up of the weft', value: { kind: 'share', share: weft.crimp }, how: 'how much longer the weft is than its straight way from end to end (Peirce)', trust: 'formula' }),
    ...(ofWarp === undefined ? [] : [{ label: 'Take-up of the warp', value: { kind: 'share', share: ofWarp }, how: piece.mode === 'balanced' ? 'as the weft, where both bend alike (Peirce)' : 'none, where the warp is stretched straight', trust: 'formula' } as const]),
    stepped('ends.woundWidthMm', { label: 'Straight across', value: lengthOf(ends.woundWidthMm, 'size'), how: '(ends − 1) × room for one end', trust: 'formula' }),
  ];
}

function reserveLines(made: Made): AnswerLine[] {
  const { piece, plan } = made;
  const { marginWeft } = settingsOf(piece.allowances ?? {}, piece.mode ?? 'straight-warp', piece.beat);
  const yarn = plan.yarns['ground'];
  if (yarn === undefined) return [];
  return [
    stepped('yarns.ground.netMm', { label: 'The cloth itself takes', value: lengthOf(yarn.netMm, 'yarn'), how: 'rows × weft of one row, and tails where a new shuttle begins', trust: 'formula' }),
    { label: 'Reserve on top', value: { kind: 'share', share: marginWeft }, how: piece.beat?.picksPerCm === undefined ? 'so that it suffices in 95 of 100 pieces; rows counted on a swatch need less' : 'so that it suffices in 95 of 100 pieces, with rows counted', trust: 'formula' },
    ...amountLine(made, 'rows-per-load', 'Rows one shuttle weaves'),
    { label: 'Shuttles to fill', value: { kind: 'count', count: yarn.loads, one: 'shuttle', many: 'shuttles' }, how: 'yarn of all rows ÷ yarn on one shuttle', trust: 'practice', step: 'yarns.ground.loads' },
  ];
}

/** Plain cloth by itself: what is wrong with yarn, ends or rows is told here, before anything is woven of them. */
export function plainCloth(cloth: Cloth, reader: FormReader): Made | undefined {
  return makePiece(cloth, { bands: [{ technique: 'tabby', name: 'cloth', yarn: 'ground', fill: true }] }, reader);
}

export function answerCloth(made: Made | undefined, dressed: DressedWarp | undefined, reader: FormReader): Section {
  if (made === undefined || dressed === undefined || !reader.isSound(...NEEDS)) return { ...NO_ANSWER, needs: NEEDS };
  const rows = amountLine(made, 'band.cloth.rows', 'Rows').map(loud);
  return { lines: [...yarnInHand(made, 'ground'), ...rows, ...rowLines(made, dressed, reader.units), ...reserveLines(made)], notes: made.notes, needs: NEEDS, ...workingsOf(made, reader.units) };
}
