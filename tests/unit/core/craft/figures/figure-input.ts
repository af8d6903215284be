// The example piece without its last band, and its numbers, as a figure needs them. The numbers are plausible, not reckoned.
import { EXAMPLE } from '#core/craft/frame-loom/example.ts';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import type { FrameLoomPlan } from '#core/craft/plan-types.ts';
import type { FigureInput } from '#core/craft/figures/figure.ts';

export const PIECE: FrameLoomPiece = {
  ...EXAMPLE,
  loom: { ...EXAMPLE.loom, insideWidthMm: 400 },
  bands: EXAMPLE.bands.slice(0, 4),
};

const band = (index: number, technique: FrameLoomPlan['bands'][number]['technique'], heightMm: number, picks: number): FrameLoomPlan['bands'][number] => ({
  index, technique, heightMm, picks, yarnMm: {},
});

export const PLAN: FrameLoomPlan = {
  ends: { count: 62, working: 62, raw: 61.2, spacingMm: 5, nailsTop: 32, nailsBottom: 31, woundWidthMm: 305, loomWidthMm: 306 },
  loom: { insideWidthNeededMm: 350, heightOnLoomMm: 408, heightNeededMm: 508, topMm: 40, firstGapsMm: { narrow: 1, wide: 9 }, spacingRows: { fewest: 3, most: 4 }, bottomMm: 60 },
  weft: { diameterSumMm: 1.8, pickSpacingMm: 1.45, tightness: 0.36, crimp: 0.066, stepMm: 5.33, turnMm: 3.2, pickMm: 328.5, rawPicks: 83 },
  warp: { netMm: 32770, withMarginMm: 36000, massG: 13 },
  yarns: { ground: { netMm: 73915, withMarginMm: 85000, massG: 41, loads: 10, rowsPerLoad: 24 } },
  bands: [band(0, 'hem-stitch', 0, 0), { ...band(1, 'rya', 6, 0), cutMm: 364.28, knots: 31, strands: 93 }, band(2, 'tabby', 120, 83), band(3, 'soumak', 14, 0)],
  cut: { spacerCard: { widthMm: 325, heightMm: 60 }, dowel: { lengthMm: 380, minDiameterMm: 6.2 }, fixingHoldsG: 600, cordMm: 716 },
  massG: 109,
  hours: { likely: 6.5, low: 3.9, high: 11.7 },
  warnings: [],
};

export const INPUT: FigureInput = { piece: PIECE, plan: PLAN, units: 'cm' };
