/**
 * The rest of a piece with five rows to the centimetre, two millimetres from row to row, so that each number can be
 * reckoned beside it. Measured, its rows always lie two and a half millimetres apart: four to the centimetre. What is
 * measured on the loom is divided by 0.98, as the cloth shrinks by two per cent when it comes off.
 */
import { describe, expect, test } from 'vitest';
import type { Band, FrameLoomPiece } from '#core/craft/piece.ts';
import { refuseChanges } from '#core/craft/rest/fixed-on-loom.ts';
import { planRest, type RestPlan, type WovenSoFar } from '#core/craft/rest/plan-rest.ts';
import { rowsIn, wovenShare } from '#core/craft/rest/woven-share.ts';
import { readWoven } from '#core/craft/rest/woven-so-far.ts';
import { Fields } from '#core/craft/reading/fields.ts';
import { Findings } from '#core/craft/reading/findings.ts';
import { pieceWith, planOf, PLAIN_PIECE } from '../a-piece.ts';

const FILL: Band = { technique: 'tabby', yarn: 'ground', fill: true };
const plainRows = (heightMm: number): Band => ({ technique: 'tabby', yarn: 'ground', heightMm });
/** Four rows of pile on ten millimetres each. */
const PILE: Band = { technique: 'rya', yarn: 'ground', strands: 3, legEnds: 1, pileMm: 50, trimMm: 10, rows: 4, heightMm: 40 };
const HEM: Band = { technique: 'hem-stitch', yarn: 'ground', bundleEnds: 2, reachPicks: 2 };

const counted = (bands: readonly Band[], more: Partial<FrameLoomPiece> = {}): FrameLoomPiece => pieceWith({ beat: { picksPerCm: 5 }, bands, ...more });
const onLoom = (finishedMm: number): number => finishedMm / 0.98;
const restOf = (piece: FrameLoomPiece, woven: WovenSoFar): RestPlan => {
  const rest = planRest(piece, woven);
  if (!rest.ok) throw new Error(JSON.stringify(rest.problems));
  return rest.value;
};
const told = (piece: unknown, woven: unknown): string[] => {
  const rest = planRest(piece, woven);
  return (rest.ok ? rest.warnings : rest.problems).map(({ code, path, message }) => `${code} ${path}: ${message.replaceAll('\u00a0', ' ')}`);
};

