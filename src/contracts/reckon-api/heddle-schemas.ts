/** A cloth on a rigid heddle as it is asked about, and its plan. */
import { closed, count, lengthMm, mm, number, ref, whole, type Schema } from '#contracts/reckon-api/schema.ts';
import { CAUTIONS, EVERY_PLAN } from '#contracts/reckon-api/shared-schemas.ts';

const share = (description: string, max: number): Schema => number(description, { min: 0, max });
const room = (description: string): Schema => number(description, { min: 0, max: 5000 });

const ALLOWANCES: Readonly<Record<string, Schema>> = {
  drawIn: number('Share by which the cloth draws in; 0.08.', { min: 0, below: 0.4 }),
  widthShrinkage: share('Of the width in washing; 0.1.', 0.5),
  lengthShrinkage: share('Of the length in washing; 0.1.', 0.5),
  takeUp: share('Of the warp; 0.1.', 0.6),
  fringeMm: room('At both ends together; 0.'),
  gapMm: room('Between two pieces; 0.'),
  wasteMm: room('What the loom keeps; 610.'),
  margin: share('Share bought on top; 0.1.', 1),
};

export const HEDDLE_SCHEMAS: Readonly<Record<string, Schema>> = {
  HeddlePiece: closed('A plain cloth on a rigid heddle, in millimetres. Shares are fractions.', {
    craft: { const: 'rigid-heddle' },
    size: closed('Finished: woven, washed, without fringe.', { widthMm: lengthMm('Width.'), lengthMm: lengthMm('Length.') }),
    heddle: closed('The heddle.', { spacingMm: number('From end to end; 2.54 is ten to the inch.', { min: 0.5, max: 25 }), widthMm: lengthMm('What it holds. Not looked at when missing.', 3000) }, ['widthMm']),
    yarns: closed('Both yarns.', { warp: ref('Yarn'), weft: ref('Yarn') }),
    picksPerCm: number('Rows in a centimetre of the finished cloth.', { above: 0, max: 100 }),
    pieces: whole('Woven after each other on one warp; 1 when missing.', { min: 1, max: 100 }),
    allowances: closed('Each with its default.', ALLOWANCES, Object.keys(ALLOWANCES)),
  }, ['pieces', 'allowances']),
  HeddlePlan: closed('Everything such a cloth takes.', {
    craft: { const: 'rigid-heddle' },
    ends: closed('Warp ends.', { count: count('Ends.'), raw: number('Ends the width asks for, before rounding.'), widthInHeddleMm: mm('Width in the heddle.') }),
    warpEndMm: mm('Length of one end.'),
    picks: count('Rows of all pieces.'),
    weft: closed('One row.', { crimp: number('How much longer the weft is than its straight way.'), stepMm: mm('Weft from end to end.'), turnMm: mm('Weft round a selvedge.'), pickMm: mm('Weft of one row.') }),
    yarns: closed('Both yarns.', { warp: ref('WarpPlan'), weft: ref('WarpPlan') }),
    cautions: CAUTIONS,
    ...EVERY_PLAN,
  }),
};
