/** A shape stepped out in whole ends and rows, to be woven row by row; or the slope of a stepped edge. */
import { countOf } from '#core/craft/amounts/amount-types.ts';
import { reckon } from '#core/craft/reckon.ts';
import type { ShapeAnswer } from '#core/craft/reckoning/reckon-shape.ts';
import type { DressedWarp } from '#core/craft/frame-loom/dress-loom.ts';
import { explainShape } from '#core/craft/show-how/explain.ts';
import { slopeAngle } from '#core/craft/shapes.ts';
import { loud, NO_ANSWER, stepped, written, type AnswerLine, type Section } from '#core/reckoner/answer-line.ts';
import { drawRows, type RowsDrawing } from '#core/reckoner/draw-rows.ts';
import { SHAPE_KEYS } from '#core/reckoner/field-of-path.ts';
import type { FormReader } from '#core/reckoner/form-reader.ts';
import { ROW_FIELDS, SETT_FIELDS, YARN_FIELDS } from '#core/reckoner/read-fields.ts';
import type { ReckonerField } from '#core/reckoner/reckoner-form.ts';
import { MM_PER_INCH } from '#core/units/inches.ts';
import type { Units } from '#core/units/units.ts';

/** Rows that take the same ends, counted from 1. */
export interface RunOfRows {
  readonly first: number;
  readonly last: number;
  readonly ends: number;
}

export interface ShapeSection extends Section {
  readonly drawing?: RowsDrawing;
  readonly runs?: readonly RunOfRows[];
}

export const SHAPES = [
  { value: 'triangle', label: 'Triangle' },
  { value: 'rectangle', label: 'Rectangle' },
  { value: 'circle', label: 'Circle' },
  { value: 'slope', label: 'Slope' },
] as const;

/** What a shape is laid on. */
export interface ShapeGround {
  readonly dressed: DressedWarp;
  readonly pickSpacingMm: number;
}

const BASE_NEEDS = [...YARN_FIELDS, ...SETT_FIELDS, ...ROW_FIELDS] as const;

export function runsOf(widths: readonly number[]): readonly RunOfRows[] {
  const runs: RunOfRows[] = [];
  widths.forEach((ends, index) => {
    const before = runs.at(-1);
    if (before?.ends === ends) runs[runs.length - 1] = { ...before, last: index + 1 };
    else runs.push({ first: index + 1, last: index + 1, ends });
  });
  return runs;
}

function area(mm2: number, units: Units): AnswerLine['value'] {
  return units === 'in' ? { kind: 'number', value: mm2 / MM_PER_INCH ** 2, unit: 'sq in' } : { kind: 'number', value: mm2 / 100, unit: 'cm²' };
}

function shapeLines(shape: ShapeAnswer, units: Units): AnswerLine[] {
  return [
    stepped('rows', loud({ label: 'Rows', value: countOf(shape.rows, 'row', 'rows'), how: 'height ÷ room for one row, to the nearest', trust: 'formula' })),
    loud({ label: 'First row', value: countOf(shape.widths[0] ?? 0, 'end', 'ends'), how: 'width of the shape in that row ÷ room for one end, to the nearest', trust: 'formula' }),
    loud({ label: 'Widest row', value: countOf(Math.max(0, ...shape.widths), 'end', 'ends'), how: 'the most of all rows', trust: 'formula' }),
    stepped('endsTotal', { label: 'Ends of all rows', value: countOf(shape.endsTotal, 'end', 'ends'), how: 'added up, row by row', trust: 'formula' }),
    stepped('areaMm2', { label: 'Area as stepped', value: area(shape.areaMm2, units), how: 'ends of all rows × room for one end × room for one row', trust: 'formula' }),
    stepped('trueAreaMm2', { label: 'Area as asked', value: area(shape.trueAreaMm2, units), how: 'of the shape itself', trust: 'formula' }),
  ];
}

/** Steps drawn of a slope. */
const STEPS_DRAWN = 8;

