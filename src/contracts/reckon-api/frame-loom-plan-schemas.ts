/** The plan of a piece woven on a frame as it is answered. Lengths are millimetres, masses grams, time hours; nothing is rounded but counts. */
import { choice, closed, count, list, mm, number, ref, type Schema } from '#contracts/reckon-api/schema.ts';
import { BOUGHT, EVERY_PLAN } from '#contracts/reckon-api/shared-schemas.ts';

export const FRAME_LOOM_PLAN_SCHEMAS: Readonly<Record<string, Schema>> = {
  YarnPlan: closed('Weft yarn of one role.', { ...BOUGHT, loads: count('Shuttles or butterflies to fill.'), rowsPerLoad: count('Rows one of them weaves.') }, ['balls']),
  BandPlan: closed(
    'One band.',
    {
      index: count('Its place in the piece, from 0.'),
      technique: choice('Its technique.', 'tabby', 'soumak', 'rya', 'roving', 'hem-stitch', 'loop-pile', 'twining'),
      heightMm: mm('Height in the finished piece.'),
      picks: count('Rows of tabby.'),
      stitches: count('Stitches.'),
      knots: count('Knots.'),
      strands: count('Strands to cut.'),
      cutMm: mm('Length to cut each strand.'),
      yarnMm: { type: 'object', description: 'Yarn by role.', additionalProperties: mm('Length.') },
    },
    ['picks', 'stitches', 'knots', 'strands', 'cutMm'],
  ),
  FrameLoomPlan: closed('Everything a piece woven on a frame takes.', {
    ends: closed('Warp ends and nails.', {
      count: count('Ends on the loom.'),
      working: count('What the weft takes as one.'),
      raw: number('Ends the width asks for, before rounding and parity.'),
      spacingMm: mm('From working end to working end.'),
      nailsTop: count('Nails used above.'),
      nailsBottom: count('Nails used below.'),
      woundWidthMm: mm('From the first end to the last.'),
      loomWidthMm: mm('Of the cloth before it draws in.'),
    }),
    loom: closed('What the loom must hold.', {
      insideWidthNeededMm: mm('Clear rail.'),
      heightOnLoomMm: mm('Of the cloth on the loom.'),
      heightNeededMm: mm('Cloth and unwoven warp.'),
      topMm: mm('Unwoven above.'),
      bottomMm: mm('Unwoven below.'),
      firstGapsMm: closed('Between bare ends where the first row comes to lie, by turns.', { narrow: mm('The narrow ones.'), wide: mm('The wide ones.') }),
      spacingRows: closed('Rows of twining or scrap at each edge that set the ends even.', { fewest: count('At least.'), most: count('At most.') }),
    }),
    weft: closed('Of the yarn most rows are woven with.', {
      diameterSumMm: mm('Both yarns together, beaten down.'),
      pickSpacingMm: mm('From row to row.'),
      tightness: number('Both yarns over the room between ends.'),
      crimp: number('How much longer the weft is than its straight way.'),
      stepMm: mm('Weft from end to end.'),
      turnMm: mm('Weft round a selvedge.'),
      pickMm: mm('Weft of one row.'),
      rawPicks: number('Rows before rounding.'),
    }),
    warp: ref('WarpPlan'),
    yarns: { type: 'object', description: 'By yarn role.', additionalProperties: ref('YarnPlan') },
    bands: list('As they were asked.', ref('BandPlan')),
    cut: closed(
      'What to cut.',
      {
        spacerCard: closed('Under the first row.', { widthMm: mm('Width.'), heightMm: mm('Height.') }),
        dowel: closed('Where the piece has one.', { lengthMm: mm('Length.'), minDiameterMm: mm('The least that does not sag.') }),
        cordMm: mm('Hanging cord, knots included.'),
        lashingMm: mm('Yarn that lashes the cloth to its dowel.'),
        fixingHoldsG: mm('What the fixing in the wall must hold, in grams: four times the piece.'),
      },
      ['dowel', 'cordMm', 'lashingMm'],
    ),
    ...EVERY_PLAN,
  }),
};
