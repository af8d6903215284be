/** Tables for taking a piece off and hanging it up: warp for a fringe, rods, the pull on a cord. */
import { LOW_TIDE } from '#components/handbook/pattern.ts';
import { figure, type FigureTableData } from '#components/handbook/table-figures.ts';
import { ASHENHURST_K, FRINGE_BUNDLE_ENDS, HANDLE_MM, HANGING, KNOT_DIAMETERS, TWIST_RATIO } from '#core/craft/defaults.ts';
import { bundleDiameter, cordTension, endsForFringe, endsForTwistedFringe, leastDowelDiameter } from '#core/craft/hanging.ts';
import { roundUpTo } from '#core/craft/rounding.ts';
import { threadOf } from '#core/craft/yarn/thread.ts';

function fringeWarp(): FigureTableData {
  const bundleMm = bundleDiameter(FRINGE_BUNDLE_ENDS, threadOf(LOW_TIDE.piece.warp.yarn, ASHENHURST_K.warp).loftMm);
  return {
    title: 'Warp to keep below the cloth',
    columns: [{ name: 'fringe you want' }, { name: 'knotted', unit: 'mm' }, { name: 'twisted', unit: 'mm' }],
    rows: [30, 60, 100, 150, 200].map((fringeMm) => [`${figure(fringeMm)} mm`, figure(roundUpTo(endsForFringe(fringeMm, bundleMm), 5)), figure(roundUpTo(endsForTwistedFringe(fringeMm), 5))]),
    reckonedBy: `Bundles of ${figure(FRINGE_BUNDLE_ENDS)} ends of Low Tide’s warp. A knot takes ${figure(KNOT_DIAMETERS)} thicknesses of its bundle and the hand ${figure(HANDLE_MM)} mm; a twisted cord needs ${figure(TWIST_RATIO, 2)} times its length. Common practice: knot one and measure.`,
  };
}

const G_PER_KG = 1000;
const RODS = [400, 600, 900, 1200] as const;

function rods(): FigureTableData {
  return {
    title: 'The thinnest round rod that does not sag',
    columns: [{ name: 'the piece weighs' }, ...RODS.map((spanMm) => ({ name: `${figure(spanMm / 10)} cm between cords`, unit: 'mm' }))],
    rows: [200, 500, 1000, 2000, 4000].map((massG) => [
      massG < G_PER_KG ? `${figure(massG)} g` : `${figure(massG / G_PER_KG)} kg`,
      ...RODS.map((spanMm) => figure(Math.max(HANGING.leastStockMm, Math.ceil(leastDowelDiameter(massG, spanMm))))),
    ]),
    reckonedBy: `A rod held at both ends and loaded evenly, of wood softer than any that is usual (${figure(HANGING.modulusPa / 1e9)} GPa). A sag of one part in ${figure(HANGING.sagLimit)} is not seen. Below ${figure(HANGING.leastStockMm)} mm rods are not sold straight.`,
  };
}

const PULLS: readonly { readonly says: string; readonly rise: number }[] = [
  { says: 'a half of the span', rise: 1 / 2 },
  { says: 'a third', rise: 1 / 3 },
  { says: 'a quarter', rise: 1 / 4 },
  { says: 'a sixth', rise: 1 / 6 },
  { says: 'a tenth', rise: 1 / 10 },
];

function cordPull(): FigureTableData {
  const weightN = cordTension(G_PER_KG, 1, 1e9) * 2;
  return {
    title: 'The pull in a hanging cord',
    columns: [{ name: 'the cord rises by' }, { name: 'pull, times the weight of the piece' }],
    rows: PULLS.map(({ says, rise }) => [says, figure(cordTension(G_PER_KG, G_PER_KG, rise * G_PER_KG) / weightN, 2)]),
    reckonedBy: 'Balance of forces, one cord over one hook. Both halves of the cord pull so hard at the rod.',
  };
}

export const TABLES_OF_FINISHING = { 'fringe-warp': fringeWarp, rods, 'cord-pull': cordPull } as const;
