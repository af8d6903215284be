import { describe, expect, it } from 'vitest';
import type { ClothBand, TabbyBand, WovenPiece } from '#core/craft/cloth/cloth-piece.ts';
import { closeUpOf } from '#core/craft/cloth/close-up.ts';
import type { ClothView } from '#core/craft/cloth/cloth-view.ts';
import { describeCloth } from '#core/craft/cloth/describe-cloth.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { partsStripOf, spreadOverParts } from '#core/craft/cloth/parts-strip.ts';
import { swatchOfBand, swatchOfYarn } from '#core/craft/cloth/swatch-of.ts';
import { expectKept, gistOf, marksOf } from '../../../../support/kept.ts';
import { ALL_TECHNIQUES, CORDS, ESTUARY, FOAM, RYA, SLACK, SOUMAK, WEDGES, wovenPiece } from './pieces.ts';

const file = (name: string): URL => new URL(`../../../../fixtures/cloth/${name}.json`, import.meta.url);

const SHORE: TabbyBand = { technique: 'tabby', name: 'shore', heightMm: 60, colour: SLACK, yarn: 'Slack Water', picks: 36, cover: 0.7, shapes: [] };
const EDGE: ClothBand = { technique: 'hem-stitch', name: 'hem', heightMm: 0, colour: ESTUARY, yarn: 'Estuary', bundleEnds: 3, reachMm: 6 };

const VIEWS: Readonly<Record<string, ClothView>> = {
  card: { id: 'a', as: 'hanging', width: 136 },
  page: { id: 'a', as: 'hanging', width: 456 },
  'loom, begun': { id: 'a', as: 'loom', width: 400, woven: 0.37 },
  'strip, begun': { id: 'a', as: 'strip', width: 36, height: 560, woven: 0.4 },
  lying: { id: 'a', as: 'lying', width: 26, height: 358 },
  swatch: { id: 'a', as: 'swatch', width: 56, height: 44 },
  near: { id: 'a', as: 'swatch', width: 920, height: 640, range: 'near', pxPerMm: 4, woven: 0.7 },
};

