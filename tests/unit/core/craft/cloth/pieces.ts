// Pieces to draw in tests: small, invented, with every technique.
import type { ClothBand, HungPiece, RyaBand, SoumakBand, TabbyBand, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';

export const SLACK = '#93a8a6';
export const ESTUARY = '#2f5366';
export const FOAM = '#e6e4d8';

const tabby = (name: string, heightMm: number, picks: number): ClothBand => ({
  technique: 'tabby', name, heightMm, colour: SLACK, yarn: 'Slack Water', picks, cover: 0.7, shapes: [],
});

export const WEDGES: TabbyBand = {
  technique: 'tabby', name: 'dunes', heightMm: 160, colour: SLACK, yarn: 'Slack Water', picks: 96, cover: 0.7,
  shapes: [{
    colour: '#cdbb94', yarn: 'Dry Sand',
    spans: Array.from({ length: 48 }, (_, row) => ({ row, from: Math.floor(row / 4), to: 40 - Math.floor(row / 3) })),
  }],
};

export const RYA: RyaBand = {
  technique: 'rya', name: 'fringe', heightMm: 24, colour: FOAM, yarn: 'Foam', rows: 3, knotEnds: 2, strands: 6, pileMm: 140, groundColour: ESTUARY,
};

export const SOUMAK: SoumakBand = {
  technique: 'soumak', name: 'ridge', heightMm: 60, colour: ESTUARY, yarn: 'Estuary', rows: 12, over: 4, back: 2,
  soumakShare: 0.8, tabbyBetween: 2, tabbyColour: SLACK,
};

export const ALL_TECHNIQUES: readonly ClothBand[] = [
  { technique: 'hem-stitch', name: 'hem', heightMm: 0, colour: ESTUARY, yarn: 'Estuary', bundleEnds: 2, reachMm: 4 },
  RYA,
  tabby('shore', 40, 24),
  WEDGES,
  SOUMAK,
  { technique: 'roving', name: undefined, heightMm: 30, colour: '#ddd3bb', yarn: 'Oat', over: 4, passes: 1 },
  { technique: 'loop-pile', name: undefined, heightMm: 40, colour: '#a99a5e', yarn: 'Reed', rows: 4, loopMm: 12, groundColour: SLACK },
  { technique: 'twining', name: undefined, heightMm: 12, colour: '#a0664a', yarn: 'Rust', rows: 3 },
  tabby('sky', 90, 54),
];

export function wovenPiece(overrides: Partial<WovenPiece> = {}): WovenPiece {
  return {
    kind: 'woven', title: 'Low Tide', thing: 'wall hanging', widthMm: 400, ends: 66, endsTogether: 1, warpColour: '#d8d2c1', seed: 11,
    turned: false, loom: { insideWidthMm: 480, insideHeightMm: 700, bottomMm: 80 }, bands: ALL_TECHNIQUES, ...overrides,
  };
}

/** Two cords on a rod, one knot of the second over the first. */
export const CORDS: HungPiece = {
  kind: 'hung', title: 'Three Knotted Cords', thing: 'plant hanger', widthMm: 150, heightMm: 760,
  rod: { kind: 'rod', diameterMm: 16 },
  words: { cm: 'two cords, 76\u00a0cm long.', in: 'two cords, 30\u00a0in long.' },
  motifs: [[{ colour: '#ddd3bb', widthMm: 4, way: [-8, 0, 0, 4, 4, 4, 8, 6] }]],
  laid: [
    { colour: '#ddd3bb', widthMm: 4, way: [60, -10, 60, 100, 60, 400, 60, 760] },
    'rod',
    { motif: 0, xMm: 60, yMm: 100 },
    { motif: 0, xMm: 60, yMm: 120 },
    { colour: 'red;}', widthMm: 4, way: [90, 0, 90, 100, 90, 400, 90, 760] },
  ],
};
