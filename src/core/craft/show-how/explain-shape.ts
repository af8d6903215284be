/** A shape stepped out in whole ends and rows. */
import type { ShapeMeasures, ShapePoint } from '#core/craft/piece.ts';
import { stripsOfPoints } from '#core/craft/points-shape.ts';
import { below } from '#core/craft/reading/findings.ts';
import { rowsOfShape, stepShape, trueArea, widthOfShape, type ShapeGrid } from '#core/craft/shapes.ts';
import { from, given, type Notebook, type Standing } from '#core/craft/show-how/notebook.ts';
import { RULES } from '#core/craft/show-how/sources.ts';
import type { Working, WorkingInput } from '#core/craft/show-how/working.ts';

interface ShapeInputs {
  /** Where the shape's measures stand in what was asked. */
  readonly path: string;
  readonly p: WorkingInput;
  readonly p2: WorkingInput;
  readonly E: WorkingInput;
}

interface Measured {
  readonly inputs: readonly WorkingInput[];
  /** Over `inputs`. */
  readonly height: string;
  readonly width: string;
  readonly area: string;
}

const list = (symbol: string, name: string, value: readonly number[], source: Standing): WorkingInput => ({ symbol, name, value, unit: 'mm', ...source });

function measuredByPoints(points: readonly ShapePoint[]): Measured {
  const strips = stripsOfPoints(points);
  return {
    inputs: [
      list('x', 'places of the points across', points.map(({ xMm }) => xMm), RULES.asGiven),
      list('y', 'heights of the points', points.map(({ yMm }) => yMm), RULES.asGiven),
      list('w', 'widths inside, half way up each strip between corners', strips.map(({ insideMm }) => insideMm), RULES.evenOdd),
      list('h', 'heights of these strips', strips.map(({ heightMm }) => heightMm), RULES.evenOdd),
    ],
    height: '(max(y) - min(y))', width: '(max(x) - min(x))', area: 'dot(w, h)',
  };
}

function measuredOf(measures: ShapeMeasures, path: string): Measured {
  if (measures.shape === 'points') return measuredByPoints(measures.points);
  const asked = (symbol: string, name: string, value: number, key: string): WorkingInput => given({ symbol, name, value, unit: 'mm' }, below(path, key), 'counted');
  if (measures.shape === 'circle') {
    return { inputs: [asked('R', 'radius', measures.radiusMm, 'radiusMm')], height: '2 * R', width: '2 * R', area: 'pi * R^2' };
  }
  const inputs = [asked('B', 'base', measures.baseMm, 'baseMm'), asked('H', 'height', measures.heightMm, 'heightMm')];
  return { inputs, height: 'H', width: 'B', area: measures.shape === 'triangle' ? 'B * H / 2' : 'B * H' };
}

/** Ends of row j of N before they are whole. */
const IDEAL: Readonly<Record<Exclude<ShapeMeasures['shape'], 'points'>, string>> = {
  rectangle: 'B / p',
  triangle: 'B / p * (1 - (j - 0.5) / N)',
  circle: '2 * sqrt(max(0, R^2 - ((j - 0.5) * p2 - R)^2)) / p',
};

function wholeWidth(ideal: string, symmetric: boolean): string {
  return symmetric ? `max(0, 2 * floor((${ideal} - mod(E, 2)) / 2 + 0.5 + 1e-9) + mod(E, 2))` : `max(0, floor(${ideal} + 0.5 + 1e-9))`;
}

const usedIn = (formula: string, inputs: readonly WorkingInput[]): readonly WorkingInput[] =>
  inputs.filter(({ symbol }) => new RegExp(`\\b${symbol}\\b`, 'u').test(formula));

/** Row by row from the measures; of points, the ends counted where the rows cross them. */
function endsFormula({ shape }: ShapeMeasures, symmetric: boolean, widths: readonly number[], inputs: readonly WorkingInput[]): Pick<Working, 'formula' | 'inputs'> {
  if (shape === 'points') return { formula: widths.length === 0 ? '0' : 'sum(n)', inputs: widths.length === 0 ? [] : [{ ...list('n', 'ends of each row', widths, RULES.drawnRows), unit: 'count' }] };
  const formula = `sum(map(1:N, f(j) = ${wholeWidth(IDEAL[shape], symmetric)}))`;
  return { formula, inputs: usedIn(formula, inputs) };
}

/** Rows, ends and both areas. */
export function noteShape(book: Notebook, prefix: string, measures: ShapeMeasures, grid: ShapeGrid, { path, p, p2, E }: ShapeInputs): { readonly rows: Working } {
  const { inputs, height, width, area } = measuredOf(measures, path);
  const used = (formula: string): readonly WorkingInput[] => usedIn(formula, inputs);
  const { widths } = stepShape(measures, grid);
  const rows = book.note({
    id: `${prefix}rows`, name: 'rows of the shape', formula: `floor(${height} / p2 + 0.5 + 1e-9)`, inputs: [...used(height), p2],
    value: rowsOfShape(measures, grid.pickSpacingMm), unit: 'count', ...RULES.wholeNumbers,
  });
  book.note({
    id: `${prefix}baseEnds`, name: 'greatest width of the shape in ends', formula: `${width} / p`, inputs: [...used(width), p],
    value: widthOfShape(measures) / grid.spacingMm, unit: 'ratio', ...RULES.shapes,
  });
  const ends = book.note({
    id: `${prefix}endsTotal`, name: 'ends of all rows of the shape', ...endsFormula(measures, grid.symmetric, widths, [from('N', rows), ...inputs, p, p2, E]),
    value: widths.reduce((sum, own) => sum + own, 0), unit: 'count', ...RULES.shapes,
  });
  book.note({
    id: `${prefix}areaMm2`, name: 'area of the shape as it is stepped', formula: 'n * p * p2', inputs: [from('n', ends), p, p2],
    value: ends.value * grid.spacingMm * grid.pickSpacingMm, unit: 'mm2', ...RULES.shapes,
  });
  book.note({ id: `${prefix}trueAreaMm2`, name: 'area of the true shape', formula: area, inputs: used(area), value: trueArea(measures), unit: 'mm2', ...RULES.euclid });
  return { rows };
}
