// A small piece to show frames with.
import type { ClothBand, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { spreadOverParts } from '#core/craft/cloth/parts-strip.ts';

const tabby = (heightMm: number, colour: string, yarn: string): ClothBand => ({ technique: 'tabby', name: undefined, heightMm, colour, yarn, picks: Math.round(heightMm * 0.6), cover: 0.7, shapes: [] });

export const examplePiece: WovenPiece = {
  kind: 'woven', title: 'Low Tide', thing: 'wall hanging', widthMm: 400, ends: 66, endsTogether: 1, warpColour: '#d8d2c1', seed: 11, turned: false,
  loom: { insideWidthMm: 480, insideHeightMm: 700, bottomMm: 80 },
  bands: [
    { technique: 'rya', name: 'fringe', heightMm: 60, colour: '#e6e4d8', yarn: 'Foam', rows: 3, knotEnds: 2, strands: 6, pileMm: 140, groundColour: '#2f5366' },
    tabby(60, '#2f5366', 'Estuary'),
    {
      technique: 'tabby', name: 'dunes', heightMm: 120, colour: '#93a8a6', yarn: 'Slack Water', picks: 72, cover: 0.7,
      shapes: [{ colour: '#cdbb94', yarn: 'Dry Sand', spans: Array.from({ length: 48 }, (_, row) => ({ row, from: Math.floor(row / 4), to: 40 - Math.floor(row / 3) })) }],
    },
    { technique: 'soumak', name: 'ridge', heightMm: 100, colour: '#2f5366', yarn: 'Estuary', rows: 12, over: 4, back: 2, soumakShare: 0.8, tabbyBetween: 2, tabbyColour: '#93a8a6' },
  ],
};

export const exampleParts = spreadOverParts(examplePiece, 7);
