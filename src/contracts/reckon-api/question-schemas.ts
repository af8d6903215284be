/** The short questions and their answers. */
import { MEASURES, measuresOfShape, MEASURE_KEYS } from '#contracts/reckon-api/frame-loom-piece-schemas.ts';
import { choice, closed, flag, lengthMm, list, number, ref, text, whole, type Schema } from '#contracts/reckon-api/schema.ts';

const ends = whole('Working ends, doubled ones counted once.', { min: 2, max: 2000 });
const spacingMm = lengthMm('From end to end.');
const wave = (description: string): Schema =>
  closed(description, { lengthMm: number('Along the yarn, between two crossings.'), angleRad: number('Steepest, to the plane of the cloth.'), crimp: number('Length over spacing, less one.') });

export const QUESTION_SCHEMAS: Readonly<Record<string, Schema>> = {
  TakeUpQuestion: closed(
    'How both yarns of a plain weave bend (Peirce 1937).',
    {
      what: { const: 'take-up' },
      warpDiameterMm: lengthMm('Beaten down.'),
      weftDiameterMm: lengthMm('Beaten down.'),
      warpSpacingMm: spacingMm,
      weftSpacingMm: lengthMm('From row to row.'),
      weftWaveMm: number('Height of the weft’s wave where it is known; else the mode decides.', { min: 0, max: 20_000 }),
      mode: choice('`straight-warp` when missing.', 'straight-warp', 'balanced'),
    },
    ['weftWaveMm', 'mode'],
  ),
  TakeUpAnswer: closed('Both yarns between two crossings.', {
    waveMm: closed('Heights the weft’s wave can have.', { min: number('Least.'), max: number('Greatest.') }),
    weft: wave('The weft.'),
    warp: wave('The warp.'),
    warnings: ref('Warnings'),
  }),
  SoumakQuestion: closed('A row of soumak.', {
    what: { const: 'soumak' },
    over: whole('Ends passed over.', { min: 2, max: 100 }),
    back: whole('Ends gone back under, fewer than `over`.', { min: 1, max: 99 }),
    spacingMm,
    diameterSumMm: lengthMm('Warp and weft together, the weft lying free.'),
    ends,
  }),
  SoumakAnswer: closed('Tails apart.', {
    stitchMm: number('Yarn of one stitch.'),
    ratio: number('Yarn over cloth covered.'),
    stitches: whole('In a row.'),
    rowMm: number('Yarn of a row.'),
  }),
  RyaQuestion: closed('Rows of rya knots.', {
    what: { const: 'rya' },
    legEnds: whole('Ends in each leg.', { min: 1, max: 100 }),
    strands: whole('Strands in a knot.', { min: 1, max: 100 }),
    spacingMm,
    warpDiameterMm: lengthMm('Of a working end.'),
    strandLoftMm: lengthMm('One strand lying free.'),
    pileMm: lengthMm('How far the pile hangs.'),
    trimMm: number('To be trimmed away.', { min: 0, max: 1000 }),
    ends,
    edgeEnds: whole('Plain ends at each edge.', { min: 0, max: 1000 }),
    rows: whole('Rows.', { min: 1, max: 10_000 }),
    cardThicknessMm: lengthMm('Of the winding card.', 100),
  }),
  RyaAnswer: closed('Strands, and the card they are cut on.', {
    bundleMm: number('The strands of a knot lying together.'),
    wrapMm: number('What the knot itself takes of a strand.'),
    cutMm: number('Length to cut each strand.'),
    knotsPerRow: whole('Knots in a row.', { min: 1 }),
    strands: whole('Strands of all rows.'),
    yarnMm: number('Yarn of all rows.'),
    cardMm: number('Width of a card cut along one edge, rounded up to 5 mm.'),
    cardExactMm: number('The same before rounding.'),
  }),
  ShapeQuestion: closed(
    'A shape in whole ends and rows.',
    {
      what: { const: 'shape' },
      ...MEASURES,
      spacingMm,
      pickSpacingMm: lengthMm('From row to row.'),
      ends: { ...ends, description: 'Working ends of the whole cloth.' },
      symmetric: flag('Steps alike on both sides; of points only false, or left out.'),
    },
    [...MEASURE_KEYS, 'symmetric'],
    measuresOfShape({ const: false }, ['symmetric']),
  ),
  ShapeAnswer: closed('The shape as it can be woven.', {
    rows: whole('Rows.', { min: 0 }),
    widths: list('Ends in each row, from the first.', whole('Ends.', { min: 0 })),
    areas: list('Of points: each row’s areas from the left.', list('Areas.', ref('EndRun'))),
    endsTotal: whole('Of all rows.', { min: 0 }),
    areaMm2: number('Of the stepped shape.'),
    trueAreaMm2: number('Of the shape as it was asked.'),
  }, ['areas']),
  EndRun: closed('Ends side by side.', { start: whole('From the left edge of the box round the points.', { min: 0 }), ends: whole('How many.', { min: 1 }) }),
  LengthTextQuestion: closed('A length as makers write it.', {
    what: { const: 'length-text' },
    mm: number('The length.', { min: 0, max: 1e9 }),
    system: choice('Sixteenths of an inch, or whole millimetres.', 'imperial', 'metric'),
    round: choice('`up` for least sizes.', 'nearest', 'up'),
  }),
  LengthTextAnswer: closed('Without unit.', { text: text('Such as 5 7/16.') }),
};
