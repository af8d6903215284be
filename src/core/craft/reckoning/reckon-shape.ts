/** A shape in whole ends and rows. */
import type { ShapeMeasures } from '#core/craft/piece.ts';
import type { Fields } from '#core/craft/reading/fields.ts';
import { PICK_SPACING, SPACING, WORKING_ENDS } from '#core/craft/reckoning/rules.ts';
import { runsOfPoints, type EndRun } from '#core/craft/points-shape.ts';
import { rowsOfShape, stepShape, trueArea, widthKeyOf, widthOfShape, type ShapeGrid } from '#core/craft/shapes.ts';
import { readMeasures } from '#core/craft/techniques/read-shape.ts';

export interface ShapeAnswer {
  readonly rows: number;
  /** Ends in each row, from the first. */
  readonly widths: readonly number[];
  /** Of a shape drawn by points, each row's areas from the left: ends from the shape's left edge, and ends across. */
  readonly areas?: readonly (readonly EndRun[])[];
  readonly endsTotal: number;
  /** Of the stepped shape. */
  readonly areaMm2: number;
  readonly trueAreaMm2: number;
}

const MOST_ROWS = 20_000;

/** Points step as they are drawn: they may be said not to be made alike on both sides, and nothing else. */
function readAsDrawn(fields: Fields): false {
  if (fields.optionalFlag('symmetric', 'Symmetric') === true) {
    fields.reject('E_ENUM', 'symmetric', 'Points are woven as they are drawn, so both sides cannot be made alike. Leave this out, or say false.');
  }
  return false;
}

export interface ShapeQuestion extends ShapeGrid {
  readonly measures: ShapeMeasures;
}

export function readShapeQuestion(fields: Fields): ShapeQuestion | undefined {
  const read = fields.findings.soundly(() => {
    const measures = readMeasures(fields);
    return {
      measures,
      spacingMm: fields.number('spacingMm', SPACING),
      pickSpacingMm: fields.number('pickSpacingMm', PICK_SPACING),
      ends: fields.number('ends', WORKING_ENDS),
      symmetric: measures.shape === 'points' ? readAsDrawn(fields) : fields.flag('symmetric', 'Symmetric'),
    };
  });
  fields.end();
  return read;
}

export function answerShape({ measures, ...grid }: ShapeQuestion, fields: Fields): ShapeAnswer | undefined {
  const rows = rowsOfShape(measures, grid.pickSpacingMm);
  if (rows > MOST_ROWS) {
    fields.reject('E_RANGE', 'pickSpacingMm', `That would be ${String(rows)} rows. Up to ${String(MOST_ROWS)} work.`);
    return undefined;
  }
  if (widthOfShape(measures) / grid.spacingMm > grid.ends + 0.5) {
    fields.reject('E_FIT', widthKeyOf(measures), `The shape is wider than the cloth, which takes ${fields.findings.length(grid.ends * grid.spacingMm)}.`);
    return undefined;
  }
  const { widths } = stepShape(measures, grid);
  const endsTotal = widths.reduce((sum, width) => sum + width, 0);
  const areas = measures.shape === 'points' ? { areas: runsOfPoints(measures.points, { ...grid, rows, leftEnds: () => 0 }) } : {};
  return { rows, widths, ...areas, endsTotal, areaMm2: endsTotal * grid.spacingMm * grid.pickSpacingMm, trueAreaMm2: trueArea(measures) };
}

export function reckonShape(fields: Fields): ShapeAnswer | undefined {
  const read = readShapeQuestion(fields);
  return read && answerShape(read, fields);
}
