/** What a plan says of its ends, yarns and bands: the numbers in its sentences, and when it says nothing. */
import { describe, expect, test } from 'vitest';
import type { FrameLoomPiece } from '#core/craft/piece.ts';
import { pieceOf, pieceWith, planOf, PLAIN_PIECE, problemsOf } from './a-piece.ts';

const WARP = PLAIN_PIECE.warp;
const warnings = (piece: unknown, code: string): string[] => planOf(piece).warnings.filter((warning) => warning.code === code).map(({ path, message }) => `${path} ${message}`);
const refused = (piece: unknown): string[] => problemsOf(piece).map(({ path, message }) => `${path} ${message}`);

describe('the number of ends', () => {
  test('is raised until it suits, and says what suits', () => {
    const raised = (warp: Partial<FrameLoomPiece['warp']>): string[] => warnings(pieceWith({ warp: { yarn: WARP.yarn, ...warp } }), 'W_PARITY');
    expect(raised({ parity: 'even' })).toEqual(['/warp/parity This pattern needs an even number of ends. 61 becomes 62; the cloth grows by 5 mm.']);
    expect(raised({ parity: 'odd' })).toEqual([]);
    expect(raised({ endsTogether: 2 })).toEqual(['/warp/endsTogether This pattern needs ends in pairs. 61 becomes 62; the cloth grows by 5 mm.']);
    expect(raised({ endsTogether: 2, parity: 'even' })).toEqual(['/warp/parity This pattern needs an even number of pairs of ends. 61 becomes 64; the cloth grows by 15 mm.']);
    expect(raised({ endsTogether: 2, parity: 'odd' })).toEqual(['/warp/parity This pattern needs an odd number of pairs of ends. 61 becomes 62; the cloth grows by 5 mm.']);
  });

  test('may be pinned, to what suits only', () => {
    const pinned = (endCount: number, parity: 'even' | 'odd'): string[] => refused(pieceWith({ warp: { yarn: WARP.yarn, endCount, parity } }));
    expect(pinned(61, 'even')).toEqual(['/warp/endCount This pattern needs an even number of ends, and 61 is not. 62 works.']);
    expect(pinned(62, 'odd')).toEqual(['/warp/endCount This pattern needs an odd number of ends, and 62 is not. 63 works.']);
    expect(pinned(61, 'odd')).toEqual([]);
  });

  test('pinned two ends beside what the width asks is told of no more than that', () => {
    const wide = (endCount: number): string[] => warnings(pieceWith({ size: { widthMm: 294, heightMm: 400 }, warp: { yarn: WARP.yarn, endCount } }), 'W_WIDTH');
    expect([wide(58), wide(62)]).toEqual([[], []]);
    expect([wide(57).length, wide(63).length]).toEqual([1, 1]);
  });

  test('may be too small or too large to weave with, and four and two thousand are not', () => {
    const ofWidth = (widthMm: number, drawIn = 0): string[] => refused(pieceWith({ size: { widthMm, heightMm: 400 }, loom: { ...PLAIN_PIECE.loom, nailPitchMm: 2 }, warp: { yarn: { tex: 20 } }, yarns: { ground: { tex: 20 } }, allowances: { drawIn } }));
    expect(ofWidth(3)).toEqual(['/size/widthMm 3 ends are too few to weave with. Between 4 and 2000 works.']);
    expect(ofWidth(4)).toEqual([]);
    expect(ofWidth(2000)).toEqual([]);
    expect(ofWidth(2001)).toEqual(['/size/widthMm 2001 ends are too many to weave with. Between 4 and 2000 works.']);
  });
});