/** One piece for each way in which a cloth can differ. */
const PIECES: Readonly<Record<string, WovenPiece>> = {
  'every technique': wovenPiece(),
  'turned, with doubled ends': wovenPiece({ turned: true, endsTogether: 2, ends: 40 }),
  'few broad ends': wovenPiece({ ends: 18, widthMm: 180 }),
  'without a frame': wovenPiece({ loom: undefined }),
  'knotted and lashed': wovenPiece({ finish: { bottom: 'knotted', fringeMm: 70, bundleEnds: 6 }, fixing: 'lashed' }),
  'twisted and tied': wovenPiece({ finish: { bottom: 'twisted', fringeMm: 90, bundleEnds: 4 }, fixing: 'tied', endsTogether: 2 }),
  'tucked': wovenPiece({ finish: { bottom: 'tucked', fringeMm: 0, bundleEnds: 6 } }),
  'left loose, turned': wovenPiece({ finish: { bottom: 'plain', fringeMm: 50, bundleEnds: 6 }, turned: true, bands: [SHORE, SOUMAK] }),
  'plain weave alone': wovenPiece({ bands: [SHORE] }),
  'weft-faced': wovenPiece({ bands: [{ ...SHORE, cover: 1 }] }),
  'warp seen through': wovenPiece({ bands: [{ ...SHORE, cover: 0 }] }),
  'basket weave': wovenPiece({ bands: [{ ...SHORE, together: 2, picks: 20 }], endsTogether: 2 }),
  'a doubled weft': wovenPiece({ bands: [{ ...SHORE, strands: 2, picks: 18 }, SOUMAK] }),
  'wedges that interlock': wovenPiece({ bands: [{ ...WEDGES, shapes: WEDGES.shapes.map((shape) => ({ ...shape, join: 'interlock' as const })) }] }),
  'wedges that dovetail': wovenPiece({ bands: [{ ...WEDGES, shapes: WEDGES.shapes.map((shape) => ({ ...shape, join: 'dovetail' as const })) }] }),
  'a pillar with slits': wovenPiece({ bands: [{ ...SHORE, shapes: [{ colour: FOAM, yarn: 'Foam', spans: Array.from({ length: 36 }, (_, row) => ({ row, from: 20, to: 44 })) }] }] }),
  'two colours beside each other twice in a row': wovenPiece({ bands: [{ ...SHORE, shapes: [
    { colour: FOAM, yarn: 'Foam', join: 'interlock', spans: Array.from({ length: 20 }, (_, row) => [{ row, from: 4, to: 12 }, { row, from: 50, to: 66 }]).flat() },
    { colour: ESTUARY, yarn: 'Estuary', spans: Array.from({ length: 16 }, (_, row) => ({ row: row + 20, from: 0, to: 30 - row })) },
  ] }] }),
  'rya between plain edges': wovenPiece({ bands: [SHORE, { ...RYA, edgeEnds: 6, knotEnds: 4, rows: 2, pileMm: 60 }, SHORE] }),
  'rya last, over its edge': wovenPiece({ bands: [EDGE, SHORE, { ...RYA, rows: 1 }] }),
  'soumak without plain rows': wovenPiece({ bands: [{ ...SOUMAK, tabbyBetween: 0, soumakShare: 1, over: 3, back: 1, rows: 7 }] }),
  'roving passed twice': wovenPiece({ bands: [{ technique: 'roving', name: undefined, heightMm: 50, colour: '#ddd3bb', yarn: 'Oat', over: 3, passes: 3 }] }),
  'loops alone': wovenPiece({ bands: [{ technique: 'loop-pile', name: undefined, heightMm: 50, colour: '#a99a5e', yarn: 'Reed', rows: 6, loopMm: 20, groundColour: SLACK }] }),
  'twining over two ends': wovenPiece({ bands: [{ technique: 'twining', name: undefined, heightMm: 30, colour: '#a0664a', yarn: 'Rust', rows: 5, endsPerTwist: 2 }, SHORE, EDGE] }),
  'edges above and below': wovenPiece({ bands: [EDGE, SHORE, { ...EDGE, bundleEnds: 5, reachMm: 10 }] }),
  'edges of a turned piece': wovenPiece({ turned: true, bands: [EDGE, RYA, SHORE, EDGE] }),
  'a heading': wovenPiece({ bands: [{ technique: 'heading', name: undefined, heightMm: 60, colour: '#c9c3b3', yarn: 'warp' }, SHORE] }),
  'no bands': wovenPiece({ bands: [] }),
};

describe.each(Object.entries(PIECES))('the cloth of a piece: %s', (name, piece) => {
  it('is drawn in every view as it was found good, and said in the same words', () => {
    expectKept(file('views'), name, {
      words: describeCloth(piece, { woven: 0.37 }),
      views: Object.fromEntries(Object.entries(VIEWS).map(([view, look]) => [view, gistOf(drawCloth(piece, look))])),
    });
  });
});