function answerSlope({ dressed, pickSpacingMm }: ShapeGround, reader: FormReader): ShapeSection {
  const needs = [...BASE_NEEDS, 'step-ends', 'step-rows'] as const;
  const ends = reader.number('step-ends', 'Ends of a step');
  const rows = reader.number('step-rows', 'Rows of a step');
  for (const [field, value] of [['step-ends', ends], ['step-rows', rows]] as const) {
    if (value !== undefined && (!Number.isInteger(value) || value < 1 || value > 100)) reader.refuse(field, 'A step is a whole number from 1 to 100.');
  }
  if (ends === undefined || rows === undefined || !reader.isSound(...needs)) return { ...NO_ANSWER, needs };
  const grid = { spacingMm: dressed.ends.spacingMm, pickSpacingMm };
  const angle = (slopeAngle(ends, rows, grid) * 180) / Math.PI;
  const widths = Array.from({ length: STEPS_DRAWN * rows }, (_, row) => (STEPS_DRAWN - Math.floor(row / rows)) * ends);
  return {
    lines: [
      loud({ label: 'The edge leans by', value: { kind: 'number', value: angle, unit: '°' }, how: 'from upright: width of a step over its height', trust: 'formula' }),
      { label: 'From level', value: { kind: 'number', value: 90 - angle, unit: '°' }, how: 'the rest of a right angle', trust: 'formula' },
    ],
    notes: [],
    needs,
    drawing: drawRows(widths, { ...grid, ends: STEPS_DRAWN * ends, aligned: 'left' }),
  };
}

/** The measures a kind of shape needs, as the question names them. */
function readMeasures(shape: 'triangle' | 'rectangle' | 'circle', reader: FormReader): { readonly needs: readonly ReckonerField[]; readonly measures: object | undefined } {
  if (shape === 'circle') {
    const radiusMm = reader.length('radius', 'Radius');
    return { needs: ['radius'], measures: radiusMm === undefined ? undefined : { radiusMm } };
  }
  const baseMm = reader.length('base', shape === 'triangle' ? 'Base' : 'Width of the shape');
  const heightMm = reader.length('shape-height', 'Height of the shape');
  return { needs: ['base', 'shape-height'], measures: baseMm === undefined || heightMm === undefined ? undefined : { baseMm, heightMm } };
}

export function answerShape(ground: ShapeGround | undefined, reader: FormReader): ShapeSection {
  const shape = reader.choice('shape', ['triangle', 'rectangle', 'circle', 'slope']);
  if (ground === undefined || !reader.isSound(...BASE_NEEDS)) return { ...NO_ANSWER, needs: BASE_NEEDS };
  if (shape === 'slope') return answerSlope(ground, reader);
  const { needs: ofShape, measures } = readMeasures(shape, reader);
  const needs = [...BASE_NEEDS, ...ofShape];
  if (measures === undefined) return { ...NO_ANSWER, needs };
  const { dressed: { ends }, pickSpacingMm } = ground;
  const symmetric = reader.choice('sides', ['alike', 'freely']) === 'alike';
  const question = { what: 'shape', shape, ...measures, spacingMm: ends.spacingMm, pickSpacingMm, ends: ends.working, symmetric };
  const outcome = reckon(question, reader.units);
  if (!outcome.ok) {
    for (const { path, message } of outcome.problems) reader.refuse(SHAPE_KEYS[path.slice(1)] ?? 'base', message);
    return { ...NO_ANSWER, needs };
  }
  if (!('widths' in outcome.value) || !reader.isSound(...needs)) return { ...NO_ANSWER, needs };
  const drawing = drawRows(outcome.value.widths, { spacingMm: ends.spacingMm, pickSpacingMm, ends: ends.working, aligned: 'middle' });
  return { lines: shapeLines(outcome.value, reader.units), notes: [], needs, drawing, runs: runsOf(outcome.value.widths), asked: [question, reader.units], workings: () => written(explainShape(question, reader.units)) };
}
