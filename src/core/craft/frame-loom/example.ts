/** A small hanging with a fringe, wedges and ridges: what a figure shows beside a piece of another craft. */
import type { FrameLoomPiece } from '#core/craft/piece.ts';

export const EXAMPLE: FrameLoomPiece = {
  craft: 'frame-loom',
  size: { widthMm: 300, heightMm: 400 },
  loom: { nailPitchMm: 10, warping: 'zigzag', insideHeightMm: 520 },
  warp: { yarn: { tex: 400, colour: '#d8d2c1' }, parity: 'even' },
  beat: { picksPerWeftDiameter: 0.7 },
  dowel: { diameterMm: 12 },
  yarns: {
    ground: { metresPer100g: 180, colour: '#93a8a6' },
    sand: { metresPer100g: 180, colour: '#cdbb94' },
    foam: { metresPer100g: 100, colour: '#e6e4d8' },
    ridge: { metresPer100g: 100, colour: '#2f5366' },
  },
  bands: [
    { technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 },
    { technique: 'rya', yarn: 'foam', strands: 3, legEnds: 1, pileMm: 150, trimMm: 10, rows: 1, heightMm: 6 },
    { technique: 'tabby', yarn: 'ground', heightMm: 120, shapes: [{ shape: 'triangle', yarn: 'sand', baseMm: 150, heightMm: 100 }] },
    { technique: 'soumak', yarn: 'ridge', over: 4, back: 2, rows: 4, tabbyBetween: 0, tabbyYarn: 'ground' },
    { technique: 'tabby', yarn: 'ground', fill: true },
  ],
};
