/** Reading a shape of a tabby band. */
import type { Shape, ShapeMeasures, ShapePoint } from '#core/craft/piece.ts';
import { Fields, type NumberRule } from '#core/craft/reading/fields.ts';
import { below } from '#core/craft/reading/findings.ts';
import { present } from '#core/craft/reading/present.ts';
import { LONGEST_MM, readRole } from '#core/craft/techniques/read-rules.ts';

const KINDS = ['triangle', 'rectangle', 'circle', 'points'] as const;
const JOINS = ['slit', 'dovetail', 'interlock'] as const;

export const BASE: NumberRule = { name: 'Base of the shape', min: 'over-zero', max: LONGEST_MM, unit: 'mm' };
export const SHAPE_HEIGHT: NumberRule = { name: 'Height of the shape', min: 'over-zero', max: LONGEST_MM, unit: 'mm' };
export const RADIUS: NumberRule = { name: 'Radius of the circle', min: 'over-zero', max: LONGEST_MM / 2, unit: 'mm' };
const CENTRE: NumberRule = { name: 'Middle of the shape', min: 0, max: LONGEST_MM, unit: 'mm' };
const BOTTOM: NumberRule = { name: 'Foot of the shape', min: 0, max: LONGEST_MM, unit: 'mm' };
const ACROSS: NumberRule = { name: 'A point’s place across', min: -LONGEST_MM, max: LONGEST_MM, unit: 'mm' };
const UPWARDS: NumberRule = { name: 'A point’s height', min: -LONGEST_MM, max: LONGEST_MM, unit: 'mm' };
/** More corners than a hand can step. */
const MOST_POINTS = 200;
const LEAN: NumberRule = { name: 'Lean', min: -LONGEST_MM, max: LONGEST_MM, unit: 'mm' };

function readPoints(fields: Fields): readonly ShapePoint[] {
  const path = fields.pathOf('points');
  const points = fields.findings.soundly(() =>
    fields.list('points', 'Points', MOST_POINTS).map((value, index) => {
      const point = Fields.of(value, below(path, index), 'A point', fields.findings);
      const read = { xMm: point.number('xMm', ACROSS), yMm: point.number('yMm', UPWARDS) };
      point.end();
      return read;
    }),
  );
  if (points === undefined) return [];
  if (points.length < 3) fields.reject('E_RANGE', 'points', 'Three points at least go round an area.');
  else if (inOneLine(points)) fields.reject('E_RANGE', 'points', 'These points lie in one line and go round nothing. Set one of them aside of it.');
  return points;
}

function inOneLine(points: readonly ShapePoint[]): boolean {
  const [first] = points;
  if (first === undefined) return true;
  const ways = points.map(({ xMm, yMm }) => ({ x: xMm - first.xMm, y: yMm - first.yMm }));
  const along = ways.find(({ x, y }) => x !== 0 || y !== 0);
  return along === undefined || ways.every(({ x, y }) => x * along.y - y * along.x === 0);
}

/** The measures a kind of shape needs; those of another kind are left to be refused as unknown. */
export function readMeasures(fields: Fields): ShapeMeasures {
  const shape = fields.findings.soundly(() => fields.choice('shape', 'Shape', KINDS));
  if (shape === undefined) {
    // Which measures belong to it cannot be said, so none of them is complained about.
    for (const key of ['baseMm', 'heightMm', 'radiusMm', 'points']) fields.take(key);
    return { shape: 'circle', radiusMm: 0 };
  }
  if (shape === 'points') return { shape, points: readPoints(fields) };
  if (shape === 'circle') return { shape, radiusMm: fields.number('radiusMm', RADIUS) };
  return { shape, baseMm: fields.number('baseMm', BASE), heightMm: fields.number('heightMm', SHAPE_HEIGHT) };
}

export function readShape(fields: Fields): Shape {
  const measures = readMeasures(fields);
  const shape = {
    ...measures,
    yarn: readRole(fields),
    ...present({
      centreMm: fields.optionalNumber('centreMm', CENTRE),
      bottomMm: fields.optionalNumber('bottomMm', BOTTOM),
      leanMm: fields.optionalNumber('leanMm', LEAN),
      // Points are as alike on both sides as they were drawn.
      symmetric: measures.shape === 'points' ? undefined : fields.optionalFlag('symmetric', 'Symmetric'),
      join: fields.optionalChoice('join', 'Join', JOINS),
    }),
  };
  fields.end();
  return shape;
}