describe('rows that come out wider than they were planned', () => {
  test.each<[string, FrameLoomPiece, WovenSoFar, number]>([
    // 100 rows are 250 mm instead of 200: 150 mm are left, 60 rows.
    ['in the one band there is', counted([FILL]), { bandsDone: 0, rows: 100, heightMm: onLoom(250) }, 60],
    // Pile 40 mm, 50 rows 125 mm: 235 mm are left, 94 rows.
    ['above a band of pile', counted([PILE, plainRows(100), FILL]), { bandsDone: 2, heightMm: onLoom(165) }, 94],
    // 50 rows 125 mm and a row of pile 10 mm; three rows of pile are to come, 30 mm: 235 mm for the rest.
    ['below a band of pile that is begun', counted([plainRows(100), PILE, FILL]), { bandsDone: 1, rows: 1, heightMm: onLoom(135) }, 94],
    // 100 rows of 50 are finished; of the filling band 50 rows: 250 mm woven, 150 to go.
    ['in the band that fills, begun', counted([plainRows(100), FILL]), { bandsDone: 1, rows: 50, heightMm: onLoom(250) }, 60],
    // 60 rows 150 mm; the last band keeps its 100 mm, 40 rows; 150 mm remain to be filled, 60 rows.
    ['in the band that fills, with another above it', counted([FILL, plainRows(100)]), { bandsDone: 0, rows: 60, heightMm: onLoom(150) }, 100],
    // A band of pile above the filling one keeps its 40 mm: 400 − 150 − 40 is 210 mm, 84 rows.
    ['in the band that fills, with pile above it', counted([FILL, PILE]), { bandsDone: 0, rows: 60, heightMm: onLoom(150) }, 84],
  ])('%s', (_, piece, woven, rows) => {
    const rest = restOf(piece, woven);
    expect(rest.trust).toBe('measured');
    expect(rest.picksPerCm).toBeCloseTo(4, 9);
    expect(rest.rows).toBe(rows);
    expect(rest.heightMm).toBeCloseTo(400, 9);
    expect(told(piece, woven)).toEqual([]);
  });

  test('leave the pile of the band in hand that is still to be knotted: three rows of four, 30 mm', () => {
    const [whole, begun] = [restOf(counted([PILE, FILL]), { bandsDone: 0 }), restOf(counted([PILE, FILL]), { bandsDone: 0, rows: 1 })];
    expect(begun.bands[0]).toMatchObject({ technique: 'rya', heightMm: 30, knots: ((whole.bands[0]?.knots ?? 0) * 3) / 4 });
    expect(restOf(counted([PILE, FILL]), { bandsDone: 0, rows: 4 }).bands.map(({ technique }) => technique)).toEqual(['tabby']);
    expect(restOf(counted([HEM, FILL]), { bandsDone: 0 }).bands.map(({ technique }) => technique)).toEqual(['hem-stitch', 'tabby']);
    // After it the filling band has 360 mm, whole: 180 rows.
    expect(begun.rows).toBe(180);
    expect(restOf(counted([FILL]), { bandsDone: 0, rows: 200 })).toMatchObject({ rows: 0, bands: [] });
    expect(restOf(counted([FILL]), { bandsDone: 0, rows: 230 })).toMatchObject({ rows: 0, bands: [] });
  });

  test('are measured before the cloth shrinks in the wash as well', () => {
    // 0.98 and 0.9 together: 0.882.
    const piece = counted([FILL], { loom: { ...PLAIN_PIECE.loom, insideHeightMm: 700 }, allowances: { wetShrinkage: 0.1 } });
    expect(restOf(piece, { bandsDone: 0, rows: 100, heightMm: 250 / 0.882 })).toMatchObject({ rows: 60 });
  });

  test('are as far apart as the ends where nothing else was said, until they were measured', () => {
    // Ends of 5 mm: 20 rows are 100 mm. Measured 80 mm, 4 mm a row: 320 mm are left, 80 rows.
    const { beat: _, ...bare } = PLAIN_PIECE;
    const rest = restOf({ ...bare, mode: 'balanced' }, { bandsDone: 0, rows: 20, heightMm: onLoom(80) });
    expect(rest.picksPerCm).toBeCloseTo(2.5, 9);
    expect(rest.rows).toBe(80);
    expect(restOf({ ...bare, mode: 'balanced' }, { bandsDone: 0, rows: 20 }).rows).toBe(60);
  });

  test('count from two centimetres of plain weave on', () => {
    expect(restOf(counted([FILL]), { bandsDone: 0, rows: 9, heightMm: onLoom(25) })).toMatchObject({ trust: 'formula', rows: 191 });
    expect(restOf(counted([FILL]), { bandsDone: 0, rows: 10, heightMm: onLoom(25) })).toMatchObject({ trust: 'measured', rows: 150 });
    // Pile alone tells nothing of rows.
    expect(restOf(counted([PILE, FILL]), { bandsDone: 1, heightMm: onLoom(55) }).trust).toBe('formula');
  });

  test('make the piece longer where no band fills, and leave no open warp in the end', () => {
    const two = (insideHeightMm: number): FrameLoomPiece => counted([plainRows(200), plainRows(200)], { loom: { ...PLAIN_PIECE.loom, insideHeightMm } });
    // With 40 mm above and 60 below, 400 mm of cloth need 508.2.
    expect(restOf(two(520), { bandsDone: 1, heightMm: onLoom(250) }).heightMm).toBeCloseTo(250 + 200, 9);
    expect(told(two(520), { bandsDone: 1, heightMm: onLoom(250) })).toEqual(['W_ROOM /heightMm: Woven on like this, the cloth grows 39.2 mm into the warp that must stay open at the top. Beat the rest closer, or leave out rows of the last bands.']);
    // 411.6 mm need just 520; two millimetres more than was asked is nothing a hand could measure.
    expect(told(two(520), { bandsDone: 1, heightMm: onLoom(211.6) })).toEqual([]);
    expect(told(two(520), { bandsDone: 1, heightMm: onLoom(211.7) })).toHaveLength(1);
    expect(told(two(508.5), { bandsDone: 1, heightMm: onLoom(202) })).toEqual([]);
    expect(told(two(508.5), { bandsDone: 1, heightMm: onLoom(202.1) })).toHaveLength(1);
  });

  test('need a tenth in reserve, or what the piece itself wants', () => {
    const reserve = (piece: FrameLoomPiece): number => {
      const { netMm = 1, withMarginMm = 0 } = restOf(piece, { bandsDone: 0, rows: 100, heightMm: 180 }).yarns['ground'] ?? {};
      return withMarginMm / netMm;
    };
    expect(reserve(PLAIN_PIECE)).toBeCloseTo(1.1, 9);
    expect(reserve(pieceWith({ allowances: { marginWeft: 0.3 } }))).toBeCloseTo(1.3, 9);
  });
});

