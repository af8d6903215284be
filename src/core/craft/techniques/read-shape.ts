/** Reading a shape of a tabby band. */
import type { Shape, ShapeMeasures } from '#core/craft/piece.ts';
import type { Fields, NumberRule } from '#core/craft/reading/fields.ts';
import { present } from '#core/craft/reading/present.ts';
import { LONGEST_MM, readRole } from '#core/craft/techniques/read-rules.ts';

const KINDS = ['triangle', 'rectangle', 'circle'] as const;
const JOINS = ['slit', 'dovetail', 'interlock'] as const;

export const BASE: NumberRule = { name: 'Base of the shape', min: 'over-zero', max: LONGEST_MM, unit: 'mm' };
export const SHAPE_HEIGHT: NumberRule = { name: 'Height of the shape', min: 'over-zero', max: LONGEST_MM, unit: 'mm' };
export const RADIUS: NumberRule = { name: 'Radius of the circle', min: 'over-zero', max: LONGEST_MM / 2, unit: 'mm' };
const CENTRE: NumberRule = { name: 'Middle of the shape', min: 0, max: LONGEST_MM, unit: 'mm' };
const BOTTOM: NumberRule = { name: 'Foot of the shape', min: 0, max: LONGEST_MM, unit: 'mm' };
const LEAN: NumberRule = { name: 'Lean', min: -LONGEST_MM, max: LONGEST_MM, unit: 'mm' };

/** The measures a kind of shape needs; those of another kind are left to be refused as unknown. */
export function readMeasures(fields: Fields): ShapeMeasures {
  const shape = fields.findings.soundly(() => fields.choice('shape', 'Shape', KINDS));
  if (shape === undefined) {
    // Which measures belong to it cannot be said, so none of them is complained about.
    for (const key of ['baseMm', 'heightMm', 'radiusMm']) fields.take(key);
    return { shape: 'circle', radiusMm: 0 };
  }
  if (shape === 'circle') return { shape, radiusMm: fields.number('radiusMm', RADIUS) };
  return { shape, baseMm: fields.number('baseMm', BASE), heightMm: fields.number('heightMm', SHAPE_HEIGHT) };
}

export function readShape(fields: Fields): Shape {
  const shape = {
    ...readMeasures(fields),
    yarn: readRole(fields),
    ...present({
      centreMm: fields.optionalNumber('centreMm', CENTRE),
      bottomMm: fields.optionalNumber('bottomMm', BOTTOM),
      leanMm: fields.optionalNumber('leanMm', LEAN),
      symmetric: fields.optionalFlag('symmetric', 'Symmetric'),
      join: fields.optionalChoice('join', 'Join', JOINS),
    }),
  };
  fields.end();
  return shape;
}
