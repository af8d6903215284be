/** A shape in whole ends and rows. */
import type { Fields } from '#core/craft/reading/fields.ts';
import { PICK_SPACING, SPACING, WORKING_ENDS } from '#core/craft/reckoning/rules.ts';
import { rowsOfShape, stepShape, trueArea, widthOfShape } from '#core/craft/shapes.ts';
import { readMeasures } from '#core/craft/techniques/read-shape.ts';

export interface ShapeAnswer {
  readonly rows: number;
  /** Ends in each row, from the first. */
  readonly widths: readonly number[];
  readonly endsTotal: number;
  /** Of the stepped shape. */
  readonly areaMm2: number;
  readonly trueAreaMm2: number;
}

const MOST_ROWS = 20_000;

export function reckonShape(fields: Fields): ShapeAnswer | undefined {
  const { findings } = fields;
  const read = findings.soundly(() => ({
    measures: readMeasures(fields),
    spacingMm: fields.number('spacingMm', SPACING),
    pickSpacingMm: fields.number('pickSpacingMm', PICK_SPACING),
    ends: fields.number('ends', WORKING_ENDS),
    symmetric: fields.flag('symmetric', 'Symmetric'),
  }));
  fields.end();
  if (read === undefined) return undefined;
  const { measures, ...grid } = read;
  const widthKey = measures.shape === 'circle' ? 'radiusMm' : 'baseMm';
  const rows = rowsOfShape(measures, grid.pickSpacingMm);
  if (rows > MOST_ROWS) {
    fields.reject('E_RANGE', 'pickSpacingMm', `That would be ${String(rows)} rows. Up to ${String(MOST_ROWS)} work.`);
    return undefined;
  }
  if (widthOfShape(measures) / grid.spacingMm > grid.ends + 0.5) {
    fields.reject('E_FIT', widthKey, `The shape is wider than the cloth, which takes ${findings.length(grid.ends * grid.spacingMm)}.`);
    return undefined;
  }
  const { widths } = stepShape(measures, grid);
  const endsTotal = widths.reduce((sum, width) => sum + width, 0);
  return { rows, widths, endsTotal, areaMm2: endsTotal * grid.spacingMm * grid.pickSpacingMm, trueAreaMm2: trueArea(measures) };
}