describe('what was measured and cannot be', () => {
  const again = 'Count the rows and measure from the first one to the fell again.';

  test('is told with what it should have been', () => {
    // 100 mm of plain weave and 40 of pile are 142.9 on the loom.
    expect(told(counted([PILE, plainRows(100), FILL]), { bandsDone: 2, heightMm: 30 })).toEqual([`E_RANGE /heightMm: So many rows cannot be so high: by the plan they come to 14.3 cm on the loom. ${again}`]);
    expect(told(counted([PILE, plainRows(100), FILL]), { bandsDone: 2, heightMm: onLoom(40) })).toHaveLength(1);
    // 50 rows in 2.5 mm are 200 to the centimetre, which still is looked at; in a hair less it is not.
    expect(told(counted([plainRows(100), FILL]), { bandsDone: 1, heightMm: onLoom(2.5001) })[0]).toContain('With rows as close as that the piece does not work out.');
    expect(told(counted([plainRows(100), FILL]), { bandsDone: 1, heightMm: onLoom(2.4999) })[0]).toContain('So many rows cannot be so high');
  });

  test('goes by the thickness of the yarn where the beat does: from a fifth of it to twice as close', () => {
    // 0.7 in a diameter; 100 rows are 144.56 mm. At 0.2 they are 3.5 times as high: 505.97 mm.
    const bands: Band[] = [plainRows(144.5624), plainRows(255.4376)];
    const at = (finishedMm: number): string[] => told(pieceWith({ bands, loom: { ...PLAIN_PIECE.loom, insideHeightMm: 5000 } }), { bandsDone: 1, heightMm: onLoom(finishedMm) });
    expect(at(505)).toEqual([]);
    expect(at(507)[0]).toContain('So many rows cannot be so high');
    // At 2 they are 50.6 mm high.
    expect(at(51)).toEqual([]);
    expect(at(50)[0]).toContain('So many rows cannot be so high');
  });

  test('is said with the reason where yarns so thick cannot lie so close', () => {
    // 100 rows in 20 mm.
    expect(told(counted([plainRows(200), FILL]), { bandsDone: 1, heightMm: onLoom(20) })).toEqual([expect.stringMatching(/^E_RANGE \/heightMm: With rows as close as that the piece does not work out\. .*[a-z]\. Count the rows and measure again\.$/u)]);
  });

  test('is not looked at where the place itself is wrong', () => {
    expect(told(counted([plainRows(400)]), { bandsDone: 2, heightMm: 30 })).toEqual(['E_RANGE /bandsDone: This piece has 1 bands. Say how many of them are finished.']);
    expect(told(counted([plainRows(400)]), { bandsDone: 1, rows: 1, heightMm: 30 })).toHaveLength(1);
  });
});

describe('yarn that is left', () => {
  const BALL = { metres: 90, grams: 50 };
  const piece = counted([FILL], { yarns: { ground: { metresPer100g: 180, ball: BALL } } });
  const net = restOf(piece, { bandsDone: 0, rows: 100 }).yarns['ground'];
  // 180 m in 100 g.
  const grams = (mm = 0): number => (mm / 180_000) * 100;

  test('and suffices asks for nothing', () => {
    const rest = restOf(piece, { bandsDone: 0, rows: 100, leftG: { ground: 100 } }).yarns['ground'];
    expect(rest?.leftMm).toBeCloseTo(180_000, 6);
    expect(rest?.missingMm).toBe(0);
    expect(rest).not.toHaveProperty('ballsToGet');
    // A counted beat needs a tenth more in hand.
    expect((net?.withMarginMm ?? 0) / (net?.netMm ?? 1)).toBeCloseTo(1.1, 9);
  });

  test('of another role, or of none that was weighed, changes nothing', () => {
    expect(restOf(piece, { bandsDone: 0, rows: 100, leftG: { gold: 5 } }).yarns['ground']).toEqual(net);
    expect(net).not.toHaveProperty('leftMm');
  });

  test('is short below what is needed, and tight below its margin', () => {
    const codes = (left: number): string[] => told(piece, { bandsDone: 0, rows: 100, leftG: { ground: left } }).map((line) => line.split(':')[0] ?? '');
    expect(codes(grams(net?.withMarginMm) + 1e-6)).toEqual([]);
    expect(codes(grams(net?.withMarginMm) - 1e-6)).toEqual(['W_TIGHT /leftG/ground']);
    expect(codes(grams(net?.netMm) + 1e-6)).toEqual(['W_TIGHT /leftG/ground']);
    expect(codes(grams(net?.netMm) - 1e-6)).toEqual(['W_SHORT /leftG/ground']);
    expect(codes(0)).toEqual(['W_SHORT /leftG/ground']);
  });
});

