/** Tables for what the weft does: slopes, beat, loops, roving, twining, butterflies. All on Low Tide's warp. */
import { LOW_TIDE } from '#components/handbook/pattern.ts';
import { figure, type FigureTableData } from '#components/handbook/table-figures.ts';
import { ASHENHURST_K } from '#core/craft/defaults.ts';
import { butterflyLength, pickSpacing } from '#core/craft/picks.ts';
import { loopLength } from '#core/craft/techniques/loop-pile.ts';
import { bulgeArc } from '#core/craft/techniques/roving.ts';
import { twiningRatio } from '#core/craft/techniques/twining.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';

const { piece, plan } = LOW_TIDE;
const { spacingMm } = plan.ends;

function weftOf(strands: number) {
  const [role] = Object.values(piece.yarns);
  if (role === undefined) throw new Error('the pattern has no yarn');
  return threadOf({ ...role, strands }, ASHENHURST_K.weft);
}

function slopes(): FigureTableData {
  return {
    title: 'How steep a stair of one end is',
    columns: [{ name: 'rows to each step' }, { name: 'rises in 10 cm', unit: 'mm' }, { name: 'angle', unit: '°' }],
    rows: [2, 4, 6, 8, 12, 20].map((rows) => {
      const rise = (rows * plan.weft.pickSpacingMm) / spacingMm;
      return [figure(rows), figure(100 * rise), figure((Math.atan(rise) * 180) / Math.PI)];
    }),
    reckonedBy: `Ends ${figure(spacingMm)} mm apart and rows ${figure(plan.weft.pickSpacingMm, 2)} mm, as in Low Tide. The angle is measured from the level fell.`,
  };
}

const BEATS: readonly { readonly says: string; readonly picksPerWeftDiameter: number }[] = [
  { says: 'hardly pressed', picksPerWeftDiameter: 0.5 },
  { says: 'comb, light hand', picksPerWeftDiameter: 0.7 },
  { says: 'comb, each row by itself', picksPerWeftDiameter: 0.9 },
  { says: 'firm tapestry', picksPerWeftDiameter: 1.1 },
  { says: 'rug', picksPerWeftDiameter: 1.45 },
];
const SQUARE_MM = 100;
const G_PER_M = 1000;

function beats(): FigureTableData {
  const { compressedMm, tex } = weftOf(1);
  return {
    title: 'What the beat makes of one yarn',
    columns: [{ name: 'beat' }, { name: 'rows in 1 cm' }, { name: 'yarn for 10 × 10 cm', unit: 'm' }, { name: 'it weighs', unit: 'g' }],
    rows: BEATS.map(({ says, picksPerWeftDiameter }) => {
      const rowsMm = pickSpacing({ picksPerWeftDiameter }, compressedMm);
      const yarnM = ((SQUARE_MM / rowsMm) * SQUARE_MM * (1 + plan.weft.crimp)) / 1000;
      return [says, figure(10 / rowsMm, 1), figure(yarnM, 1), figure((yarnM * tex) / G_PER_M, 1)];
    }),
    reckonedBy: 'Fenwool 6/2 on Low Tide’s warp, turns and tails left out. The words for the beats are common practice: count your own rows.',
  };
}

function loops(): FigureTableData {
  const { loftMm } = weftOf(1);
  return {
    title: 'Yarn for a row of loops',
    columns: [{ name: 'rod' }, { name: 'one loop', unit: 'mm' }, { name: 'a row, times the width' }],
    rows: [4, 6, 8, 10, 15].map((rodMm) => {
      const loopMm = loopLength({ rodMm }, loftMm);
      // A loop over every second end.
      return [`${figure(rodMm)} mm`, figure(loopMm), figure(1 + plan.weft.crimp + loopMm / (2 * spacingMm), 1)];
    }),
    reckonedBy: 'A loop on every second end, Fenwool 6/2, by our own geometry. Unravel a row of your own and compare.',
  };
}

const ROVING_OVER = 4;

function rovingPuff(): FigureTableData {
  const baseMm = ROVING_OVER * spacingMm;
  return {
    title: 'Roving over and under four ends',
    columns: [{ name: 'puffed up by' }, { name: 'on the face', unit: 'mm' }, { name: 'a pass, times the width' }],
    rows: [0, 5, 10, 15, 20].map((bulgeMm) => {
      const arcMm = bulgeArc(baseMm, bulgeMm);
      return [`${figure(bulgeMm)} mm`, figure(arcMm), figure((arcMm + baseMm) / (2 * baseMm), 2)];
    }),
    reckonedBy: `Ends ${figure(spacingMm)} mm apart; the face lies in an arc, the back is flat. By our own geometry, without tails.`,
  };
}

function twinedYarn(): FigureTableData {
  const { compressedMm: warpMm } = threadOf(piece.warp.yarn, ASHENHURST_K.warp);
  return {
    title: 'Yarn for one row of twining, both strands',
    columns: [{ name: 'each strand' }, { name: 'crossing at every end, times the width' }, { name: 'at every second end' }],
    rows: [1, 2, 3, 4].map((strands) => {
      const { loftMm } = weftOf(strands);
      const times = (every: number): string => figure(2 * twiningRatio(every * spacingMm, warpMm + loftMm, loftMm), 2);
      return [strands === 1 ? 'one Fenwool' : `${figure(strands)} Fenwool`, times(1), times(2)];
    }),
    reckonedBy: 'Two strands that swing round each end, by our own geometry, without tails. Common practice cuts the folded strand 2½ to 3 times the width.',
  };
}

function butterflies(): FigureTableData {
  return {
    title: 'Yarn in a butterfly',
    columns: [{ name: 'figures of eight' }, { name: 'small hand', unit: 'm' }, { name: 'large hand', unit: 'm' }],
    rows: [10, 15, 20, 25, 30].map((eights) => [figure(eights), figure(butterflyLength(eights, 150) / 1000, 1), figure(butterflyLength(eights, 200) / 1000, 1)]),
    reckonedBy: 'Twice the span between thumb and little finger for each figure of eight: 15 and 20 cm. Measure yours.',
  };
}

export const TABLES_OF_WEAVING = { slopes, beats, loops, 'roving-puff': rovingPuff, 'twined-yarn': twinedYarn, butterflies } as const;