describe('a yarn between the ends', () => {
  const ground = (yarn: FrameLoomPiece['yarns'][string], parts: Partial<FrameLoomPiece> = {}): FrameLoomPiece => pieceWith({ ...parts, yarns: { ground: yarn } });

  test('that is too thick is refused with what would let it close, fewer strands only where there are some', () => {
    expect(refused(ground({ tex: 25_000 }))[0]).toMatch(/Use a thinner yarn, or ends at least [\d.]+ mm apart\.$/u);
    expect(refused(ground({ tex: 12_500, strands: 2 }))[0]).toMatch(/Use a thinner yarn, fewer strands together, or ends at least [\d.]+ mm apart\.$/u);
  });

  test('that is thin says how many strands come out well', () => {
    expect(warnings(ground({ tex: 40 }), 'W_LOOSE')[0]).toMatch(/Take 19 strands together, or set the ends closer\.$/u);
    expect(warnings(ground({ tex: 40, strands: 2 }), 'W_LOOSE')[0]).toMatch(/Take 19 strands together, or set the ends closer\.$/u);
  });

  test('lies no closer than it is thick, twice over', () => {
    const counted = (picksPerCm: number): string[] => refused(ground({ metresPer100g: 180 }, { beat: { picksPerCm } }));
    expect(counted(19.7)).toEqual([]);
    expect(counted(19.8)).toEqual(['/beat/picksPerCm Rows of this yarn cannot lie so close: up to 19.7 in a centimetre work. Count the swatch again.']);
  });
});

describe('the weft that is told', () => {
  test('is of the yarn with the most rows in all its bands together', () => {
    const size = { widthMm: 300, heightMm: 150 };
    const yarns = { ...PLAIN_PIECE.yarns, other: { metresPer100g: 250 } };
    const of = (yarn: string, heightMm: number) => ({ technique: 'tabby', yarn, heightMm }) as const;
    const { weft } = planOf(pieceWith({ size, yarns, bands: [of('other', 50), of('ground', 60), of('other', 40)] }));
    expect(weft.diameterSumMm).toBe(planOf(pieceWith({ yarns: { ground: yarns.other } })).weft.diameterSumMm);
    expect(weft.rawPicks).toBeCloseTo(90 / weft.pickSpacingMm, 9);
  });
});

describe('loads and strands', () => {
  test('of soumak are counted by what goes into its rows', () => {
    const fringe = planOf({ ...pieceOf({ technique: 'soumak', yarn: 'fringe', over: 4, back: 2, rows: 20, tabbyBetween: 1, tabbyYarn: 'ground' }), yarns: { ...PLAIN_PIECE.yarns, fringe: { metresPer100g: 100 } } }).yarns['fringe'];
    expect(fringe?.loads).toBe(Math.ceil((fringe?.netMm ?? 0) / 8000));
    expect(fringe?.loads).toBeGreaterThan(1);
  });

  test('of a warp that is wound with two strands together take the yarn twice', () => {
    const net = (strands: number): number => planOf(pieceWith({ warp: { yarn: { tex: 200, strands } } })).warp.netMm;
    expect(net(2) / net(1)).toBeCloseTo(2, 2);
  });
});

describe('heights that do not come out', () => {
  const two = (heightMm: number): string[] => refused(pieceWith({ bands: [{ technique: 'tabby', yarn: 'ground', heightMm: 300 }, { technique: 'tabby', yarn: 'ground', heightMm }] }));
  const filled = (heightMm: number): string[] => refused(pieceOf({ technique: 'tabby', yarn: 'ground', heightMm }));

  test('say how much to add or to take away, from half a millimetre on', () => {
    expect(two(90)).toEqual(['/bands The bands come to 39 cm, and the piece is 40 cm high. Add 10 mm, or let one band fill the rest.']);
    expect(two(120)).toEqual(['/bands The bands come to 42 cm, and the piece is 40 cm high. Take away 20 mm, or let one band fill the rest.']);
    expect([two(99.5), two(100.5)]).toEqual([[], []]);
  });

  test('say what the other bands must give', () => {
    expect(filled(430)).toEqual(['/bands/1/fill The bands come to 43 cm, and the piece is 40 cm high. Nothing is left to fill: take 30 mm from other bands.']);
    expect(filled(400)).toEqual([]);
  });

  test('name the yarns there are where a band asks for another', () => {
    expect(refused(pieceOf({ technique: 'twining', yarn: 'gold', rows: 2 }))).toEqual(['/bands/0/yarn No yarn of this piece is called “gold”. There are: ground.']);
  });
});
