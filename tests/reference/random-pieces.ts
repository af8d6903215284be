/** Random pieces, most of which can be woven. */
import fc from 'fast-check';
import { planPiece } from '#core/craft/plan.ts';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const whole = (min: number, max: number) => fc.integer({ min, max });

/** Pieces that can be woven: one band of each kind, over a random loom. */
export const pieces = fc
  .record({
    widthMm: between(120, 600),
    heightMm: between(150, 800),
    nailPitchMm: between(6, 20),
    warping: fc.constantFrom('zigzag', 'two-nail'),
    endsTogether: fc.constantFrom(1, 2),
    parity: fc.constantFrom('any', 'even', 'odd'),
    warpTex: between(200, 900),
    weftTex: between(150, 900),
    beat: between(0.4, 1.6),
    drawIn: between(0, 0.1),
    relaxation: between(0, 0.1),
    margin: between(0, 0.3),
    shapeShare: between(0.1, 0.8),
    join: fc.constantFrom('slit', 'dovetail', 'interlock'),
  })
  .map((of) => ({
    craft: 'frame-loom',
    size: { widthMm: of.widthMm, heightMm: of.heightMm },
    loom: { nailPitchMm: of.nailPitchMm, warping: of.warping, insideHeightMm: of.heightMm * 1.5 + 300 },
    warp: { yarn: { tex: of.warpTex }, endsTogether: of.endsTogether, parity: of.parity },
    beat: { picksPerWeftDiameter: of.beat },
    allowances: { drawIn: of.drawIn, relaxation: of.relaxation, marginWeft: of.margin, marginWarp: of.margin },
    yarns: { ground: { tex: of.weftTex }, figure: { tex: of.weftTex * 1.1 }, fringe: { tex: 800 } },
    bands: [
      { technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 },
      { technique: 'rya', yarn: 'fringe', strands: 3, legEnds: 1, pileMm: 80, trimMm: 5, rows: 2, heightMm: 12 },
      {
        technique: 'tabby',
        yarn: 'ground',
        heightMm: 60,
        shapes: [{ shape: 'triangle', yarn: 'figure', baseMm: of.widthMm * of.shapeShare, heightMm: 50, join: of.join }],
      },
      { technique: 'soumak', yarn: 'fringe', over: 4, back: 2, rows: 2, tabbyBetween: 1, tabbyYarn: 'ground' },
      { technique: 'tabby', yarn: 'ground', fill: true },
    ],
  }));

export type TriedPiece = typeof pieces extends fc.Arbitrary<infer P> ? P : never;
export const isWoven = (piece: unknown): boolean => planPiece(piece).ok;

const ways = fc.oneof(
  fc.constantFrom({}, { mode: 'straight-warp' }, { mode: 'balanced' }),
  between(0.1, 2).map((weftWaveMm) => ({ mode: 'given', weftWaveMm })),
  fc.record({ mode: fc.constant('measured'), takeUp: between(0, 0.6), warpTakeUp: between(0, 0.6) }, { requiredKeys: ['mode'] }),
);
const woven = fc.record({ strands: whole(1, 4), basket: fc.boolean() }, { requiredKeys: [] });
const finish = fc.oneof(
  fc.constant({ bottom: 'tucked' }),
  fc.record({ bottom: fc.constant('plain'), fringeMm: between(0, 200) }, { requiredKeys: ['bottom'] }),
  fc.record({ bottom: fc.constantFrom('knotted', 'twisted'), fringeMm: between(0, 200), bundleEnds: whole(1, 9) }, { requiredKeys: ['bottom'] }),
);
const dowel = fc.record({ diameterMm: between(5, 60), fixing: fc.constantFrom('slipped', 'tied', 'lashed') }, { requiredKeys: ['diameterMm'] });
const beat = fc.oneof(between(0.4, 1.6).map((picksPerWeftDiameter) => ({ picksPerWeftDiameter })), between(2, 9).map((picksPerCm) => ({ picksPerCm })));

/** The same with every way of bending, of taking strands and ends together, of finishing and of hanging; a balanced one may say no beat. */
export const richPieces = fc
  .tuple(pieces, ways, woven, woven, fc.option(finish, { nil: undefined }), fc.option(dowel, { nil: undefined }), beat, fc.boolean())
  .map(([{ beat: _, ...piece }, way, first, second, ends, rod, rows, saysBeat]) => ({
    ...piece, ...way,
    ...(saysBeat || !('mode' in way) || way.mode !== 'balanced' ? { beat: rows } : {}),
    ...(ends === undefined ? {} : { finish: ends }),
    ...(rod === undefined ? {} : { dowel: rod }),
    loom: { ...piece.loom, insideHeightMm: piece.loom.insideHeightMm + 300 },
    bands: piece.bands.map((band, index) => (band.technique === 'tabby' ? { ...band, ...(index === 2 ? first : second) } : band)),
  }));
