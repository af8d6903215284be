/** How much yarn a plain stretch takes: how rows lie, how far the weft bends, and what to have in hand. */
import { amountOf } from '#core/craft/amounts.ts';
import type { DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import { settingsOf } from '#core/craft/frame-loom/settings.ts';
import { lengthOf, type Amount } from '#core/craft/amounts/amount-types.ts';
import { loud, NO_ANSWER, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import { ROW_FIELDS, SETT_FIELDS, YARN_FIELDS } from '#core/reckoner/read-fields.ts';
import { makePiece, type Cloth, type Made } from '#core/reckoner/small-piece.ts';
import { reckon } from '#core/craft/reckon.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import type { Units } from '#core/units/units.ts';

const NEEDS = [...YARN_FIELDS, ...SETT_FIELDS, ...ROW_FIELDS] as const;

/** An amount of the plan by its key, under a name of this page. */
export function amountLine({ piece, plan }: Made, key: string, label: string): AnswerLine[] {
  const amount = amountOf(key, piece, plan);
  if (!amount.ok) return [];
  const { howReckoned, ...value }: Amount = amount.value;
  return [{ label, value, how: howReckoned.formula, trust: howReckoned.trust }];
}

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
  const trust = piece.beat.picksPerCm === undefined ? 'formula' : 'measured';
  const ofWarp = warpCrimp(made, dressed);
  const perUnit = units === 'in' ? { value: MM_PER_INCH / weft.pickSpacingMm, unit: 'to the inch' } : { value: 10 / weft.pickSpacingMm, unit: 'to the cm' };
  return [
    { label: 'Rows lie', value: { kind: 'number', ...perUnit }, how: trust === 'measured' ? 'as you counted on the swatch' : 'rows in one thickness of the yarn ÷ its thickness beaten down', trust },
    ...amountLine(made, 'pick', 'Weft of one row'),
    { label: 'Take-up of the weft', value: { kind: 'share', share: weft.crimp }, how: 'how much longer the weft is than its straight way from end to end (Peirce)', trust: 'formula' },
    ...(ofWarp === undefined ? [] : [{ label: 'Take-up of the warp', value: { kind: 'share', share: ofWarp }, how: piece.mode === 'balanced' ? 'as the weft, where both bend alike (Peirce)' : 'none, where the warp is stretched straight', trust: 'formula' } as const]),
    { label: 'Straight across', value: lengthOf(ends.woundWidthMm, 'size'), how: '(ends − 1) × room for one end', trust: 'formula' },
  ];
}

function reserveLines(made: Made): AnswerLine[] {
  const { piece, plan } = made;
  const { marginWeft } = settingsOf(piece.allowances ?? {}, piece.mode ?? 'straight-warp', piece.beat);
  const yarn = plan.yarns['ground'];
  if (yarn === undefined) return [];
  return [
    { label: 'The cloth itself takes', value: lengthOf(yarn.netMm, 'yarn'), how: 'rows × weft of one row, and tails where a new shuttle begins', trust: 'formula' },
    { label: 'Reserve on top', value: { kind: 'share', share: marginWeft }, how: piece.beat.picksPerCm === undefined ? 'so that it suffices in 95 of 100 pieces; rows counted on a swatch need less' : 'so that it suffices in 95 of 100 pieces, with rows counted', trust: 'formula' },
    ...amountLine(made, 'rows-per-load', 'Rows one shuttle weaves'),
    { label: 'Shuttles to fill', value: { kind: 'count', count: yarn.loads, one: 'shuttle', many: 'shuttles' }, how: 'yarn of all rows ÷ yarn on one shuttle', trust: 'class' },
  ];
}

/** Plain cloth by itself: what is wrong with yarn, ends or rows is told here, before anything is woven of them. */
export function plainCloth(cloth: Cloth, reader: FormReader): Made | undefined {
  return makePiece(cloth, { bands: [{ technique: 'tabby', name: 'cloth', yarn: 'ground', fill: true }] }, reader);
}

export function answerCloth(made: Made | undefined, dressed: DressedWarp | undefined, reader: FormReader): Section {
  if (made === undefined || dressed === undefined || !reader.isSound(...NEEDS)) return { ...NO_ANSWER, needs: NEEDS };
  const rows = amountLine(made, 'band.cloth.rows', 'Rows').map(loud);
  return { lines: [...yarnInHand(made, 'ground'), ...rows, ...rowLines(made, dressed, reader.units), ...reserveLines(made)], notes: made.notes, needs: NEEDS };
}
