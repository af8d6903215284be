/** Tables for before the first end is wound: rates of work, setts, measures, cord. */
import { figure, MM_PER_INCH, size, type FigureTableData } from '#components/handbook/table-figures.ts';
import { PACE } from '#core/craft/defaults.ts';
import { HITCH_ROW, KNOT_TAKES, squareKnotCord, texFromDiameter } from '#core/craft/macrame/cord.ts';
import { balancedSett } from '#core/craft/sett.ts';
import { secondsPerRow } from '#core/craft/time.ts';

const SECONDS_PER_HOUR = 3600;

function paces(): FigureTableData {
  const rows = [40, 60, 80, 120].map((ends): [string, number] => [`rows of tabby over ${figure(ends)} ends`, SECONDS_PER_HOUR / secondsPerRow(ends)]);
  const others: [string, number][] = [
    ['ends wound on a frame', PACE.warpEndsPerHour],
    ['rya knots, strands cut before', PACE.ryaKnotsPerHour],
    ['stitches of soumak, loops or twining', PACE.stitchesPerHour],
    ['bundles of hem-stitch', PACE.hemBundlesPerHour],
  ];
  return {
    title: 'What a practised beginner does in an hour',
    columns: [{ name: 'work' }, { name: 'slow hand' }, { name: 'likely' }, { name: 'quick hand' }],
    rows: [...rows, ...others].map(([name, rate]) => [name, figure(rate / PACE.highFactor), figure(rate), figure(rate / PACE.lowFactor)]),
    reckonedBy: `Common practice: a row takes ${figure(PACE.secondsPerRow)} seconds and ${figure(PACE.secondsPerEnd, 1)} more for each end. The rate of rya is one teacher’s. Hands differ widely: time your own.`,
  };
}

function balancedSetts(): FigureTableData {
  return {
    title: 'Ends for balanced cloth, from wraps',
    columns: [{ name: 'wraps per inch' }, { name: 'plain, ends in 1 in' }, { name: 'plain, spacing', unit: 'mm' }, { name: 'twill, ends in 1 in' }, { name: 'twill, spacing', unit: 'mm' }],
    rows: [8, 10, 12, 16, 20, 24].map((wraps) => {
      const [plain, twill] = [balancedSett(wraps, 'plain'), balancedSett(wraps, 'twill-2-2')];
      return [figure(wraps), size(plain), figure(MM_PER_INCH / plain, 1), figure(twill, 1), figure(MM_PER_INCH / twill, 1)];
    }),
    reckonedBy: 'Half the wraps for plain weave, two thirds for 2/2 twill: a hand weaver’s rule. Weave a sample.',
  };
}

function setts(): FigureTableData {
  return {
    title: 'The same sett, told three ways',
    columns: [{ name: 'ends in 1 in' }, { name: 'ends in 10 cm' }, { name: 'spacing', unit: 'mm' }],
    rows: [3, 4, 5, 6, 8, 10, 12, 16].map((ends) => [figure(ends), figure((ends * 100) / MM_PER_INCH, 1), figure(MM_PER_INCH / ends, 2)]),
    reckonedBy: 'By definition: one inch is 25.4 mm.',
  };
}

function cords(): FigureTableData {
  return {
    title: 'What knots take of a cord',
    columns: [{ name: 'cord' }, { name: 'square knot, each working end', unit: 'mm' }, { name: 'it stands high', unit: 'mm' }, { name: 'double half hitch', unit: 'mm' }, { name: 'a row of them', unit: 'mm high' }, { name: '10 m weigh', unit: 'g' }],
    rows: [2, 3, 4, 5, 6].map((cordMm) => [
      `${figure(cordMm)} mm`,
      figure(squareKnotCord(cordMm)),
      figure(KNOT_TAKES.squareRise * cordMm, 1),
      figure(KNOT_TAKES.doubleHalfHitch * cordMm),
      figure(HITCH_ROW * cordMm, 1),
      figure(texFromDiameter(cordMm) / 100),
    ]),
    reckonedBy: `Common practice, in thicknesses of cord: ${figure(KNOT_TAKES.squareKnot)} and ${figure(KNOT_TAKES.squareRise, 1)} for a square knot, ${figure(KNOT_TAKES.doubleHalfHitch)} for a double half hitch. Weights are for twisted cotton. Knot ten and measure.`,
  };
}

export const TABLES_OF_PLANNING = { paces, 'balanced-setts': balancedSetts, setts, cords } as const;
