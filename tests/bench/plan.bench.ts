// How long a plan takes: at every key a teacher presses the whole piece is reckoned anew, in the browser and on the server.
import { bench, describe } from 'vitest';
import type { Band, FrameLoomPiece, Shape } from '#core/craft/piece.ts';
import { planPiece } from '#core/craft/plan.ts';
import { PLAIN_PIECE } from '../unit/core/craft/a-piece.ts';

/** The bands of a rich hanging, with a shape in every tabby, over and over. */
const KINDS: readonly Band[] = [
  { technique: 'tabby', yarn: 'ground', heightMm: 40, shapes: [{ shape: 'triangle', yarn: 'figure', baseMm: 150, heightMm: 30, join: 'dovetail' }] },
  { technique: 'soumak', yarn: 'fringe', over: 4, back: 2, rows: 2, tabbyBetween: 1, tabbyYarn: 'ground' },
  { technique: 'rya', yarn: 'fringe', strands: 3, legEnds: 1, pileMm: 80, trimMm: 5, rows: 2, heightMm: 12 },
  { technique: 'loop-pile', yarn: 'fringe', rodMm: 8, rows: 3, heightMm: 20 },
  { technique: 'twining', yarn: 'figure', rows: 2 },
  { technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 },
];

const SIXTY_BANDS: FrameLoomPiece = {
  ...PLAIN_PIECE,
  size: { widthMm: 600, heightMm: 1_600 },
  loom: { ...PLAIN_PIECE.loom, insideHeightMm: 1_900 },
  yarns: { ground: { metresPer100g: 180 }, figure: { metresPer100g: 170 }, fringe: { metresPer100g: 100 } },
  bands: [...Array.from({ length: 59 }, (_, index) => KINDS[index % KINDS.length] ?? PLAIN_PIECE.bands[0]), { technique: 'tabby', yarn: 'ground', fill: true }],
};

const triangle = (baseMm: number, heightMm: number): Shape => ({ shape: 'triangle', yarn: 'figure', baseMm, heightMm });
/** A round one, drawn by a dozen points. */
const drawn = (baseMm: number, heightMm: number): Shape => ({
  shape: 'points', yarn: 'figure',
  points: Array.from({ length: 12 }, (_, index) => ({ xMm: (baseMm / 2) * (1 + Math.cos((index * Math.PI) / 6)), yMm: (heightMm / 2) * (1 + Math.sin((index * Math.PI) / 6)) })),
});

/** As many shapes as may be sent, in so many bands of a tapestry. */
const tapestry = (bands: number, heightMm: number, shapeOf = triangle): FrameLoomPiece => ({
  ...PLAIN_PIECE,
  size: { widthMm: 300, heightMm: bands * heightMm },
  loom: { ...PLAIN_PIECE.loom, insideHeightMm: 20_000 },
  allowances: { relaxation: 0 },
  yarns: { ground: { metresPer100g: 180 }, figure: { metresPer100g: 180 } },
  bands: Array.from({ length: bands }, () => ({
    technique: 'tabby', yarn: 'ground', heightMm,
    shapes: Array.from({ length: 24 }, (_, index) => shapeOf(300 - 10 * index, heightMm - 1)),
  }) as const),
});

/** The most shapes whose rows still may be stepped out, and the most that may be sent, which may not. */
const LARGEST_WOVEN = tapestry(17, 100);
const LARGEST_DRAWN = tapestry(17, 100, drawn);
const LARGEST_SENT = tapestry(199, 100);
const MANY_BANDS = { ...PLAIN_PIECE, bands: Array.from({ length: 10_000 }, () => PLAIN_PIECE.bands[0]) };
const MANY_YARNS = { ...PLAIN_PIECE, yarns: Object.fromEntries(Array.from({ length: 10_000 }, (_, n) => [`y${String(n)}`, { tex: 400 }])) };
const DEEP: unknown = JSON.parse(`${'['.repeat(100_000)}${']'.repeat(100_000)}`);
const FINEST: FrameLoomPiece = { ...PLAIN_PIECE, size: { widthMm: 3_000, heightMm: 19_000 }, loom: { nailPitchMm: 3, warping: 'zigzag', insideHeightMm: 20_000 }, warp: { yarn: { tex: 20 } }, yarns: { ground: { tex: 1 } } };

for (const piece of [SIXTY_BANDS, LARGEST_WOVEN, LARGEST_DRAWN]) {
  const planned = planPiece(piece);
  if (!planned.ok) throw new Error(planned.problems.map(({ path, message }) => `${path} ${message}`).join('\n'));
}

describe('planning', () => {
  bench('a piece of sixty bands, under 1 ms', () => void planPiece(SIXTY_BANDS), { iterations: 1_000 });
});

describe('planning what nobody weaves', () => {
  bench('the largest piece that can be reckoned, under 50 ms', () => void planPiece(LARGEST_WOVEN), { iterations: 40 });
  bench('the largest piece with shapes drawn by points, under 50 ms', () => void planPiece(LARGEST_DRAWN), { iterations: 40 });
  bench('the largest piece that may be sent, under 50 ms', () => void planPiece(LARGEST_SENT), { iterations: 40 });
  bench('ten thousand bands, under 50 ms', () => void planPiece(MANY_BANDS));
  bench('ten thousand yarns, under 50 ms', () => void planPiece(MANY_YARNS));
  bench('lists nested a hundred thousand deep, under 50 ms', () => void planPiece({ ...PLAIN_PIECE, warp: DEEP }));
  bench('the finest yarn on the largest loom, under 50 ms', () => void planPiece(FINEST));
});