describe('what a weaver says of her loom', () => {
  const read = (said: unknown): readonly [unknown, string[]] => {
    const findings = Findings.in('cm');
    const woven = readWoven(Fields.of(said, '', 'What is woven', findings));
    const outcome = findings.outcome(true);
    return [woven, outcome.ok ? [] : outcome.problems.map(({ code, path }) => `${code} ${path}`)];
  };

  test.each<[unknown, string[]]>([
    [{ bandsDone: 0, rows: 1.5 }, ['E_COUNT /rows']],
    [{ bandsDone: 201 }, ['E_RANGE /bandsDone']],
    [{ bandsDone: 0, rows: -1 }, ['E_RANGE /rows']],
    [{ bandsDone: 0, leftG: { ground: -1, sky: 'much' } }, ['E_RANGE /leftG/ground', 'E_NUM /leftG/sky']],
    [{ bandsDone: 0, heightMm: -1 }, ['E_RANGE /heightMm']],
    [{ bandsDone: 0, mood: 'good' }, ['E_ENUM /mood']],
  ])('%j is told in its place', (said, found) => {
    expect(read(said)).toEqual([undefined, found]);
  });

  test('is read as it was said', () => {
    const said = { bandsDone: 2, rows: 3, heightMm: 100, leftG: { ground: 0, sky: 12.5 } };
    expect(read(said)).toEqual([said, []]);
    expect(read({ bandsDone: 0 })).toEqual([{ bandsDone: 0 }, []]);
  });
});

describe('how far up a piece the fell is', () => {
  const piece = counted([plainRows(100), PILE, HEM, FILL]);
  const made = { piece, plan: planOf(piece) };

  test.each<[WovenSoFar, number]>([
    [{ bandsDone: 0 }, 0],
    [{ bandsDone: 0, rows: 25 }, 50 / 400],
    [{ bandsDone: 0, rows: 500 }, 100 / 400],
    [{ bandsDone: 1 }, 100 / 400],
    [{ bandsDone: 1, rows: 3 }, 130 / 400],
    [{ bandsDone: 2, rows: 3 }, 140 / 400],
    [{ bandsDone: 3, rows: 130 }, 1],
    [{ bandsDone: 4, rows: 9 }, 1],
    [{ bandsDone: 9 }, 1],
  ])('%j', (woven, share) => {
    expect(wovenShare(made, woven)).toBeCloseTo(share, 12);
  });

  test('is nowhere in a piece without bands', () => {
    expect(wovenShare({ piece, plan: { ...made.plan, bands: [] } }, { bandsDone: 0 })).toBe(0);
  });

  test('is counted in rows of plain weave and of pile, and in none of an edge', () => {
    expect([0, 1, 2, 3, 4].map((index) => rowsIn(made.plan.bands[index], piece.bands[index]))).toEqual([50, 4, undefined, 130, undefined]);
    expect(rowsIn({ index: 0, technique: 'tabby', heightMm: 0, picks: 0, yarnMm: {} }, FILL)).toBeUndefined();
    expect(rowsIn(made.plan.bands[0], undefined)).toBeUndefined();
  });
});

describe('what is on the loom stays', () => {
  const woven: WovenSoFar = { bandsDone: 1 };
  const made = (more: Partial<FrameLoomPiece> = {}) => {
    const piece = counted([FILL], more);
    return { piece, plan: planOf(piece) };
  };
  const refused = (before: Partial<FrameLoomPiece>, after: Partial<FrameLoomPiece>): string[] => refuseChanges(made(before), made(after), woven).map(({ path }) => path);
  const loom = (more: Partial<FrameLoomPiece['loom']>): Partial<FrameLoomPiece> => ({ loom: { ...PLAIN_PIECE.loom, ...more } });

  test('its nails, and every how many are wound', () => {
    expect(refused({}, loom({ nailPitchMm: 5, everyNthNail: 2 }))).toEqual(['/loom/nailPitchMm']);
    expect(refused({}, loom({ everyNthNail: 2, insideHeightMm: 900 }))).toEqual(['/loom/nailPitchMm']);
    expect(refused(loom({ nailPitchMm: 5, everyNthNail: 2 }), loom({ nailPitchMm: 5, everyNthNail: 2 }))).toEqual([]);
    expect(refused({}, loom({ insideHeightMm: 900 }))).toEqual([]);
  });

  test('its ends and its width, but for what no hand can measure', () => {
    const width = (widthMm: number): Partial<FrameLoomPiece> => ({ size: { widthMm, heightMm: 400 } });
    expect(refused({}, { warp: { ...PLAIN_PIECE.warp, endCount: 64 } })).toEqual(['/size/widthMm']);
    expect(refused({}, width(300.02))).toEqual(['/size/widthMm']);
    expect(refused({}, width(300.005))).toEqual([]);
  });
});