describe('views that ask for more', () => {
  const [id, piece] = ['a', wovenPiece({ finish: { bottom: 'knotted', fringeMm: 70, bundleEnds: 6 } })] as const;
  it.each<[string, ClothView]>([
    ['a strip from the foot up, padded', { id, as: 'strip', width: 40, height: 500, woven: 0.55, begin: 'foot', pad: 6, fellOut: 9 }],
    ['a strip without its open warp', { id, as: 'strip', width: 40, height: 500, woven: 0.55, openWarp: false }],
    ['a swatch without a fell', { id, as: 'swatch', width: 300, height: 200, woven: 0.5, fell: false }],
    ['a broad swatch, half woven', { id, as: 'swatch', width: 300, height: 200, woven: 0.5 }],
    ['a loom that holds nothing yet', { id, as: 'loom', width: 260, woven: 0 }],
    ['a loom from the head down', { id, as: 'loom', width: 260, woven: 0.5, begin: 'head' }],
    ['a narrow loom with its fell far out', { id, as: 'loom', width: 150, woven: 0.8, fellOut: 12 }],
    ['a loom that is full', { id, as: 'loom', width: 260 }],
    ['a hanging half made', { id, as: 'hanging', width: 260, woven: 0.5 }],
    ['few threads', { id, as: 'hanging', width: 260, minEnd: 12, minPick: 10 }],
    ['a part of the width', { id, as: 'swatch', width: 200, height: 150, pxPerMm: 3 }],
    ['near, of plies', { id, as: 'hanging', width: 500, range: 'near' }],
    ['for eyes only', { id, as: 'hanging', width: 120, decorative: true }],
    ['in inches, with words of its own', { id, as: 'hanging', width: 120, units: 'in', label: 'Low Tide & its "shore"' }],
    ['more woven than there is', { id, as: 'loom', width: 200, woven: 1.4 }],
  ])('draw %s as it was found good', (name, view) => {
    expectKept(file('asked'), name, gistOf(drawCloth(piece, view)));
  });

  it('draw knotted cords on a rod and on a ring in any of them', () => {
    const ring = { ...CORDS, rod: { kind: 'ring', diameterMm: 60, thickMm: 6 } } as const;
    for (const [name, cords] of [['rod', CORDS], ['ring', ring]] as const) {
      expectKept(file('asked'), `cords on a ${name}`, Object.fromEntries(Object.entries(VIEWS).map(([view, look]) => [view, gistOf(drawCloth(cords, look))])));
      expectKept(file('cords'), name, marksOf(drawCloth(cords, { id: 'a', as: 'hanging', width: 300 })));
    }
  });
});

describe('threads where they were', () => {
  it.each<[string, WovenPiece, ClothView]>([
    ['a small hanging of every technique', wovenPiece(), { id: 'a', as: 'hanging', width: 120 }],
    ['plain weave near', wovenPiece({ bands: [SHORE] }), { id: 'a', as: 'swatch', width: 200, height: 120, range: 'near' }],
    ['a piece begun on its loom', wovenPiece({ bands: [EDGE, SHORE, SOUMAK] }), { id: 'a', as: 'loom', width: 200, woven: 0.6 }],
  ])('in %s', (name, piece, view) => {
    expectKept(file('threads'), name, marksOf(drawCloth(piece, view)));
  });
});

describe('small patches and strips', () => {
  it('show each band, each yarn and each part as they did', () => {
    const piece = wovenPiece({ bands: [...ALL_TECHNIQUES, { technique: 'heading', name: undefined, heightMm: 60, colour: '#c9c3b3', yarn: 'warp' }] });
    const patches = piece.bands.map((band, index) => [`band ${String(index)} ${band.technique}`, { bands: swatchOfBand(piece, index).bands, drawn: gistOf(drawCloth(swatchOfBand(piece, index), { id: 'a', as: 'swatch', width: 60, height: 48 })) }]);
    expectKept(file('patches'), 'bands', Object.fromEntries(patches));
    expectKept(file('patches'), 'a yarn', swatchOfYarn('#2F5366', '#d8d2c1', 5));
    expectKept(file('patches'), 'near', closeUpOf(piece).bands.map((band) => (band.technique === 'tabby' ? { ...band, shapes: band.shapes.map(({ spans }) => spans.slice(0, 6)) } : band)));
  });

  it.each([1, 2, 3, 4, 5, 7])('spread the bands over %s parts as they did', (count) => {
    const parts = spreadOverParts(wovenPiece(), count);
    expect(parts).toHaveLength(count);
    expectKept(file('patches'), `${String(count)} parts`, { parts: parts.map(({ bands }) => bands.join(' ')), drawn: gistOf(drawCloth(partsStripOf(wovenPiece(), parts), { id: 'a', as: 'strip', width: 36, height: 400 })) });
  });

  it('find a part’s bands by their names as well', () => {
    const strip = partsStripOf(wovenPiece(), [{ bands: [] }, { bands: ['shore', 'dunes'] }, { bands: ['ridge', 6] }, { bands: ['fringe'] }]);
    expectKept(file('patches'), 'parts by name', strip.bands.map((band) => `${band.technique} ${band.heightMm.toFixed(2)}${'rows' in band ? ` rows ${String(band.rows)}` : ''}`));
    expectKept(file('patches'), 'parts by name, drawn', gistOf(drawCloth(strip, { id: 'a', as: 'lying', width: 30, height: 300 })));
  });
});
